import type { Assignment, CableNode, Circuit, Design, Dispenser, Module, ModuleGroup, Point, Supply } from '#calc';
import {
  buildAssignment, buildCircuit, buildDesign, buildFourCoreType, buildGroup, buildInputType, buildLane, buildModule, buildNode, buildOutputType,
  buildProject, buildSupply, buildSupplyType, buildTwoCoreType,
} from '../support/design-builder.ts';

/** Galleries, and so junction boxes, of one circuit. */
const GALLERIES = 5;
const CIRCUITS_PER_SUPPLY = 3;
/** Channels in use of a module of sixteen: the rest is spare. */
const USED_CHANNELS = 12;
const BEARINGS = [
  { boreMm: 60, outsideMm: 110, widthMm: 28 }, { boreMm: 75, outsideMm: 130, widthMm: 31 }, { boreMm: 100, outsideMm: 180, widthMm: 46 },
  { boreMm: 120, outsideMm: 215, widthMm: 58 }, { boreMm: 140, outsideMm: 250, widthMm: 68 },
];

interface Rows {
  readonly lanes: { dispenser: Dispenser; point: Point }[];
  readonly circuits: Circuit[];
  readonly supplies: Supply[];
  readonly cableNodes: CableNode[];
  readonly modules: Module[];
  readonly moduleGroups: ModuleGroup[];
  readonly assignments: Assignment[];
}

/**
 * A plant of conveyor galleries, five to twelve dispensers on the box of each: circuits of five galleries
 * with a limit k, three on a supply, modules of sixteen channels with spares. Two thirds of the lanes are
 * four-core, a few on their own clock; demand from the bearing, stated or from practice. Most of it passes
 * its checks, as in a project that is nearly done; a lane in thirty has something wrong.
 */
export function galleryDesign(lanes: number): Design {
  const rows: Rows = { lanes: [], circuits: [], supplies: [], cableNodes: [], modules: [], moduleGroups: [], assignments: [] };
  for (let c = 0; rows.lanes.length < lanes; c++) addCircuit(rows, c, lanes);
  return buildDesign({
    ...rows,
    project: buildProject({ sparePercent: 15, maxCartridgeDays: 550, minCartridgeDays: 10 }),
    dispenserTypes: [
      buildFourCoreType({ id: 'type-4', runA: 0.22, minV: 18, protectionLevels: ['Db'] }),
      buildFourCoreType({ id: 'type-4l', runA: 0.3, idleA: 0.025, minV: 18, cartridgesUl: [160_000, 400_000], protectionLevels: ['Db'] }),
      buildTwoCoreType({ offStateA: 0.002, minV: 16, protectionLevels: ['Db'] }),
    ],
    moduleTypes: [buildOutputType({ groupA: 3, moduleA: 5 }), buildInputType()],
    supplyTypes: [buildSupplyType({ ratedA: 20, shortCircuitA: 60 })],
    greases: [{ id: 'grease', name: 'EP 2', nlgi: '2', thickener: 'lithium complex', densityGPerCm3: 0.92 }],
  });
}

function addCircuit(rows: Rows, c: number, most: number): void {
  const supplyId = `s${Math.floor(c / CIRCUITS_PER_SUPPLY)}`;
  if (c % CIRCUITS_PER_SUPPLY === 0) rows.supplies.push(buildSupply({ id: supplyId, name: `-T${rows.supplies.length + 1}`, internalOhm: 0.01 }));
  rows.circuits.push(buildCircuit({ id: `c${c}`, name: `C${c + 1}`, supplyId, protection: 'electronic', protectionA: 6, protectionOhm: 0.02, concurrencyLimit: 3 + (c % 3) }));
  const first = rows.lanes.length;
  for (let g = 0; g < GALLERIES; g++) addGallery(rows, c, g, most);
  for (let i = first, m = 0; i < rows.lanes.length; i += USED_CHANNELS, m++) addModules(rows, c, m, i, Math.min(rows.lanes.length, i + USED_CHANNELS));
}

function addGallery(rows: Rows, c: number, g: number, most: number): void {
  const id = `c${c}b${g}`;
  rows.cableNodes.push(buildNode({
    id, circuitId: `c${c}`, parentId: g === 0 ? null : `c${c}b${g > 2 ? g - 2 : g - 1}`, location: `+JB${c}.${g}`, cableTag: `-W${c}.${g}`,
    lengthM: 14 + ((c + g) % 5) * 4, powerMm2: 6,
  }));
  const dispensers = 5 + ((c * GALLERIES + g) * 7) % 8;
  for (let d = 0; d < dispensers && rows.lanes.length < most; d++) rows.lanes.push(galleryLane(c, id, rows.lanes.length));
}

/** Lane n of the plant: type, demand and cable vary with its number. */
function galleryLane(c: number, nodeId: string, n: number): { dispenser: Dispenser; point: Point } {
  const name = `G${c}-${String(n).padStart(5, '0')}`;
  const two = n % 3 === 2;
  const timed = !two && n % 40 === 0;
  const large = n % 5 === 1 && !two;
  const lane = {
    typeId: two ? 'type-2' : large ? 'type-4l' : 'type-4', wiring: two ? ('two-core' as const) : ('four-core' as const),
    method: timed ? ('timed' as const) : ('pulse' as const), periodMonths: timed ? 6 : null, circuitId: `c${c}`, nodeId,
    cableLengthM: 3 + (n % 17), crossSectionMm2: n % 4 === 0 ? 1 : 0.75, cartridgeUl: large ? 400_000 : 160_000, doseUl: 200 + 100 * (n % 9),
  };
  return buildLane(name, lane, { greaseId: 'grease', zone: n % 2 === 0 ? '22' : 'none', product: `-P${n}`, function: `=G${c}`, hoursPerDay: 8 + (n % 33) / 2, ...demandOfLane(n) });
}

function demandOfLane(n: number): Partial<Point> {
  if (n % 10 === 9) return { demandWay: 'practice', practiceStrokes: 2 + (n % 5), practiceGramsPerStroke: 1.2, practiceEveryDays: 7 + (n % 3) };
  if (n % 10 > 5) return { statedUl: 30_000 + 100 * (n % 700) };
  const factors = { temperature: 0.8, contamination: 0.4 + (n % 4) / 10, moisture: 0.7, vibration: 0.9, position: n % 2 === 0 ? 1 : 0.5, design: 1 };
  return { demandWay: 'bearing', ...BEARINGS[n % BEARINGS.length], speedRpm: 300 + (n % 480), factors };
}

function addModules(rows: Rows, c: number, m: number, from: number, to: number): void {
  const slot = rows.modules.length;
  const [out, input] = [`DO${c}.${m}`, `DI${c}.${m}`];
  rows.modules.push(buildModule({ id: out, name: out, slot, baseByte: 2 * slot }), buildModule({ id: input, name: input, typeId: 'in-16', slot: slot + 1, baseByte: 2 * slot }));
  rows.moduleGroups.push(buildGroup(out, 0, `c${c}`), buildGroup(out, 1, `c${c}`));
  for (let i = from; i < to; i++) {
    const { dispenser } = rows.lanes[i];
    // A lane in thirty is not mapped yet.
    if (dispenser.method === 'pulse' && i % 30 !== 17) rows.assignments.push(buildAssignment(dispenser.id, out, i - from));
    if (dispenser.wiring === 'four-core') rows.assignments.push(buildAssignment(dispenser.id, input, i - from, 'status'));
  }
}
