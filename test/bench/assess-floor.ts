import type { CableNode, Design, Dispenser, DispenserType, ModuleType, Point, Project } from '#calc';
import { type FloorCircuit, floorCircuit, type FloorLane } from './assess-floor-circuit.ts';
import { type FloorLoad, type FloorModule, type FloorSupply, largestK, loadModules, solveSupplies } from './assess-floor-loads.ts';

/** What the plain loop works out: every number of an assessment, in lists that follow the design's. */
export interface FloorResult {
  readonly lanes: FloorLane[];
  readonly circuits: FloorCircuit[];
  readonly supplies: FloorSupply[];
  readonly groups: FloorLoad[];
  readonly modules: FloorLoad[];
  /** How many comparisons with a limit fail. */
  exceeded: number;
}

/**
 * The arithmetic of `assess` as a plain loop over plain objects: demand, plan, voltages with their worst sets,
 * levels, profiles, loads, largest k, and the comparisons of the findings, without texts, addresses or tables
 * by id. It takes a design without blanks, contradictions and constant power, of breadth-first boxes.
 */
export function plainArithmetic(design: Design): FloorResult {
  const { project } = design;
  const types = new Map(design.dispenserTypes.map((type) => [type.id, type]));
  const points = new Map<string, Point>();
  for (const point of design.points) points.set(point.id, point);
  const modules = new Map<string, FloorModule>();
  for (const module of design.modules) modules.set(module.id, { type: design.moduleTypes.find((type) => type.id === module.typeId)!, on: [] });
  const placeOf = new Map<string, number>();
  for (let i = 0; i < design.dispensers.length; i++) placeOf.set(design.dispensers[i].id, i);
  const outputs = new Array<ModuleType | undefined>(design.dispensers.length).fill(undefined);
  const inputs = new Array<ModuleType | undefined>(design.dispensers.length).fill(undefined);
  for (const { dispenserId, moduleId, channel, purpose } of design.assignments) {
    const at = placeOf.get(dispenserId)!;
    const { type, on } = modules.get(moduleId)!;
    if (purpose === 'control') {
      outputs[at] = type;
      on.push({ at, channel });
    } else inputs[at] = type;
  }
  const lanes: FloorLane[] = [];
  const byCircuit = new Map<string, FloorLane[]>();
  for (let i = 0; i < design.dispensers.length; i++) {
    const dispenser = design.dispensers[i];
    const lane = newLane(dispenser, types.get(dispenser.typeId!)!, outputs[i], inputs[i]);
    planLane(project, points.get(dispenser.pointId)!, lane, design.greases[0].densityGPerCm3);
    lanes.push(lane);
    const own = byCircuit.get(dispenser.circuitId!);
    if (own) own.push(lane);
    else byCircuit.set(dispenser.circuitId!, [lane]);
  }
  const nodes = new Map<string, CableNode[]>();
  for (const node of design.cableNodes) {
    const own = nodes.get(node.circuitId);
    if (own) own.push(node);
    else nodes.set(node.circuitId, [node]);
  }
  const result: FloorResult = { lanes, circuits: [], supplies: [], groups: [], modules: [], exceeded: 0 };
  const circuits = new Map<string, FloorCircuit>();
  for (const circuit of design.circuits) {
    const all = floorCircuit(project, circuit, nodes.get(circuit.id) ?? [], byCircuit.get(circuit.id) ?? []);
    circuits.set(circuit.id, all);
    result.circuits.push(all);
  }
  const supplies = solveSupplies(design, result);
  const places = loadModules(modules, lanes, circuits, result);
  for (const supply of supplies) for (const all of supply.circuits) all.largestK = largestK(all, supply, places.get(all.circuit.id) ?? []);
  result.exceeded = countExceeded(project, result, points);
  return result;
}

function newLane(dispenser: Dispenser, type: DispenserType, output: ModuleType | undefined, input: ModuleType | undefined): FloorLane {
  return {
    id: dispenser.id, dispenser, type, output, input, demandUl: 0, intervalMs: 0, pulses: 0, lifeDays: 0, pulsesPerYear: 0, overPercent: 0, channelA: 0,
    worstV: 0, worstSet: [], idleV: 0, idleSet: [], allOnV: 0, aloneV: 0, smallestMm2: null, pulseLevelV: null, statusLevelV: null, profile: [],
  };
}

