import type { PointFigures } from '../assessment.ts';
import type { Point, StatedPer } from '../design.ts';
import { demandFigures, MONTH_DAYS, operatingHours, refuseMissing, refuseNotPositive, refuseRunningTime } from './demand-result.ts';
import { exact, over, ratio, times, type Rational } from './exact.ts';

const THOUSAND = ratio(1000n, 1n);

/**
 * Demand as stated: µL per 1,000 or 100 operating hours, per running day, week or month. A running day
 * has `hoursPerDay` hours, a week `daysPerWeek` of them, and a month is 30.4375 calendar days.
 */
export function statedDemand(point: Point): PointFigures {
  const { statedUl, statedPer, hoursPerDay, daysPerWeek } = point;
  const missing = refuseMissing({ 'the demand': statedUl, ...(needsHours(statedPer) && { 'the hours per day': hoursPerDay }) }, '');
  if (missing) return missing;
  const bad = refuseNotPositive({ 'the demand': statedUl! })
    ?? (needsHours(statedPer) ? refuseRunningTime(hoursPerDay!, daysPerWeek) : null);
  if (bad) return bad;
  const hours = hoursIn(statedPer, hoursPerDay ?? 0, daysPerWeek);
  return demandFigures(over(times(exact(statedUl!), THOUSAND), hours));
}

function needsHours(per: StatedPer): boolean {
  return per === 'running-day' || per === 'week' || per === 'month';
}

/** Operating hours in the unit of the statement. */
function hoursIn(per: StatedPer, hoursPerDay: number, daysPerWeek: number): Rational {
  switch (per) {
    case '1000h':
      return THOUSAND;
    case '100h':
      return ratio(100n, 1n);
    case 'running-day':
      return exact(hoursPerDay);
    case 'week':
      return operatingHours(ratio(7n, 1n), hoursPerDay, daysPerWeek);
    case 'month':
      return operatingHours(MONTH_DAYS, hoursPerDay, daysPerWeek);
  }
}
