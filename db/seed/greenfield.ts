import type { Design } from '#calc';
import { BEARING_GREASE, demoCatalogue, FOUR_CORE_160, INPUTS_16, OUTPUTS_16, SUPPLY_10, TWO_CORE_80 } from './brackwater-catalogue.ts';
import { DEFAULT_POLICIES, type DesignIds, laneRows, moduleRows, type SeedLane, type SeedModule } from './seed-rows.ts';

/** Stone dust and rain. Values of the common factor table. */
const STONE_DUST = { contamination: 0.2, moisture: 0.4, vibration: 0.3 };

/** Machine, bearings; bore, outside diameter, width in mm; speed in rpm. */
const MACHINES = [
  ['Jaw crusher feeder', 'Feeder shaft', [90, 160, 40], 42],
  ['Screen 1', 'Drive shaft', [80, 140, 33], 96],
  ['Belt conveyor 1', 'Head pulley', [80, 140, 26], 84],
  ['Belt conveyor 1', 'Tail pulley', [60, 110, 22], 110],
  ['Belt conveyor 2', 'Head pulley', [80, 140, 26], 84],
  ['Belt conveyor 2', 'Tail pulley', [60, 110, 22], 110],
] as const;

const MODULES: readonly SeedModule[] = [
  { controller: 'PLC1', name: 'DO1', type: OUTPUTS_16, baseByte: 0, slot: 1 },
  { controller: 'PLC1', name: 'DI1', type: INPUTS_16, baseByte: 0, slot: 2 },
];

/** A second, smaller organisation's project, invented: a quarry with twelve points and one cabinet. */
export function greenfieldDesign(ids: DesignIds): Design {
  const { catalogue, row } = ids;
  const types = demoCatalogue(catalogue);
  return {
    project: { ...DEFAULT_POLICIES, id: row('project'), name: 'Hollin Quarry, primary crushing', description: 'New line, first dispensers', timeZone: 'Europe/London' },
    ...types,
    cabinets: [{ id: row('cabinet +K1'), location: '+K1', description: 'Cabinet beside the crusher', temperatureC: 35 }],
    controllers: [{ id: row('controller PLC1'), cabinetId: row('cabinet +K1'), name: 'PLC1' }],
    ...moduleRows(MODULES, types.moduleTypes, () => 'C1', ids),
    supplies: [{
      id: row('supply +K1'), cabinetId: row('cabinet +K1'), typeId: catalogue(SUPPLY_10), name: '-T1', setV: 24.5, internalOhm: 0.05, otherLoadA: 0.5, redundant: false,
    }],
    circuits: [{ id: row('circuit C1'), supplyId: row('supply +K1'), name: 'C1', protection: 'electronic', protectionA: 3, protectionOhm: 0.05, concurrencyLimit: 3 }],
    cableNodes: [{
      id: row('box +JB1'), circuitId: row('circuit C1'), parentId: null, location: '+JB1', cableTag: '-W101', lengthM: 25, powerMm2: 2.5, signalMm2: 1, conductorClass: 5,
    }],
    ...laneRows(quarryLanes(), ids),
  };
}

function quarryLanes(): SeedLane[] {
  return MACHINES.flatMap(([machine, shaft, [boreMm, outsideMm, widthMm], speedRpm], m) =>
    ['left', 'right'].map((side, s): SeedLane => {
      const i = 2 * m + s;
      const number = String(i + 1).padStart(2, '0');
      const fourCore = m < 4;
      return {
        tag: `HQ-L${number}`,
        point: {
          description: `${shaft}, bearing ${side}`, function: '=Q1', location: '+C1', product: `-GP${number}`, machine, hoursPerDay: 10, daysPerWeek: 5,
          demandWay: 'bearing', boreMm, outsideMm, widthMm, speedRpm, factors: STONE_DUST, grease: BEARING_GREASE, zone: 'none',
        },
        dispenser: {
          type: fourCore ? FOUR_CORE_160 : TWO_CORE_80, wiring: fourCore ? 'four-core' : 'two-core', cartridgeUl: 80_000, doseUl: fourCore ? 300 : 200,
          controller: 'PLC1', circuit: 'C1', ...(fourCore && { box: '+JB1' }), cableTag: `-W2${number}`, cableLengthM: 15 + 4 * i, crossSectionMm2: 1.5,
        },
        ...(m < 5 && { output: ['DO1', i] }),
        ...(fourCore && { status: ['DI1', i] }),
      };
    }),
  );
}
