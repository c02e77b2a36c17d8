import type { CableType, Design, DispenserType, Grease, ModuleType, SupplyType } from '#calc';
import type { SeedIds } from './seed-ids.ts';

export const TWO_CORE_80 = 'Dispenser, two-core, 80 cm³ family';
export const TWO_CORE_160 = 'Dispenser, two-core, 160 cm³ family';
export const FOUR_CORE_160 = 'Dispenser, four-core, 160 cm³ family';
export const FOUR_CORE_320 = 'Dispenser, four-core, 320 cm³ family';
export const OUTPUTS_16 = 'Output module, 16 × 24 V DC 0.5 A, groups of 8';
export const RELAYS_8 = 'Relay output module, 8 channels, one group';
export const INPUTS_16 = 'Input module, 16 × 24 V DC';
export const SUPPLY_10 = 'Supply, 24 V DC 10 A';
export const BEARING_GREASE = 'Bearing grease, NLGI 2, lithium complex';
export const GEAR_GREASE = 'Open gear grease, NLGI 1, calcium sulfonate';

export type Catalogue = Pick<Design, 'dispenserTypes' | 'moduleTypes' | 'cableTypes' | 'supplyTypes' | 'greases'>;

/** The invented catalogue of the demo: plain names, no maker's data. */
export function demoCatalogue(id: SeedIds): Catalogue {
  return {
    dispenserTypes: dispenserTypes(id),
    moduleTypes: moduleTypes(id),
    cableTypes: cableTypes(id),
    supplyTypes: [supplyType(id)],
    greases: greases(id),
  };
}

type Own = Pick<DispenserType, 'cartridgesUl' | 'residualUl' | 'doseMaxUl' | 'runMsPerStep' | 'runA' | 'peakA' | 'minV' | 'protectionLevels'>;

function dispenserTypes(id: SeedIds): DispenserType[] {
  const twoCore = (name: string, own: Own): DispenserType => ({
    ...common(id(name), name), ...own, wiring: 'two-core', triggerMs: null, timedMonths: [], idleA: 0,
    controlInputA: null, controlOnV: null, offStateA: 0.002, status: null, pins: { supply: '1', zero: '2' },
  });
  const fourCore = (name: string, own: Own & { readonly idleA: number }): DispenserType => ({
    ...common(id(name), name), ...own, wiring: 'four-core', triggerMs: 500, timedMonths: [1, 2, 3, 4, 6, 9, 12],
    controlInputA: 0.008, controlOnV: 15, offStateA: 0.0015, status: { polarity: 'sourcing', maxA: 0.05, dropV: 1.5, leakageA: 0.0002 },
    pins: { supply: '1', pulse: '2', zero: '3', status: '4' },
  });
  return [
    twoCore(TWO_CORE_80, { cartridgesUl: [80_000], residualUl: 4000, doseMaxUl: 1000, runMsPerStep: 3000, runA: 0.25, peakA: 0.6, minV: 19, protectionLevels: ['Dc'] }),
    twoCore(TWO_CORE_160, { cartridgesUl: [80_000, 160_000], residualUl: 5000, doseMaxUl: 1500, runMsPerStep: 2500, runA: 0.32, peakA: 0.75, minV: 19, protectionLevels: ['Dc'] }),
    fourCore(FOUR_CORE_160, { cartridgesUl: [80_000, 160_000], residualUl: 5000, doseMaxUl: 2500, runMsPerStep: 2000, runA: 0.35, peakA: 0.8, minV: 18, protectionLevels: ['Db'], idleA: 0.02 }),
    fourCore(FOUR_CORE_320, { cartridgesUl: [160_000, 320_000], residualUl: 8000, doseMaxUl: 5000, runMsPerStep: 1500, runA: 0.42, peakA: 0.95, minV: 18, protectionLevels: ['Dc'], idleA: 0.025 }),
  ];
}

const common = (id: string, name: string) => ({
  id, name, typeVersion: 1, doseMinUl: 100, doseStepUl: 100, recoveryMs: 20_000, load: 'constant-current', controlPolarity: 'sourcing', maxSurfaceC: 85,
} as const);

function moduleTypes(id: SeedIds): ModuleType[] {
  const none = {
    channelA: null, groupA: null, moduleA: null, channelPeakA: null, dropV: 0, leakageA: 0, shortCircuitA: null,
    minLoadA: null, ratedOperations: null, inputType: null, inputA: null,
  };
  return [
    {
      ...none, id: id(OUTPUTS_16), name: OUTPUTS_16, typeVersion: 1, kind: 'output', technology: 'transistor', polarity: 'sourcing', channels: 16,
      channelsPerGroup: 8, channelA: 0.5, groupA: 2, moduleA: 4, channelPeakA: 1.2, dropV: 0.5, leakageA: 0.0003, shortCircuitA: 1.4,
    },
    {
      ...none, id: id(RELAYS_8), name: RELAYS_8, typeVersion: 1, kind: 'output', technology: 'relay', polarity: 'sourcing', channels: 8,
      channelsPerGroup: 8, channelA: 2, groupA: 8, moduleA: 8, channelPeakA: 4, minLoadA: 0.01, ratedOperations: 20_000,
    },
    {
      ...none, id: id(INPUTS_16), name: INPUTS_16, typeVersion: 1, kind: 'input', technology: 'input', polarity: 'sinking', channels: 16,
      channelsPerGroup: 16, inputType: 3, inputA: 0.0026,
    },
  ];
}

function cableTypes(id: SeedIds): CableType[] {
  const numbered = (name: string, cores: number, crossSectionMm2: number): CableType => ({
    id: id(name), name, typeVersion: 1, crossSectionMm2, conductorClass: 5, cores, coreMarking: 'numbered', coreColours: [],
  });
  return [
    numbered('Control cable, 2 × 0.75 mm², numbered', 2, 0.75),
    numbered('Control cable, 2 × 1.5 mm², numbered', 2, 1.5),
    { ...numbered('Sensor cable, 4 × 1.5 mm², coloured', 4, 1.5), coreMarking: 'coloured', coreColours: ['BN', 'WH', 'BU', 'BK'] },
    numbered('Signal multicore, 25 × 1 mm², numbered', 25, 1),
    numbered('Power pair, 2 × 4 mm², numbered', 2, 4),
  ];
}

function supplyType(id: SeedIds): SupplyType {
  return {
    id: id(SUPPLY_10), name: SUPPLY_10, typeVersion: 1, ratedA: 10, deratingFromC: 50, deratingPercentPerK: 2.5, tolerancePercent: 2,
    // For some milliseconds, to trip breakers.
    shortCircuitA: 60, extraLowVoltage: 'PELV',
  };
}

function greases(id: SeedIds): Grease[] {
  return [
    { id: id(BEARING_GREASE), name: BEARING_GREASE, nlgi: '2', thickener: 'lithium complex', densityGPerCm3: 0.9 },
    { id: id(GEAR_GREASE), name: GEAR_GREASE, nlgi: '1', thickener: 'calcium sulfonate', densityGPerCm3: 0.97 },
  ];
}
