import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assess, type Design } from '#calc';
import { arbitraryCircuit } from '#support/random-circuit.ts';
import { runs } from '#support/property-runs.ts';

const BAD = /^(VD-01|VD-02|VD-04|IO-03|IO-05|SU-01|PR-01)/;

function withLimit(design: Design, circuitId: string, concurrencyLimit: number | null): Design {
  return { ...design, circuits: design.circuits.map((c) => (c.id === circuitId ? { ...c, concurrencyLimit } : c)) };
}

/** Two random circuits with rows of their own, on one supply and one output module, each with half the lanes of it. */
function onOneSupply(first: Design, second: Design): Design {
  const renamed = JSON.parse(JSON.stringify(second), (key, value: unknown) => {
    if (typeof value !== 'string') return value;
    if (/^(L|P-|point-L|b|t|-W)\d*/.test(value) && /^(id|pointId|nodeId|parentId|typeId|dispenserId|cableTag|tag)$/.test(key) && /\d/.test(value)) return `${value}x`;
    return value === 'circuit' && /^(id|circuitId)$/.test(key) ? 'second' : value;
  }) as Design;
  const lanes = first.dispensers.length;
  return {
    ...first,
    circuits: [...first.circuits, { ...renamed.circuits[0], name: 'C2' }],
    dispenserTypes: [...first.dispenserTypes, ...renamed.dispenserTypes.filter((type) => type.id.startsWith('t'))],
    cableNodes: [...first.cableNodes, ...renamed.cableNodes.map((node) => ({ ...node, location: `${node.location}x` }))],
    points: [...first.points, ...renamed.points],
    dispensers: [...first.dispensers, ...renamed.dispensers.map((d) => ({ ...d, circuitId: 'second' }))],
    assignments: [...first.assignments, ...renamed.assignments.map((a) => ({ ...a, id: `${a.id}x`, moduleId: 'DO1', channel: a.channel + lanes }))],
  };
}

/** Every lane asks for a voltage that lies near what such circuits give; protection and group near their loads. */
function demanding(design: Design, minV: number, protectionA: number, groupA: number): Design {
  return {
    ...design,
    dispenserTypes: design.dispenserTypes.map((type) => ({ ...type, minV })),
    moduleTypes: design.moduleTypes.map((type) => (type.kind === 'output' ? { ...type, groupA } : type)),
    circuits: design.circuits.map((circuit) => ({ ...circuit, protectionA })),
  };
}

/**
 * What limit k of a circuit brings about: errors of the circuit's own lanes, of groups, modules, supply
 * and protection; of lanes and protection of other circuits only what is not there with none of its lanes running.
 */
function errorsFrom(design: Design, circuitId: string, k: number): string[] {
  const own = new Set(design.dispensers.filter((d) => d.circuitId === circuitId).map((d) => d.id));
  const found = (limit: number) => assess(withLimit(design, circuitId, limit)).findings.filter((f) => BAD.test(f.code));
  const without = new Set(found(0).map((f) => f.key));
  return found(k)
    .filter((f) => !without.has(f.key) || !(f.code.startsWith('VD') || f.code.startsWith('PR')) || own.has(f.subject.id) || f.subject.id === circuitId)
    .map((f) => f.key);
}

function judge(design: Design, circuitId: string): void {
  const lanes = design.dispensers.filter((d) => d.circuitId === circuitId).length;
  const largest = assess(design).circuits.get(circuitId)!.largestPassingK!;
  if (largest > 0) expect(errorsFrom(design, circuitId, largest)).toEqual([]);
  if (largest < lanes) expect(errorsFrom(design, circuitId, largest + 1)).not.toEqual([]);
}

const minimum = fc.integer({ min: 170, max: 230 }).map((tenths) => tenths / 10);
const rating = fc.integer({ min: 5, max: 40 }).map((tenths) => tenths / 10);

describe.each([
  { kind: 'constant current', constantPower: false },
  { kind: 'constant power', constantPower: true },
])('largest passing k, $kind', ({ constantPower }) => {
  it('passes, and one more does not: one circuit', () => {
    fc.assert(fc.property(arbitraryCircuit({ lanes: 6, constantPower }), minimum, rating, rating, (circuit, minV, protectionA, groupA) => {
      judge(demanding(circuit, minV, protectionA, groupA), 'circuit');
    }), { numRuns: runs(60) });
  });

  it('passes, and one more does not: two circuits that share their supply', () => {
    const circuit = arbitraryCircuit({ lanes: 4, constantPower });
    const shared = fc.integer({ min: 0, max: 15 }).map((tenths) => tenths / 10);
    fc.assert(fc.property(circuit, circuit, minimum, rating, rating, shared, (first, second, minV, protectionA, groupA, internalOhm) => {
      const both = demanding(onOneSupply(first, second), minV, protectionA, groupA);
      const design = { ...both, supplies: both.supplies.map((supply) => ({ ...supply, internalOhm })) };
      judge(design, 'circuit');
      judge(design, 'second');
    }), { numRuns: runs(60) });
  });
});

describe('largest passing k beside a weaker circuit', () => {
  it('is held by a lane of the other circuit that it would push under its minimum', () => {
    const circuit = fc.sample(arbitraryCircuit({ lanes: 4 }), { seed: 7, numRuns: 2 });
    const design = { ...onOneSupply(circuit[0], circuit[1]), supplies: circuit[0].supplies.map((supply) => ({ ...supply, internalOhm: 0.5 })) };
    const at = (k: number) => Math.min(...circuit[0].dispensers.map((d) => assess(withLimit(design, 'second', k)).lanes.get(d.id)!.worst!.volts));
    const [two, three] = [at(2), at(3)];
    expect(three).toBeLessThan(two);
    const own = new Set(circuit[0].dispensers.map((d) => d.typeId));
    const between = { ...design, dispenserTypes: design.dispenserTypes.map((type) => ({ ...type, minV: own.has(type.id) ? (two + three) / 2 : 1 })) };
    expect(assess(between).circuits.get('second')!.largestPassingK).toBe(2);
  });
});
