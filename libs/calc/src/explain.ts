import type { Assessment, Explanation, LaneFigureName } from './assessment.ts';
import type { Design } from './design.ts';
import { explainDemand } from './explain/demand-explanation.ts';
import { laneContext, type LaneContext } from './explain/lane-context.ts';
import { explainLevel } from './explain/level-explanations.ts';
import { explainLoad } from './explain/load-explanations.ts';
import { explainPulsePlan } from './explain/plan-explanations.ts';
import { explainTimedPlan } from './explain/timed-explanations.ts';
import { explainVoltage } from './explain/voltage-explanations.ts';

/**
 * Why a lane's figure is what it is: formula, numbers put in, inputs with their origin, roundings,
 * source and use. It reads what `assess` derived and computes nothing of its own but the text.
 *
 * @returns null where the figure is not there (a blank upstream, or no such dispenser)
 */
export function explainLane(design: Design, assessment: Assessment, dispenserId: string, figure: LaneFigureName): Explanation | null {
  const ctx = laneContext(design, assessment, dispenserId);
  return ctx === null ? null : explained(ctx, figure);
}

function explained(ctx: LaneContext, figure: LaneFigureName): Explanation | null {
  switch (figure) {
    case 'demand':
      return explainDemand(ctx);
    case 'interval':
    case 'pulses':
    case 'life':
    case 'lifeDays':
    case 'changes':
    case 'over':
      return explainPulsePlan(ctx, figure) ?? explainTimedPlan(ctx, figure);
    case 'worstVoltage':
    case 'allOnVoltage':
    case 'aloneVoltage':
    case 'idleVoltage':
      return explainVoltage(ctx, figure);
    case 'channelLoad':
    case 'groupLoad':
    case 'supplyLoad':
      return explainLoad(ctx, figure);
    case 'pulseLevel':
    case 'statusLevel':
      return explainLevel(ctx, figure);
  }
}
