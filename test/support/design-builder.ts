import type {
  Assignment, CableNode, Circuit, Design, Dispenser, DispenserType, Module, ModuleGroup, ModuleType, Point, Project, Supply, SupplyType,
} from '#calc';

/** A project with plain policies; every figure can be overridden. */
export function buildProject(overrides: Partial<Project> = {}): Project {
  return {
    id: 'project', name: 'Test project', description: '', timeZone: 'Europe/Amsterdam', voltageTempC: 40, tripTempC: 70,
    sparePercent: 20, supplyMarginPercent: 25, maxCartridgeDays: 365, minCartridgeDays: 30, maxOverGreasingPercent: 5,
    relayLifeYears: 10, slotMs: null, breakerDcFactor: 1.5, rankBy: 'fewest-changes', demandPer: '1000h',
    ...overrides,
  };
}

/** A four-core type drawing 0.25 A while it runs and 20 mA idling. */
export function buildFourCoreType(overrides: Partial<DispenserType> = {}): DispenserType {
  return {
    id: 'type-4', name: 'Dispenser, four-core', typeVersion: 1, wiring: 'four-core', cartridgesUl: [160_000], residualUl: 0,
    doseMinUl: 100, doseMaxUl: 2500, doseStepUl: 100, runMsPerStep: 4000, recoveryMs: 60_000, triggerMs: 2000, timedMonths: [1, 3, 6, 12],
    load: 'constant-current', runA: 0.25, peakA: 0.5, idleA: 0.02, minV: 20, controlInputA: 0.005, controlOnV: 11, offStateA: 0.001,
    controlPolarity: 'sourcing', status: { polarity: 'sourcing', maxA: 0.05, dropV: 1, leakageA: 0.0001 },
    pins: { supply: '1', pulse: '2', zero: '3', status: '4' }, protectionLevels: ['Dc'], maxSurfaceC: 85,
    ...overrides,
  };
}

/** A two-core type drawing 0.28 A while it runs. */
export function buildTwoCoreType(overrides: Partial<DispenserType> = {}): DispenserType {
  return buildFourCoreType({
    id: 'type-2', name: 'Dispenser, two-core', wiring: 'two-core', triggerMs: null, timedMonths: [], runA: 0.28, peakA: 0.45, idleA: 0,
    minV: 18, controlInputA: null, controlOnV: null, status: null, pins: { supply: '1', zero: '2' }, ...overrides,
  });
}

/** Output module, 16 channels of 0.5 A in groups of 8. */
export function buildOutputType(overrides: Partial<ModuleType> = {}): ModuleType {
  return {
    id: 'out-16', name: 'Output module, 16 channels', typeVersion: 1, kind: 'output', technology: 'transistor', polarity: 'sourcing',
    channels: 16, channelsPerGroup: 8, channelA: 0.5, groupA: 2, moduleA: 4, channelPeakA: 1, dropV: 0.5, leakageA: 0.0005,
    shortCircuitA: 1, minLoadA: null, ratedOperations: null, inputType: null, inputA: null,
    ...overrides,
  };
}

/** Input module, 16 channels of type 3. */
export function buildInputType(overrides: Partial<ModuleType> = {}): ModuleType {
  return {
    ...buildOutputType(), id: 'in-16', name: 'Input module, 16 channels', kind: 'input', technology: 'input', polarity: 'sinking',
    channelsPerGroup: 16, channelA: null, groupA: null, moduleA: null, channelPeakA: null, dropV: 0, leakageA: 0, shortCircuitA: null,
    inputType: 3, inputA: 0.0025, ...overrides,
  };
}

export function buildSupplyType(overrides: Partial<SupplyType> = {}): SupplyType {
  return {
    id: 'supply-10', name: 'Supply, 24 V 10 A', typeVersion: 1, ratedA: 10, deratingFromC: 50, deratingPercentPerK: 2.5,
    tolerancePercent: 1, shortCircuitA: 15, extraLowVoltage: 'PELV',
    ...overrides,
  };
}

export function buildSupply(overrides: Partial<Supply> = {}): Supply {
  return {
    id: 'supply', cabinetId: 'cabinet', typeId: 'supply-10', name: '-T1', setV: 24, internalOhm: 0, otherLoadA: 0, redundant: false, ...overrides,
  };
}

