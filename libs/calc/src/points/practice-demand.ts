import type { PointFigures } from '../assessment.ts';
import type { Point } from '../design.ts';
import { demandFigures, isPositive, operatingHours, refuse, refuseMissing, refuseNotPositive, refuseRunningTime } from './demand-result.ts';
import { exact, over, ratio, times } from './exact.ts';
import { certainCeil } from './whole-numbers.ts';

/**
 * Demand from today's manual practice: strokes × grams a stroke each so many calendar days, of which
 * `daysPerWeek`/7 are running days of `hoursPerDay` hours.
 */
export function practiceDemand(point: Point, densityGPerCm3: number | null): PointFigures {
  const { practiceStrokes: strokes, practiceGramsPerStroke: grams, practiceEveryDays: days, hoursPerDay } = point;
  if (strokes === null || grams === null || days === null || hoursPerDay === null) return refuseBlank(point);
  if (densityGPerCm3 === null) return refuse('Choose the grease, whose density turns the mass into a volume, or state the demand.');
  if (!(isPositive(strokes) && isPositive(grams) && isPositive(days) && isPositive(densityGPerCm3))) {
    return refuseNotPositive({ 'the strokes': strokes, 'the grams a stroke': grams, 'the days between': days, 'the density of the grease': densityGPerCm3 })!;
  }
  const bad = refuseRunningTime(hoursPerDay, point.daysPerWeek);
  if (bad) return bad;
  const certain = certainCeil((1e6 * strokes * grams * 7) / (densityGPerCm3 * days * point.daysPerWeek * hoursPerDay));
  if (certain !== null) return { demandUlPer1000h: certain, refusal: null };
  const massG = times(exact(strokes), exact(grams));
  const hours = operatingHours(exact(days), hoursPerDay, point.daysPerWeek);
  // g ÷ (g/cm³) is cm³; ×1000 to µL and ×1000 to 1,000 h.
  return demandFigures(over(times(ratio(1_000_000n, 1n), massG), times(exact(densityGPerCm3), hours)));
}

function refuseBlank({ practiceStrokes, practiceGramsPerStroke, practiceEveryDays, hoursPerDay }: Point): PointFigures {
  return refuseMissing(
    { 'the strokes': practiceStrokes, 'the grams a stroke': practiceGramsPerStroke, 'the days between': practiceEveryDays, 'the hours per day': hoursPerDay },
    ', or state the demand',
  )!;
}