/** Demand, interval, pulses, life and over-greasing of one lane. */
function planLane(project: Project, point: Point, lane: FloorLane, density: number): void {
  const { dispenser, type } = lane;
  const hoursPerDay = (point.hoursPerDay! * point.daysPerWeek) / 7;
  let demand = point.statedUl!;
  if (point.demandWay === 'bearing') {
    const { temperature, contamination, moisture, vibration, position, design } = point.factors;
    const factor = temperature * contamination * moisture * vibration * position * design;
    const hours = factor * (14e6 / (point.speedRpm! * Math.sqrt(point.boreMm!)) - 4 * point.boreMm!);
    demand = (5000 * point.outsideMm! * point.widthMm!) / (density * hours);
  } else if (point.demandWay === 'practice') {
    demand = (1e6 * point.practiceStrokes! * point.practiceGramsPerStroke!) / (density * point.practiceEveryDays! * hoursPerDay);
  }
  lane.demandUl = Math.ceil(demand * (1 - 1e-13));
  if (dispenser.method === 'timed') {
    const days = dispenser.periodMonths! * 30.4375;
    const discharge = ((dispenser.cartridgeUl! - type.residualUl) * 1000) / (days * hoursPerDay);
    lane.lifeDays = days;
    lane.overPercent = (100 * (discharge - lane.demandUl)) / lane.demandUl;
    return;
  }
  const exactMs = (3.6e9 * dispenser.doseUl!) / lane.demandUl;
  const dayMs = hoursPerDay * 3.6e6;
  lane.intervalMs = Math.floor(exactMs);
  lane.pulses = Math.floor((dispenser.cartridgeUl! - type.residualUl) / dispenser.doseUl!);
  lane.lifeDays = (lane.pulses * lane.intervalMs) / dayMs;
  lane.pulsesPerYear = (365.25 * dayMs) / lane.intervalMs;
  lane.overPercent = (100 * (exactMs - lane.intervalMs)) / lane.intervalMs;
}

/** Every comparison with a limit that a finding rests on; how many fail. */
function countExceeded(project: Project, result: FloorResult, points: ReadonlyMap<string, Point>): number {
  let count = 0;
  for (const lane of result.lanes) {
    const { dispenser, type, output, input } = lane;
    const point = points.get(dispenser.pointId)!;
    const runMs = Math.ceil(dispenser.doseUl! / type.doseStepUl) * type.runMsPerStep;
    if (Math.floor(lane.lifeDays) > project.maxCartridgeDays) count++;
    if (lane.lifeDays < project.minCartridgeDays) count++;
    if (lane.overPercent > project.maxOverGreasingPercent) count++;
    if (lane.overPercent < 0) count++;
    if (point.demandWay === 'bearing' && (point.speedRpm! * (point.boreMm! + point.outsideMm!)) / 2 > 150_000) count++;
    if (dispenser.method === 'pulse') {
      if (lane.intervalMs < runMs + type.recoveryMs) count++;
      if (dispenser.doseUl! < type.doseMinUl || dispenser.doseUl! > type.doseMaxUl || dispenser.doseUl! % type.doseStepUl !== 0) count++;
      if (!output) count++;
    }
    if (!type.cartridgesUl.includes(dispenser.cartridgeUl!)) count++;
    if (lane.worstV < type.minV - 1e-9) count++;
    if (lane.idleV < type.minV - 1e-9) count++;
    if (lane.worstV >= type.minV - 1e-9 && lane.allOnV < type.minV - 1e-9) count++;
    if (output) {
      if (lane.channelA > output.channelA!) count++;
      if (dispenser.wiring === 'two-core' && type.peakA > output.channelPeakA!) count++;
      if (output.polarity !== type.controlPolarity || output.leakageA > type.offStateA) count++;
      if (lane.pulseLevelV !== null && lane.pulseLevelV < type.controlOnV! - 1e-9) count++;
    }
    if (input && type.status) {
      if (lane.statusLevelV! < 11 - 1e-9 || type.status.maxA < input.inputA! || type.status.leakageA > 0.0015) count++;
      if ((type.status.leakageA * 24) / input.inputA! > 5) count++;
    } else if (dispenser.wiring === 'four-core') count++;
    if (point.zone !== 'none' && !type.protectionLevels.some((level) => level !== 'Ga' && level !== 'Gb' && level !== 'Gc')) count++;
  }
  for (const { ratingA, allOnA } of [...result.groups, ...result.modules]) if (allOnA > ratingA + 1e-9) count++;
  for (const { demandA, allOnA, ratingA } of result.supplies) if (demandA > ratingA + 1e-9 || allOnA > ratingA + 1e-9) count++;
  for (const { worstA, allOnA, circuit, shortA } of result.circuits) {
    if (worstA > circuit.protectionA + 1e-9 || allOnA > circuit.protectionA + 1e-9) count++;
    if (shortA < circuit.protectionA * 1.5) count++;
  }
  return count;
}
