import { isDeepStrictEqual } from 'node:util';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildAssignment, buildLane } from '#support/design-builder.ts';
import { largeDesign } from '#support/large-design.ts';
import { runs } from '#support/property-runs.ts';
import { assess, createAssessor } from './assess.ts';
import type { Assessment } from './assessment.ts';
import type { Collection, Design } from './design.ts';

/** Values that an edit may give a field: good ones, blanks, and ids that lead nowhere. */
const FIELDS: Readonly<Partial<Record<Collection, Readonly<Record<string, readonly unknown[]>>>>> = {
  points: {
    statedUl: [null, 20_000, 90_000], hoursPerDay: [null, 7.5, 24], zone: [null, '22', 'none'], tag: ['L0-0001', 'New tag'], product: [null, '-P1', '-P2'],
    greaseId: [null, 'grease', 'gone'], demandWay: [null, 'stated', 'practice'], practiceStrokes: [null, 3], practiceGramsPerStroke: [1.2], practiceEveryDays: [7],
  },
  dispensers: {
    doseUl: [null, 300, 550, 2500], cartridgeUl: [null, 160_000], typeId: [null, 'type-2', 'type-4', 'gone'], wiring: [null, 'two-core', 'four-core'],
    method: ['pulse', 'timed'], periodMonths: [null, 6], circuitId: [null, 'c0', 'c1', 'c2', 'gone'], nodeId: [null, 'c0b1', 'c1b3', 'gone'],
    cableLengthM: [null, 5, 80], crossSectionMm2: [null, 0.5, 0.6, 1.5], cableTag: [null, '-W1', '-W0.1'], controllerId: [null, 'controller', 'gone'],
    pointId: ['point-L0-0000', 'point-L1-0002', 'gone'],
  },
  assignments: { channel: [0, 3, 3, 15, 99, -1], moduleId: ['DO0.0', 'DI0.0', 'DO1.0', 'gone'], purpose: ['control', 'status'], dispenserId: ['L0-0001', 'L1-0002', 'gone'] },
  modules: { typeId: ['out-16', 'in-16', 'gone'], controllerId: ['controller', 'gone'], baseByte: [0, 2, 300], name: ['DO7'] },
  moduleGroups: { circuitId: [null, 'c0', 'c2', 'gone'], groupIndex: [0, 1, 5] },
  circuits: { concurrencyLimit: [null, 1, 2, 4], supplyId: ['s0', 's1', 'gone'], protectionA: [0.5, 6], protection: ['breaker-B', 'fuse', 'electronic'], name: ['Renamed'] },
  supplies: { internalOhm: [0, 0.5], setV: [19, 24], otherLoadA: [0, 12], cabinetId: ['cabinet', 'gone'], typeId: ['supply-10', 'gone'], name: ['-T9'] },
  cableNodes: { lengthM: [1, 400], parentId: [null, 'c0b0', 'c0b3', 'c1b1', 'gone'], circuitId: ['c0', 'c1'], powerMm2: [2.5, 3], location: ['+JB0.0', '+JB9'] },
  cabinets: { temperatureC: [30, 65], location: ['+K1', '+K2'] },
  controllers: { name: ['PLC9'] },
  dispenserTypes: { runA: [0.1, 2], load: ['constant-current', 'constant-power'], minV: [18, 23.5], status: [null], protectionLevels: [[], ['Da']] },
  moduleTypes: { groupA: [null, 0.3, 2], channels: [8, 16], technology: ['transistor', 'relay'], dropV: [0.2, 3], leakageA: [0.0005, 0.01], ratedOperations: [null, 1000] },
  supplyTypes: { tolerancePercent: [null, 3], ratedA: [1, 10], shortCircuitA: [2, 15] },
  greases: { densityGPerCm3: [0.8, 1] },
};
const POLICIES = { voltageTempC: [20, 60], slotMs: [null, 60_000], maxCartridgeDays: [30, 400], sparePercent: [0, 60], breakerDcFactor: [1, 2], name: ['Renamed'] };
type Row = { readonly id: string };
const COLLECTIONS = Object.keys(FIELDS) as Collection[];

type Edit = (design: Design) => Design;
const rowsOf = (design: Design, collection: Collection): readonly Row[] => design[collection];
const withRows = (design: Design, collection: Collection, rows: readonly Row[]): Design => ({ ...design, [collection]: rows });

