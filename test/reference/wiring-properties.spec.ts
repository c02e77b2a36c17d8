import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assess, type Assessment, type Design, STANDARD_SECTIONS_MM2 } from '#calc';
import { buildDesign, buildFourCoreType, buildLane, buildNode, buildSupply, buildSupplyType } from '#support/design-builder.ts';
import { modelOf, solveSubset } from '#support/circuit-model.ts';
import { arbitraryCircuit, permittedSets } from '#support/random-circuit.ts';
import { runs } from '#support/property-runs.ts';

/** Judged by a model of its own that walks currents edge by edge (Kirchhoff), over every permitted set. */
interface Brute {
  readonly runV: Map<string, number>;
  readonly idleV: Map<string, number>;
  readonly collapses: boolean;
}

function lowestV(design: Design): number {
  return design.supplies[0].setV * (1 - design.supplyTypes[0].tolerancePercent! / 100);
}

function bruteForce(design: Design): Brute {
  const model = modelOf(design, lowestV(design));
  const brute: Brute & { collapses: boolean } = { runV: new Map(), idleV: new Map(), collapses: false };
  for (const set of permittedSets(design)) {
    const solved = solveSubset(model, set);
    if (!solved) brute.collapses = true;
    for (const lane of model.lanes) {
      const lowest = set.has(lane.id) || lane.timed ? brute.runV : brute.idleV;
      lowest.set(lane.id, Math.min(lowest.get(lane.id) ?? Infinity, solved?.get(lane.id) ?? -Infinity));
    }
  }
  return brute;
}

function withLimit(design: Design, concurrencyLimit: number | null): Design {
  return { ...design, circuits: [{ ...design.circuits[0], concurrencyLimit }] };
}

function voltages(assessment: Assessment): number[] {
  return [...assessment.lanes.values()].map((lane) => lane.worst?.volts ?? -Infinity);
}

describe('worst case under k, constant current', () => {
  it('is the lowest voltage over every permitted set, to 1e-9 V', () => {
    fc.assert(fc.property(arbitraryCircuit({ lanes: 7 }), (design) => {
      const brute = bruteForce(design);
      for (const [id, lane] of assess(design).lanes) {
        expect(lane.worst!.volts).toBeCloseTo(brute.runV.get(id)!, 9);
        if (lane.idle) expect(lane.idle.volts).toBeCloseTo(brute.idleV.get(id)!, 9);
      }
    }), { numRuns: runs(60) });
  });

  it('names a set that causes it, the lane first, no more than k', () => {
    fc.assert(fc.property(arbitraryCircuit({ lanes: 6 }), (design) => {
      const model = modelOf(design, lowestV(design));
      for (const [id, { worst }] of assess(design).lanes) {
        const timed = model.lanes.find((lane) => lane.id === id)!.timed;
        const limited = worst!.worstSet.filter((other) => !model.lanes.find((lane) => lane.id === other)!.timed);
        expect(limited.length).toBeLessThanOrEqual(design.circuits[0].concurrencyLimit!);
        expect(worst!.worstSet).toContain(id);
        expect(solveSubset(model, new Set(worst!.worstSet))!.get(id)).toBeCloseTo(worst!.volts, 9);
        if (timed) expect(limited).not.toContain(id);
      }
    }), { numRuns: runs(60) });
  });

  it('falls from station to station along the lane', () => {
    fc.assert(fc.property(arbitraryCircuit({ lanes: 6 }), (design) => {
      for (const { profile, worst, aloneV } of assess(design).lanes.values()) {
        for (let s = 1; s < profile.length; s++) {
          expect(profile[s].worstV).toBeLessThanOrEqual(profile[s - 1].worstV + 1e-9);
          expect(profile[s].aloneV).toBeLessThanOrEqual(profile[s - 1].aloneV + 1e-9);
        }
        expect(profile.at(-1)).toMatchObject({ worstV: worst!.volts, aloneV });
      }
    }), { numRuns: runs(40) });
  });

  it('only falls as k grows, down to the figure with all on', () => {
    fc.assert(fc.property(arbitraryCircuit({ lanes: 6 }), (design) => {
      let before = voltages(assess(withLimit(design, 1)));
      for (let k = 2; k <= 6; k++) {
        const now = voltages(assess(withLimit(design, k)));
        now.forEach((volts, i) => expect(volts).toBeLessThanOrEqual(before[i] + 1e-9));
        before = now;
      }
      const all = [...assess(design).lanes.values()].map((lane) => lane.allOn!.volts);
      all.forEach((volts, i) => expect(volts).toBeCloseTo(before[i], 9));
    }), { numRuns: runs(20) });
  });
});