export function buildCircuit(overrides: Partial<Circuit> = {}): Circuit {
  return {
    id: 'circuit', supplyId: 'supply', name: 'C1', protection: 'breaker-B', protectionA: 6, protectionOhm: 0, concurrencyLimit: null, ...overrides,
  };
}

/** A box at the end of a 20 m trunk from the cabinet. */
export function buildNode(overrides: Partial<CableNode> = {}): CableNode {
  return {
    id: 'box', circuitId: 'circuit', parentId: null, location: '+JB1', cableTag: '-W1', lengthM: 20, powerMm2: 2.5, signalMm2: 1,
    conductorClass: 5, ...overrides,
  };
}

export function buildPoint(overrides: Partial<Point> = {}): Point {
  return {
    id: 'point', tag: 'P-01', description: null, function: null, location: null, product: null, machine: null, remarks: null,
    hoursPerDay: 16, daysPerWeek: 7, demandWay: 'stated', boreMm: null, outsideMm: null, widthMm: null, speedRpm: null,
    factors: { temperature: 1, contamination: 1, moisture: 1, vibration: 1, position: 1, design: 1 },
    statedUl: 60_000, statedPer: '1000h', practiceStrokes: null, practiceGramsPerStroke: null, practiceEveryDays: null, greaseId: null,
    zone: 'none', ...overrides,
  };
}

export function buildDispenser(overrides: Partial<Dispenser> = {}): Dispenser {
  return {
    id: 'lane', pointId: 'point', typeId: 'type-4', wiring: 'four-core', method: 'pulse', cartridgeUl: 160_000, doseUl: 500,
    periodMonths: null, controllerId: 'controller', circuitId: 'circuit', nodeId: null, cableTag: null, cableLengthM: 30,
    crossSectionMm2: 0.75, conductorClass: 5, ...overrides,
  };
}

/** A dispenser with the point it stands at: ids and tag from one name. */
export function buildLane(name: string, dispenser: Partial<Dispenser> = {}, point: Partial<Point> = {}): { dispenser: Dispenser; point: Point } {
  return {
    point: buildPoint({ id: `point-${name}`, tag: name, ...point }),
    dispenser: buildDispenser({ id: name, pointId: `point-${name}`, cableTag: `-W-${name}`, ...dispenser }),
  };
}

/** What `buildDesign` takes: lanes in place of points and dispensers, everything else as rows. */
export interface DesignParts extends Partial<Design> {
  readonly lanes?: readonly { readonly dispenser: Dispenser; readonly point: Point }[];
}

/** One cabinet, controller, supply and circuit, the types above, no modules; whatever is given takes the place of its default. */
export function buildDesign({ lanes = [buildLane('P-01')], ...overrides }: DesignParts = {}): Design {
  return {
    project: buildProject(),
    dispenserTypes: [buildFourCoreType(), buildTwoCoreType()],
    moduleTypes: [buildOutputType(), buildInputType()],
    cableTypes: [],
    supplyTypes: [buildSupplyType()],
    greases: [],
    points: lanes.map((lane) => lane.point),
    dispensers: lanes.map((lane) => lane.dispenser),
    cabinets: [{ id: 'cabinet', location: '+K1', description: '', temperatureC: 40 }],
    controllers: [{ id: 'controller', cabinetId: 'cabinet', name: 'PLC1' }],
    modules: [],
    moduleGroups: [],
    supplies: [buildSupply()],
    circuits: [buildCircuit()],
    cableNodes: [],
    assignments: [],
    ...overrides,
  };
}

export function buildModule(overrides: Partial<Module> = {}): Module {
  return { id: 'DO1', controllerId: 'controller', typeId: 'out-16', name: 'DO1', baseByte: 4, slot: 1, ...overrides };
}

export function buildGroup(moduleId: string, groupIndex: number, circuitId: string | null = 'circuit'): ModuleGroup {
  return { id: `${moduleId}-${groupIndex}`, moduleId, groupIndex, circuitId };
}

export function buildAssignment(dispenserId: string, moduleId: string, channel: number, purpose: Assignment['purpose'] = 'control'): Assignment {
  return { id: `${dispenserId}-${purpose}`, dispenserId, moduleId, channel, purpose };
}