const anEdit: fc.Arbitrary<Edit> = fc.oneof(
  { weight: 12, arbitrary: fc.tuple(fc.constantFrom(...COLLECTIONS), fc.nat(), fc.nat(), fc.nat()).map(([collection, at, field, value]): Edit => (design) => {
    const rows = rowsOf(design, collection);
    if (rows.length === 0) return design;
    const row = rows[at % rows.length];
    const [name, values] = Object.entries(FIELDS[collection]!)[field % Object.keys(FIELDS[collection]!).length];
    return withRows(design, collection, rows.map((each) => (each === row ? { ...row, [name]: values[value % values.length] } : each)));
  }) },
  { weight: 3, arbitrary: fc.tuple(fc.constantFrom(...COLLECTIONS), fc.nat()).map(([collection, at]): Edit => (design) => {
    const rows = rowsOf(design, collection);
    return withRows(design, collection, rows.filter((_, i) => i !== at % Math.max(1, rows.length)));
  }) },
  { weight: 2, arbitrary: fc.tuple(fc.nat(1000), fc.constantFrom('c0', 'c1', null)).map(([n, circuitId]): Edit => (design) => {
    const { point, dispenser } = buildLane(`N${n}-${design.dispensers.length}`, { circuitId });
    return { ...design, points: [...design.points, point], dispensers: [dispenser, ...design.dispensers] };
  }) },
  { weight: 3, arbitrary: fc.tuple(fc.nat(), fc.nat(15), fc.constantFrom('DO0.0', 'DI0.0', 'DO1.0'), fc.constantFrom('control' as const, 'status' as const)).map(([at, channel, moduleId, purpose]): Edit => (design) => {
    const lane = design.dispensers.at(at % Math.max(1, design.dispensers.length));
    const row = lane && { ...buildAssignment(lane.id, moduleId, channel, purpose), id: `a${design.assignments.length}-${at}` };
    return row ? { ...design, assignments: [...design.assignments, row] } : design;
  }) },
  { weight: 1, arbitrary: fc.constantFrom(...Object.entries(POLICIES)).chain(([name, values]) => fc.constantFrom<unknown>(...values).map((value): Edit => (design) => ({
    ...design, project: { ...design.project, [name]: value },
  }))) },
  { weight: 1, arbitrary: fc.constant<Edit>((design) => ({ ...design, dispensers: [...design.dispensers].reverse() })) },
);

const start: Design = { ...largeDesign(15, 5), greases: [{ id: 'grease', name: 'EP 2', nlgi: '2', thickener: 'lithium', densityGPerCm3: 0.9 }] };

/** The quick comparison first: the one that tells the difference takes its time. */
function expectSame(kept: Assessment, anew: Assessment): void {
  if (!isDeepStrictEqual(kept, anew)) expect(kept).toEqual(anew);
  expect([...kept.lanes.keys()]).toEqual([...anew.lanes.keys()]);
}

describe('createAssessor', () => {
  it('gives what assess gives, whatever is edited in between', () => {
    fc.assert(fc.property(fc.array(anEdit, { minLength: 1, maxLength: 8 }), (edits) => {
      const reassess = createAssessor();
      let design = start;
      reassess(design);
      for (const edit of edits) {
        design = edit(design);
        expectSame(reassess(design), assess(design));
      }
    }), { numRuns: runs(40) });
  }, 60_000);

  it('keeps the figures of lanes that an edit does not touch as the same objects', () => {
    const reassess = createAssessor();
    const before = reassess(start);
    const dispensers = start.dispensers.map((d) => (d.id === 'L0-0001' ? { ...d, doseUl: 700 } : d));
    const after = reassess({ ...start, dispensers });
    expect(after.lanes.get('L0-0001')?.plan?.runMs).toBe(28_000);
    expect(after.lanes.get('L2-0001')).toBe(before.lanes.get('L2-0001'));
    expect(after.points).toBe(before.points);
  });

  it('changes nothing in what it gave before', () => {
    const reassess = createAssessor();
    const before = reassess(start);
    const copy = structuredClone(before);
    reassess({ ...start, circuits: start.circuits.map((c) => ({ ...c, concurrencyLimit: 1 })), assignments: start.assignments.slice(3) });
    expect(before).toEqual(copy);
  });
});
