import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { RankBy } from '#calc';
import { alternatives, assessPoint, demandOf, pulsePlan, timedPlan, type Alternative, type PulsePlanInput } from '../../libs/calc/src/points/index.ts';
import { aBearingPoint, aContext, aDispenser, aPoint, aProject, aType } from '../../libs/calc/src/points/testing/rows.ts';
import { runs } from '#support/property-runs.ts';

const SPAN_MS = 3_600_000_000n;
const doseUl = fc.integer({ min: 1, max: 50 }).map((steps) => steps * 100);
const demandUlPer1000h = fc.integer({ min: 1, max: 5_000_000 });
const hoursPerDay = fc.integer({ min: 1, max: 48 }).map((half) => half / 2);
const daysPerWeek = fc.integer({ min: 1, max: 7 });
const slotMs = fc.option(fc.integer({ min: 100, max: 120_000 }), { nil: null });

const inputs: fc.Arbitrary<PulsePlanInput> = fc.record({
  demandUlPer1000h, doseUl, hoursPerDay, daysPerWeek, slotMs,
  cartridgeUl: fc.integer({ min: 10_000, max: 500_000 }),
  type: fc.integer({ min: 0, max: 5_000 }).map((residualUl) => aType({ residualUl })),
});

/** Runs the check where a plan exists. */
function forPlans(check: (plan: NonNullable<ReturnType<typeof pulsePlan>>, input: PulsePlanInput) => void): void {
  fc.assert(fc.property(inputs, (input) => {
    const plan = pulsePlan(input);
    if (plan) check(plan, input);
  }), { numRuns: runs(400) });
}

describe('pulse plan (source: definition of the interval, rounded down)', () => {
  it('never gives less grease than the demand, also after rounding to slots', () => {
    forPlans((plan, input) => {
      expect(BigInt(input.doseUl) * SPAN_MS >= BigInt(plan.intervalMs) * BigInt(input.demandUlPer1000h)).toBe(true);
    });
  });

  it('rounds to whole slots and loses less than one', () => {
    forPlans((plan, { slotMs: slot }) => {
      const step = slot ?? 1;
      expect(plan.intervalMs % step).toBe(0);
      expect(plan.exactIntervalMs - plan.intervalMs).toBeLessThan(step + 1e-3);
    });
  });

  it('keeps over-greasing from 0 to what one slot can cost', () => {
    forPlans((plan, { slotMs: slot }) => {
      expect(plan.overGreasingPercent).toBeGreaterThanOrEqual(0);
      expect(plan.overGreasingPercent).toBeLessThanOrEqual((100 * (slot ?? 1)) / plan.intervalMs);
    });
  });

  it('delivers no more than the usable volume, and leaves less than one dose', () => {
    forPlans((plan, { cartridgeUl, doseUl: dose, type }) => {
      const left = cartridgeUl - type.residualUl - plan.pulsesPerCartridge * dose;
      expect(left).toBeGreaterThanOrEqual(0);
      expect(left).toBeLessThan(dose);
    });
  });

  it('life × demand is at most the usable volume', () => {
    forPlans((plan, { cartridgeUl, demandUlPer1000h: demand, type }) => {
      expect(BigInt(plan.lifeMs) * BigInt(demand) <= BigInt(cartridgeUl - type.residualUl) * SPAN_MS).toBe(true);
    });
  });

  it('life in days times operating hours a day is the life', () => {
    forPlans((plan, { hoursPerDay: hours, daysPerWeek: days }) => {
      expect((plan.lifeDays * hours * days * 3_600_000) / 7 / plan.lifeMs).toBeCloseTo(1, 12);
      expect(plan.changesPerYear * plan.lifeDays).toBeCloseTo(365.25, 9);
    });
  });

  it('has an interval that grows with the dose and falls with the demand', () => {
    fc.assert(fc.property(inputs, doseUl, demandUlPer1000h, (input, otherDose, otherDemand) => {
      const intervalOf = (changes: Partial<PulsePlanInput>) => pulsePlan({ ...input, cartridgeUl: 500_000, ...changes })?.intervalMs ?? 0;
      const [small, large] = [input.doseUl, otherDose].sort((a, b) => a - b);
      expect(intervalOf({ doseUl: small })).toBeLessThanOrEqual(intervalOf({ doseUl: large }));
      const [low, high] = [input.demandUlPer1000h, otherDemand].sort((a, b) => a - b);
      expect(intervalOf({ demandUlPer1000h: low })).toBeGreaterThanOrEqual(intervalOf({ demandUlPer1000h: high }));
    }));
  });

  it('keeps its interval when dose and demand grow by the same factor', () => {
    fc.assert(fc.property(inputs, fc.integer({ min: 2, max: 9 }), (input, factor) => {
      const scaled = { ...input, doseUl: input.doseUl * factor, demandUlPer1000h: input.demandUlPer1000h * factor, cartridgeUl: input.cartridgeUl * factor };
      const [plan, other] = [pulsePlan(input), pulsePlan(scaled)];
      if (plan && other) expect(other.intervalMs).toBe(plan.intervalMs);
    }));
  });
});

