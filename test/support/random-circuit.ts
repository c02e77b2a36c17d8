import fc from 'fast-check';
import type { Design, DispenserType } from '#calc';
import {
  buildAssignment, buildCircuit, buildDesign, buildFourCoreType, buildGroup, buildLane, buildModule, buildNode, buildProject, buildSupply,
  buildSupplyType, buildTwoCoreType,
} from './design-builder.ts';

export interface CircuitShape {
  readonly lanes: number;
  readonly constantPower?: boolean;
}

const metres = (max: number): fc.Arbitrary<number> => fc.integer({ min: 0, max: max * 10 }).map((n) => n / 10);
const pick = <T>(...values: T[]): fc.Arbitrary<T> => fc.constantFrom(...values);

/** A circuit of one to five boxes with mixed two-core and four-core lanes, each of a type of its own. */
export function arbitraryCircuit({ lanes, constantPower }: CircuitShape): fc.Arbitrary<Design> {
  const box = fc.record({ up: fc.nat(5), lengthM: metres(60), powerMm2: pick(1.5, 2.5, 4), signalMm2: pick(0.5, 0.75, 1) });
  const lane = fc.record({
    at: fc.nat(5), fourCore: fc.boolean(), timed: fc.integer({ min: 0, max: 5 }).map((n) => n === 0), lengthM: metres(40),
    section: pick(0.5, 0.75, 1.5), runMilliA: fc.integer({ min: 50, max: 400 }), idleMilliA: fc.integer({ min: 0, max: 40 }), controlMilliA: fc.integer({ min: 0, max: 10 }),
  });
  return fc.record({
    boxes: fc.array(box, { minLength: 1, maxLength: 5 }),
    lanes: fc.array(lane, { minLength: lanes, maxLength: lanes }),
    k: fc.integer({ min: 1, max: lanes }),
    internalMilliOhm: fc.nat(100),
    protectionMilliOhm: fc.nat(200),
  }).map(({ boxes, lanes: rows, k, internalMilliOhm, protectionMilliOhm }) => {
    const load = constantPower ? ('constant-power' as const) : ('constant-current' as const);
    const types: DispenserType[] = rows.map((row, i) => {
      const common = { id: `t${i}`, runA: row.runMilliA / 1000, load };
      return row.fourCore
        ? buildFourCoreType({ ...common, idleA: row.idleMilliA / 1000, controlInputA: row.controlMilliA / 1000 })
        : buildTwoCoreType(common);
    });
    return buildDesign({
      project: buildProject(),
      supplyTypes: [buildSupplyType({ tolerancePercent: 2 })],
      supplies: [buildSupply({ internalOhm: internalMilliOhm / 1000, otherLoadA: 0.5 })],
      circuits: [buildCircuit({ concurrencyLimit: k, protectionOhm: protectionMilliOhm / 1000 })],
      dispenserTypes: types,
      cableNodes: boxes.map(({ up, ...row }, i) =>
        buildNode({ ...row, id: `b${i}`, location: `+JB${i}`, cableTag: `-W${i}`, parentId: up < i ? `b${up}` : null })),
      lanes: rows.map((row, i) => buildLane(`L${i}`, {
        typeId: `t${i}`, wiring: row.fourCore ? 'four-core' : 'two-core', method: row.timed && row.fourCore ? 'timed' : 'pulse',
        nodeId: row.at < boxes.length ? `b${row.at}` : null, cableLengthM: row.lengthM, crossSectionMm2: row.section,
      })),
      modules: [buildModule()],
      moduleGroups: [buildGroup('DO1', 0), buildGroup('DO1', 1)],
      assignments: rows.map((_, i) => buildAssignment(`L${i}`, 'DO1', i)),
    });
  });
}

/** Every set of at most k of the lanes that obey the limit. */
export function permittedSets(design: Design): Set<string>[] {
  const free = design.dispensers.filter((d) => d.method === 'pulse').map((d) => d.id);
  const k = design.circuits[0].concurrencyLimit ?? free.length;
  const sets: Set<string>[] = [];
  for (let mask = 0; mask < 1 << free.length; mask++) {
    const set = new Set(free.filter((_, i) => mask & (1 << i)));
    if (set.size <= k) sets.push(set);
  }
  return sets;
}
