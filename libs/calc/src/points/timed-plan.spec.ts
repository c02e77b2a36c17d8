import { describe, expect, it } from 'vitest';
import { timedPlan, type TimedPlanInput } from './timed-plan.ts';

const base: TimedPlanInput = { cartridgeUl: 120_000, residualUl: 3_120, periodMonths: 6, hoursPerDay: 16, daysPerWeek: 7, demandUlPer1000h: 40_000 };

describe('timedPlan', () => {
  it('sets the usable volume against the operating hours in the period', () => {
    // 6 months are 4,383 h standing, of which 16/24 run: 2,922 h; 116.88 cm³ ÷ 2,922 h = 40 cm³ per 1,000 h.
    expect(timedPlan(base)).toEqual({
      usableUl: 116_880, periodHours: 4_383, dischargeUlPer1000h: 40_000, lifeDays: 182.625, changesPerYear: 2, overGreasingPercent: 0,
    });
  });

  it('rounds the discharge down and is below 0 where the point gets too little', () => {
    const plan = timedPlan({ ...base, residualUl: 3_121, demandUlPer1000h: 50_000 })!;
    expect(plan.dischargeUlPer1000h).toBe(39_999);
    expect(plan.overGreasingPercent!).toBeLessThan(-20);
  });

  it('gives more per operating hour the less the machine runs', () => {
    expect(timedPlan({ ...base, hoursPerDay: 8 })!.dischargeUlPer1000h).toBe(80_000);
  });

  it('knows no over-greasing without a demand, and no plan without volume', () => {
    expect(timedPlan({ ...base, demandUlPer1000h: null })!.overGreasingPercent).toBeNull();
    expect(timedPlan({ ...base, residualUl: 120_000 })).toBeNull();
    expect(timedPlan({ ...base, periodMonths: 0 })).toBeNull();
  });
});
