import { describe, expect, it } from 'vitest';
import { pulsePlan, type PulsePlanInput } from './pulse-plan.ts';
import { aType } from './testing/rows.ts';

const HOUR_MS = 3_600_000;
const base: PulsePlanInput = {
  demandUlPer1000h: 50_000, doseUl: 200, cartridgeUl: 120_000, hoursPerDay: 16, daysPerWeek: 7, slotMs: null, type: aType(),
};

describe('pulsePlan', () => {
  it('gives interval, pulses, life and changes', () => {
    const plan = pulsePlan(base)!;
    expect(plan).toMatchObject({
      exactIntervalMs: 4 * HOUR_MS, intervalMs: 4 * HOUR_MS, pulsesPerCartridge: 600, lifeMs: 2_400 * HOUR_MS, lifeDays: 150,
      overGreasingPercent: 0, runMs: 40_000, triggerMs: 500,
    });
    expect(plan.changesPerYear).toBeCloseTo(365.25 / 150, 12);
    expect(plan.pulsesPerYear).toBeCloseTo((365.25 * 16) / 4, 9);
  });

  it('rounds the interval down to milliseconds, then to slots, and says what that costs', () => {
    const free = pulsePlan({ ...base, demandUlPer1000h: 46_000 })!;
    expect(free.intervalMs).toBe(15_652_173);
    const slotted = pulsePlan({ ...base, demandUlPer1000h: 46_000, slotMs: 120_000 })!;
    expect(slotted.intervalMs).toBe(15_600_000);
    expect(slotted.overGreasingPercent).toBeCloseTo((720_000_000_000 / 46_000 / 15_600_000 - 1) * 100, 9);
  });

  it('takes the residual off the cartridge', () => {
    expect(pulsePlan({ ...base, type: aType({ residualUl: 150 }) })!.pulsesPerCartridge).toBe(599);
  });

  it('lets the output give the run itself where there is no trigger pulse', () => {
    expect(pulsePlan({ ...base, type: aType({ triggerMs: null }) })!.triggerMs).toBe(40_000);
  });

  it('counts calendar days by days per week', () => {
    expect(pulsePlan({ ...base, daysPerWeek: 5 })!.lifeDays).toBe(210);
  });

  it.each([
    ['a slot longer than the interval', { slotMs: 5 * HOUR_MS }],
    ['no whole dose in the cartridge', { cartridgeUl: 199 }],
    ['a residual above the nominal volume', { type: aType({ residualUl: 130_000 }) }],
    ['hours that no day has', { hoursPerDay: 25 }],
    ['a dose of 0', { doseUl: 0 }],
  ])('has no plan for %s', (_, changes) => {
    expect(pulsePlan({ ...base, ...changes })).toBeNull();
  });

  it('refuses parts of a microlitre', () => {
    expect(() => pulsePlan({ ...base, doseUl: 200.5 })).toThrow(RangeError);
  });
});
