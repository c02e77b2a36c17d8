import type { Cabinet, CableNode, Circuit, Controller, Design, Supply } from '#calc';
import { demoCatalogue, INPUTS_16, OUTPUTS_16, RELAYS_8, SUPPLY_10 } from './brackwater-catalogue.ts';
import { galleryLanes } from './brackwater-galleries.ts';
import { quayLanes } from './brackwater-quay.ts';
import { DEFAULT_POLICIES, type DesignIds, laneRows, moduleRows, type SeedModule } from './seed-rows.ts';
import type { SeedIds } from './seed-ids.ts';

/**
 * The demo's story as a design: an invented grain export terminal, 60 points, two cabinets. Nothing of the
 * story is typed in; the checks find it: an output group that is overloaded under too large a limit k, the
 * farthest dispenser of that circuit under its minimum voltage, a breaker that does not trip at once, a
 * cable tag on two cables, a relay contact that wears out too early, a dispenser not suited to its zone.
 * With k = 6 on C1 the first two are gone.
 */
export function brackwaterDesign(ids: DesignIds): Design {
  const lanes = laneRows([...galleryLanes(), ...quayLanes()], ids);
  return { ...brackwaterHardware(ids, 'Brackwater Terminal', 'Retrofit of gallery conveyors, bucket elevators and ship loader'), ...lanes };
}

/** The same hardware without a point, for trying an import. */
export function quayExtensionDesign(ids: DesignIds): Design {
  return brackwaterHardware(ids, 'Brackwater Terminal, quay extension', 'Hardware as built, no points yet: for trying an import');
}

const MODULES: readonly SeedModule[] = [
  ...['DO1', 'DO2', 'DO3'].map((name, i) => ({ controller: 'PLC1', name, type: OUTPUTS_16, baseByte: 4 + 2 * i, slot: 1 + i })),
  ...['DI1', 'DI2', 'DI3'].map((name, i) => ({ controller: 'PLC1', name, type: INPUTS_16, baseByte: 4 + 2 * i, slot: 4 + i })),
  ...['DO1', 'DO2'].map((name, i) => ({ controller: 'PLC2', name, type: OUTPUTS_16, baseByte: 4 + 2 * i, slot: 1 + i })),
  { controller: 'PLC2', name: 'RO1', type: RELAYS_8, baseByte: 8, slot: 3 },
  ...['DI1', 'DI2', 'DI3'].map((name, i) => ({ controller: 'PLC2', name, type: INPUTS_16, baseByte: 4 + 2 * i, slot: 4 + i })),
];

function brackwaterHardware(ids: DesignIds, name: string, description: string): Design {
  const { row } = ids;
  const catalogue = demoCatalogue(ids.catalogue);
  return {
    project: { ...DEFAULT_POLICIES, id: row('project'), name, description, timeZone: 'Europe/Amsterdam', slotMs: 60_000 },
    ...catalogue,
    points: [], dispensers: [], assignments: [],
    cabinets: cabinets(row),
    controllers: controllers(row),
    ...moduleRows(MODULES, catalogue.moduleTypes, (controller) => (controller === 'PLC1' ? 'C1' : 'C2'), ids),
    supplies: supplies(ids),
    circuits: circuits(row),
    cableNodes: boxes(row),
  };
}

function cabinets(row: SeedIds): Cabinet[] {
  return [
    { id: row('cabinet +K1'), location: '+K1', description: 'Cabinet at the foot of gallery 1', temperatureC: 40 },
    { id: row('cabinet +K2'), location: '+K2', description: 'Cabinet on the quay', temperatureC: 45 },
  ];
}

function controllers(row: SeedIds): Controller[] {
  return [
    { id: row('controller PLC1'), cabinetId: row('cabinet +K1'), name: 'PLC1' },
    { id: row('controller PLC2'), cabinetId: row('cabinet +K2'), name: 'PLC2' },
  ];
}

function supplies({ catalogue, row }: DesignIds): Supply[] {
  const supply = (cabinet: string): Supply => ({
    id: row(`supply ${cabinet}`), cabinetId: row(`cabinet ${cabinet}`), typeId: catalogue(SUPPLY_10), name: '-T1', setV: 24,
    internalOhm: 0.12, otherLoadA: 0, redundant: false,
  });
  return [supply('+K1'), supply('+K2')];
}

function circuits(row: SeedIds): Circuit[] {
  return [
    // More at once than one output group carries, and more than the far end of gallery 4 stands.
    { id: row('circuit C1'), supplyId: row('supply +K1'), name: 'C1', protection: 'breaker-B', protectionA: 6, protectionOhm: 0.06, concurrencyLimit: 10 },
    { id: row('circuit C2'), supplyId: row('supply +K2'), name: 'C2', protection: 'electronic', protectionA: 2.5, protectionOhm: 0.05, concurrencyLimit: 4 },
  ];
}

function boxes(row: SeedIds): CableNode[] {
  const box = (location: string, circuit: string, parent: string | null, cableTag: string, lengthM: number): CableNode => ({
    id: row(`box ${location}`), circuitId: row(`circuit ${circuit}`), parentId: parent === null ? null : row(`box ${parent}`),
    location, cableTag, lengthM, powerMm2: 4, signalMm2: 1, conductorClass: 5,
  });
  return [
    box('+JB1', 'C1', null, '-W1001', 20),
    // A slip of the pen for -W1002: the tag belongs to the cable of GC3-L01.
    box('+JB2', 'C1', '+JB1', '-W1301', 40),
    box('+JB3', 'C2', null, '-W2001', 30),
    box('+JB4', 'C2', null, '-W2002', 25),
  ];
}