describe('smallest passing cross-section of the own cable', () => {
  it('passes, and the next smaller does not', () => {
    fc.assert(fc.property(arbitraryCircuit({ lanes: 4 }), fc.integer({ min: 190, max: 233 }), (circuit, tenths) => {
      const minV = tenths / 10;
      const design = { ...circuit, dispenserTypes: circuit.dispenserTypes.map((type) => ({ ...type, minV })) };
      const smallest = assess(design).lanes.get('L0')!.smallestPassingMm2;
      const passes = (crossSectionMm2: number): boolean => {
        const dispensers = design.dispensers.map((d) => (d.id === 'L0' ? { ...d, crossSectionMm2 } : d));
        const { worst, idle } = assess({ ...design, dispensers }).lanes.get('L0')!;
        return worst!.volts >= minV - 1e-9 && (!idle || idle.volts >= minV - 1e-9);
      };
      if (smallest === null) {
        expect(passes(16)).toBe(false);
        return;
      }
      expect(passes(smallest)).toBe(true);
      const smaller = STANDARD_SECTIONS_MM2[STANDARD_SECTIONS_MM2.indexOf(smallest) - 1];
      if (smaller !== undefined) expect(passes(smaller)).toBe(false);
    }), { numRuns: runs(80) });
  });
});

describe('linear laws, constant current', () => {
  const chain = (lengthM: number, runs: readonly number[]): Assessment =>
    assess(buildDesign({
      supplyTypes: [buildSupplyType({ tolerancePercent: 0 })],
      supplies: [buildSupply()],
      dispenserTypes: runs.map((runA, i) => buildFourCoreType({ id: `t${i}`, runA, idleA: 0, controlInputA: null })),
      cableNodes: [buildNode({ lengthM })],
      lanes: runs.map((_, i) => buildLane(`L${i}`, { typeId: `t${i}`, nodeId: 'box', cableLengthM: lengthM })),
    }));
  const drop = (assessment: Assessment): number => 24 - assessment.lanes.get('L0')!.worst!.volts;
  const amps = fc.integer({ min: 1, max: 400 }).map((n) => n / 1000);

  it('half the length makes half the drop', () => {
    fc.assert(fc.property(fc.integer({ min: 2, max: 60 }), amps, amps, (length, a, b) => {
      expect(drop(chain(length / 2, [a, b]))).toBeCloseTo(drop(chain(length, [a, b])) / 2, 9);
    }), { numRuns: runs(50) });
  });

  it('drops of two loads add up (superposition)', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 60 }), amps, amps, (length, a, b) => {
      expect(drop(chain(length, [a, b]))).toBeCloseTo(drop(chain(length, [a, 0])) + drop(chain(length, [0, b])), 9);
    }), { numRuns: runs(50) });
  });
});

describe('worst case under k, constant power', () => {
  it('is a bound that no permitted set goes below, close to the lowest', () => {
    fc.assert(fc.property(arbitraryCircuit({ lanes: 6, constantPower: true }), (design) => {
      const brute = bruteForce(design);
      for (const [id, lane] of assess(design).lanes) {
        if (!lane.worst) {
          expect(lane.collapsed).toBe(true);
          continue;
        }
        expect(brute.collapses).toBe(false);
        expect(lane.worst.volts).toBeLessThanOrEqual(brute.runV.get(id)! + 1e-8);
        if (!lane.worst.bound) expect(lane.worst.volts).toBeCloseTo(brute.runV.get(id)!, 7);
        if (lane.idle) expect(lane.idle.volts).toBeLessThanOrEqual(brute.idleV.get(id)! + 1e-8);
      }
    }), { numRuns: runs(60) });
  });

  it('never gives NaN, however large the loads: it says that the voltage collapses', () => {
    fc.assert(fc.property(arbitraryCircuit({ lanes: 5, constantPower: true }), fc.integer({ min: 1, max: 200 }), (circuit, factor) => {
      const design = { ...circuit, dispenserTypes: circuit.dispenserTypes.map((type) => ({ ...type, runA: type.runA * factor })) };
      const { lanes, circuits, supplies } = assess(design);
      for (const lane of lanes.values()) {
        expect(lane.collapsed).toBe(lane.worst === null);
        if (lane.worst) expect(lane.worst.volts).toBeGreaterThan(0);
      }
      expect(Number.isFinite(circuits.get('circuit')!.worstA)).toBe(true);
      expect(Number.isFinite(supplies.get('supply')!.demandA)).toBe(true);
    }), { numRuns: runs(60) });
  });
});
