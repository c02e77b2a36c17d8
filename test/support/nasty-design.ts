import type { Assignment, Circuit, Design, Dispenser, Point, StatedPer } from '#calc';
import fc from 'fast-check';
import { buildAssignment, buildCircuit, buildDesign, buildLane, buildModule, buildNode } from './design-builder.ts';

/** Texts that a careless reader or writer of lists changes. */
const NASTY = [
  ...['=T1.GL1+K1-X1', '=1+1', '+K1', '-W1101', '@SUM(A1)', "'quoted", "'=1", "''", '1E5', '007', '3-4', 'TRUE', '1,480', '0,3', '12.5', '40 ft'],
  ...['n/a', '-', '#REF!', '24" hatch', '"', 'a;b\tc,d|e', 'line one\nline two', 'one\r\ntwo', 'Größe Ω 3 × 5', 'a\u00a0b', '８０', 'Total', 'Tag', 'null', '2026-03-02'],
];

const text = fc
  .oneof(fc.constantFrom(...NASTY), fc.string({ unit: 'grapheme', minLength: 1, maxLength: 24 }))
  // the database holds no control characters, and _x0041_ is how workbooks write a character by its code
  .filter((each) => each.trim() !== '' && !/[^\P{Cc}\t\r\n]|\ufeff|_x[\da-f]{4}_/iu.test(each));

/** Names as the contract has them: no blank at either end, no line end. */
const name = text.map((each) => each.replace(/\s+/gu, ' ').trim());
const size = fc.double({ min: 0.001, max: 99_999, noNaN: true });
const perhaps = <T>(value: fc.Arbitrary<T>): fc.Arbitrary<T | null> => fc.option(value, { nil: null, freq: 3 });

const pointPart = fc.record({
  ...{ description: perhaps(text), function: perhaps(text), location: perhaps(text), product: perhaps(text), machine: perhaps(text), remarks: perhaps(text) },
  ...{ boreMm: perhaps(size), outsideMm: perhaps(size), widthMm: perhaps(size), speedRpm: perhaps(size) },
  hoursPerDay: perhaps(fc.double({ min: 0.01, max: 24, noNaN: true })),
  daysPerWeek: fc.integer({ min: 1, max: 7 }),
  statedUl: perhaps(fc.integer({ min: 1, max: 10_000_000 })),
  statedPer: fc.constantFrom<StatedPer>('1000h', '100h', 'running-day', 'week', 'month'),
}) satisfies fc.Arbitrary<Partial<Point>>;

const dispenserPart = fc.record({
  typeId: fc.constantFrom('type-4', 'type-2', null),
  wiring: fc.constantFrom('four-core', 'two-core', null),
  cartridgeUl: fc.constantFrom(160_000, 80_500, null),
  doseUl: perhaps(fc.integer({ min: 1, max: 30 }).map((steps) => steps * 100)),
  ...{ cableTag: perhaps(text), cableLengthM: perhaps(size), crossSectionMm2: perhaps(fc.constantFrom(0.5, 0.75, 1.5)) },
  controllerId: fc.constantFrom('controller', null),
  circuitId: fc.constantFrom('c0', 'c1', null),
  nodeId: fc.constantFrom('box', null),
}) satisfies fc.Arbitrary<Partial<Dispenser>>;

const lane = fc.record({ tag: name, point: pointPart, dispenser: dispenserPart, mapped: fc.constantFrom('both', 'output', 'none') });

/** Projects of a few points in any state that a project can be in, sound or not. */
export const nastyDesign: fc.Arbitrary<Design> = fc
  .record({
    lanes: fc.uniqueArray(lane, { minLength: 1, maxLength: 10, selector: ({ tag }) => tag }),
    circuits: fc.uniqueArray(name, { minLength: 2, maxLength: 2 }),
    box: name,
  })
  .map(({ lanes, circuits, box }) => buildDesign({
    lanes: lanes.map(({ tag, point, dispenser }, i) => buildLane(`P${i}`, dispenser, { ...point, tag })),
    circuits: circuits.map((each, i): Circuit => buildCircuit({ id: `c${i}`, name: each })),
    cableNodes: [buildNode({ circuitId: 'c0', location: box })],
    modules: [buildModule({ id: 'DO', name: 'DO 1' }), buildModule({ id: 'DI', name: '-1', typeId: 'in-16', slot: 2 })],
    assignments: lanes.flatMap(({ mapped }, i): Assignment[] => [
      ...(mapped === 'none' ? [] : [buildAssignment(`P${i}`, 'DO', i)]),
      ...(mapped === 'both' ? [buildAssignment(`P${i}`, 'DI', i, 'status')] : []),
    ]),
  }));
