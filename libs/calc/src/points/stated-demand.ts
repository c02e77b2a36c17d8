import type { PointFigures } from '../assessment.ts';
import type { Point, StatedPer } from '../design.ts';
import { demandFigures, isPositive, MONTH_DAYS, operatingHours, refuseMissing, refuseNotPositive, refuseRunningTime } from './demand-result.ts';
import { exact, over, ratio, times, type Rational } from './exact.ts';

const THOUSAND = ratio(1000n, 1n);

/**
 * Demand as stated: µL per 1,000 or 100 operating hours, per running day, week or month. A running day
 * has `hoursPerDay` hours, a week `daysPerWeek` of them, and a month is 30.4375 calendar days.
 */
export function statedDemand(point: Point): PointFigures {
  const { statedUl, statedPer, hoursPerDay, daysPerWeek } = point;
  const byHours = needsHours(statedPer);
  if (statedUl === null || (byHours && hoursPerDay === null)) {
    return refuseMissing({ 'the demand': statedUl, ...(byHours && { 'the hours per day': hoursPerDay }) }, '')!;
  }
  const bad = (isPositive(statedUl) ? null : refuseNotPositive({ 'the demand': statedUl }))
    ?? (byHours ? refuseRunningTime(hoursPerDay!, daysPerWeek) : null);
  if (bad) return bad;
  // As most demands are stated: nothing to divide, nothing to round.
  if (statedPer === '1000h' && Number.isInteger(statedUl) && statedUl <= 1e12) return { demandUlPer1000h: statedUl, refusal: null };
  const hours = hoursIn(statedPer, hoursPerDay ?? 0, daysPerWeek);
  return demandFigures(over(times(exact(statedUl), THOUSAND), hours));
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