describe('demand from the bearing (source: common bearing formula)', () => {
  const bearing = fc.record({
    boreMm: fc.integer({ min: 10, max: 300 }), extraMm: fc.integer({ min: 5, max: 300 }), widthMm: fc.integer({ min: 5, max: 200 }),
    share: fc.double({ min: 0.01, max: 0.95, noNaN: true }),
  }).map(({ boreMm, extraMm, widthMm, share }) => aBearingPoint({
    boreMm, outsideMm: boreMm + extraMm, widthMm, speedRpm: Math.max(1, Math.floor(share * 3.5e6 / boreMm ** 1.5)),
  }));

  it('agrees with the formula in floating point to a microlitre', () => {
    fc.assert(fc.property(bearing, (point) => {
      const d = point.boreMm!;
      const hours = 14e6 / (point.speedRpm! * Math.sqrt(d)) - 4 * d;
      const ul = (1e6 * 0.005 * point.outsideMm! * point.widthMm!) / (0.9 * hours);
      const demand = demandOf(point, 0.9).demandUlPer1000h!;
      expect(demand).toBeGreaterThanOrEqual(ul * (1 - 1e-9));
      expect(demand).toBeLessThanOrEqual(ul * (1 + 1e-9) + 1);
    }));
  });

  it('doubles when the factor or the density halves, and when the width doubles', () => {
    fc.assert(fc.property(bearing, (point) => {
      const demand = demandOf(point, 1).demandUlPer1000h!;
      const doubled = [
        demandOf({ ...point, factors: { ...point.factors, temperature: 0.5 } }, 1),
        demandOf(point, 0.5),
        demandOf({ ...point, widthMm: point.widthMm! * 2 }, 1),
      ];
      // ⌈2x⌉ is 2⌈x⌉ or one less.
      for (const each of doubled) expect([2 * demand, 2 * demand - 1]).toContain(each.demandUlPer1000h);
    }));
  });

  it('never falls when the speed rises', () => {
    fc.assert(fc.property(bearing, (point) => {
      const slower = demandOf({ ...point, speedRpm: point.speedRpm! * 0.9 }, 0.9).demandUlPer1000h!;
      expect(slower).toBeLessThanOrEqual(demandOf(point, 0.9).demandUlPer1000h!);
    }));
  });
});

