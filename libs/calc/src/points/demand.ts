import type { PointFigures } from '../assessment.ts';
import type { Point } from '../design.ts';
import { bearingDemand } from './bearing-demand.ts';
import { practiceDemand } from './practice-demand.ts';
import { statedDemand } from './stated-demand.ts';

/**
 * Demand of a point, whole µL per 1,000 operating hours, rounded up; or a refusal that says what to do.
 *
 * @param densityGPerCm3 density of the point's grease, g/cm³; null: no grease chosen. A way in that
 *   starts from a mass refuses without it, since a density is never guessed.
 */
export function demandOf(point: Point, densityGPerCm3: number | null): PointFigures {
  switch (point.demandWay) {
    case 'bearing':
      return bearingDemand(point, densityGPerCm3);
    case 'stated':
      return statedDemand(point);
    case 'practice':
      return practiceDemand(point, densityGPerCm3);
    case null:
      return {
        demandUlPer1000h: null,
        refusal: 'Say how the demand is known: from the bearing, stated, or from today’s manual practice.',
      };
  }
}
