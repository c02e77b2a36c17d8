import type { TimedPlan } from '../assessment.ts';
import { MONTH_DAYS, operatingHours } from './demand-result.ts';
import { exact, floorOf, minus, over, ratio, times, toNumber } from './exact.ts';
import { isRunningTime } from './pulse-plan.ts';

export interface TimedPlanInput {
  /** Nominal volume, whole µL. */
  readonly cartridgeUl: number;
  /** What stays in an "empty" cartridge, whole µL. */
  readonly residualUl: number;
  /** Months of standing supply in which the cartridge empties; a month is 730.5 h. */
  readonly periodMonths: number;
  readonly hoursPerDay: number;
  readonly daysPerWeek: number;
  /** Null: the demand is unknown, then over-greasing is too. */
  readonly demandUlPer1000h: number | null;
}

/**
 * Timed discharge: the dispenser empties its cartridge on its own clock, whether the machine runs or
 * not. The discharge is therefore set against the operating hours that fall into the period, and is
 * rounded down: never more than what really comes. `overGreasingPercent` is below 0 where the discharge
 * is less than the demand. `periodHours` counts standing hours.
 *
 * @returns null where the cartridge holds nothing usable, or period or running time are not above 0
 */
export function timedPlan(input: TimedPlanInput): TimedPlan | null {
  const { periodMonths, hoursPerDay, daysPerWeek, demandUlPer1000h } = input;
  const usableUl = input.cartridgeUl - input.residualUl;
  if (!(usableUl > 0 && periodMonths > 0) || !isRunningTime(hoursPerDay, daysPerWeek)) return null;
  const days = times(exact(periodMonths), MONTH_DAYS);
  const discharge = over(times(exact(usableUl), ratio(1000n, 1n)), operatingHours(days, hoursPerDay, daysPerWeek));
  return {
    usableUl,
    periodHours: toNumber(times(days, ratio(24n, 1n))),
    dischargeUlPer1000h: Number(floorOf(discharge)),
    lifeDays: toNumber(days),
    changesPerYear: 12 / periodMonths,
    overGreasingPercent: demandUlPer1000h === null
      ? null
      : toNumber(over(times(ratio(100n, 1n), minus(discharge, exact(demandUlPer1000h))), exact(demandUlPer1000h))),
  };
}