describe('stated demand (source: definition of the units)', () => {
  it('per 100 h is ten times per 1,000 h, exactly', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 1_000_000 }), (statedUl) => {
      expect(demandOf(aPoint({ statedUl, statedPer: '100h' }), null).demandUlPer1000h).toBe(statedUl * 10);
    }));
  });

  it('per week equals per running day times days, and a month is 30.4375 ÷ 7 weeks', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 10_000 }), hoursPerDay, daysPerWeek, (ul, hours, days) => {
      const of = (statedUl: number, statedPer: 'running-day' | 'week' | 'month') =>
        demandOf(aPoint({ statedUl, statedPer, hoursPerDay: hours, daysPerWeek: days }), null).demandUlPer1000h;
      expect(of(ul * days, 'week')).toBe(of(ul, 'running-day'));
      // 30.4375 ÷ 7 = 4,870 ÷ 1,120.
      expect(of(ul * 4_870, 'month')).toBe(of(ul * 1_120, 'week'));
    }));
  });
});

describe('timed discharge (source: domain, 730.5 h a month of standing supply)', () => {
  it('empties at most the usable volume in the operating hours of its period', () => {
    fc.assert(fc.property(fc.integer({ min: 10_000, max: 500_000 }), fc.integer({ min: 1, max: 12 }), hoursPerDay, daysPerWeek, (cartridgeUl, periodMonths, hours, days) => {
      const plan = timedPlan({ cartridgeUl, residualUl: 500, periodMonths, hoursPerDay: hours, daysPerWeek: days, demandUlPer1000h: null })!;
      const operatingHours = (periodMonths * 30.4375 * days * hours) / 7;
      const delivered = (plan.dischargeUlPer1000h * operatingHours) / 1000;
      expect(delivered).toBeLessThanOrEqual(plan.usableUl * (1 + 1e-12));
      expect(plan.usableUl - delivered).toBeLessThan(operatingHours / 1000 + 1e-6);
    }));
  });
});

describe('alternatives (source: the checks of the plan)', () => {
  const contexts = fc.record({
    statedUl: fc.integer({ min: 500, max: 400_000 }), slot: slotMs, hours: hoursPerDay, days: daysPerWeek,
  }).map(({ statedUl, slot, hours, days }) => aContext({
    project: aProject({ slotMs: slot, maxOverGreasingPercent: 1 }),
    point: aPoint({ statedUl, hoursPerDay: hours, daysPerWeek: days }),
  }));
  const rankings = fc.constantFrom<RankBy>('fewest-changes', 'smallest-dose', 'least-over');
  const measure: Readonly<Record<RankBy, (each: Alternative) => number>> = {
    'fewest-changes': (each) => -Math.floor(each.plan!.lifeDays),
    'smallest-dose': (each) => each.doseUl,
    'least-over': (each) => Math.round(each.plan!.overGreasingPercent * 10),
  };

  it('those that pass have no finding once chosen, those rejected have', () => {
    fc.assert(fc.property(contexts, rankings, (ctx, rankBy) => {
      const { ranked, rejected } = alternatives(ctx, rankBy);
      const findingsOf = ({ cartridgeUl, doseUl: dose }: Alternative) =>
        assessPoint({ ...ctx, dispenser: aDispenser({ cartridgeUl, doseUl: dose }) }).findings;
      expect(ranked.flatMap(findingsOf)).toEqual([]);
      expect(rejected.every((each) => findingsOf(each).length > 0)).toBe(true);
      expect(ranked.length + rejected.length).toBe(75);
    }), { numRuns: runs(20) });
  });

  it('stand in the order of the preference', () => {
    fc.assert(fc.property(contexts, rankings, (ctx, rankBy) => {
      const figures = alternatives(ctx, rankBy).ranked.map(measure[rankBy]);
      expect(figures).toEqual([...figures].sort((a, b) => a - b));
    }), { numRuns: runs(30) });
  });

  it('are in the same order however the type lists its cartridges', () => {
    fc.assert(fc.property(contexts, rankings, (ctx, rankBy) => {
      const turned = { ...ctx, type: aType({ cartridgesUl: [250_000, 60_000, 120_000] }) };
      expect(alternatives(turned, rankBy).ranked).toEqual(alternatives(ctx, rankBy).ranked);
    }), { numRuns: runs(20) });
  });
});
