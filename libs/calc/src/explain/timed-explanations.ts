import type { Explanation, TimedPlan } from '../assessment.ts';
import { formatDays, formatDemand, formatHours, formatNumber, formatPercent, formatVolume } from '../format.ts';
import { running } from './demand-explanation.ts';
import { FROM_DISPENSER, input, step, type LaneContext } from './lane-context.ts';
import { cartridgeInputs, demandInput, type PlanFigureName } from './plan-explanations.ts';

/** Figures of a dispenser on its own clock; it has no interval and counts no pulses, so those are null. */
export function explainTimedPlan(ctx: LaneContext, figure: PlanFigureName): Explanation | null {
  const { timed } = ctx.figures;
  if (!timed) return null;
  switch (figure) {
    case 'life':
    case 'lifeDays':
      return explainPeriod(ctx, timed, figure);
    case 'changes':
      return explainChanges(ctx, timed);
    case 'over':
      return timed.overGreasingPercent === null ? null : explainOver(ctx, timed, timed.overGreasingPercent);
    default:
      return null;
  }
}

function explainPeriod(ctx: LaneContext, timed: TimedPlan, figure: 'life' | 'lifeDays'): Explanation {
  const result = figure === 'life' ? formatHours(timed.periodHours * 3_600_000) : formatDays(timed.lifeDays);
  const month = figure === 'life' ? '730.5 h' : '30.4375 d';
  return {
    title: `Why ${result}`,
    formula: `life = period set × ${month} a month`,
    substituted: `${ctx.dispenser.periodMonths} × ${month}`,
    inputs: [periodInput(ctx)],
    rounding: [step('down, for reading only', result, 'change in time rather than late')],
    result,
    source: 'Definition; standing supply, whether the machine runs or not',
    usedBy: ['changes a year', 'change plan', 'device setting card'],
  };
}

function explainChanges(ctx: LaneContext, timed: TimedPlan): Explanation {
  const result = formatNumber(timed.changesPerYear, 1);
  return {
    title: `Why ${result} changes a year`,
    formula: 'changes a year = 12 ÷ period in months',
    substituted: `12 ÷ ${ctx.dispenser.periodMonths}`,
    inputs: [periodInput(ctx)],
    rounding: [step('to 0.1, for reading only', result, '')],
    result,
    source: 'Definition',
    usedBy: ['change plan'],
  };
}

function explainOver(ctx: LaneContext, timed: TimedPlan, over: number): Explanation {
  const result = formatPercent(over);
  return {
    title: `Why ${result} against the demand`,
    formula: 'over-greasing = discharge ÷ demand − 1; discharge = 1,000 h × usable volume ÷ operating hours in the period',
    substituted: `${formatDemand(timed.dischargeUlPer1000h)} ÷ ${formatDemand(ctx.demandUlPer1000h)} − 1; usable ${formatVolume(timed.usableUl)}`,
    inputs: [...cartridgeInputs(ctx), periodInput(ctx), ...running(ctx.point), demandInput(ctx)],
    rounding: [step('discharge down to whole µL per 1,000 h', formatDemand(timed.dischargeUlPer1000h), 'never more than what comes')],
    result,
    source: 'Definition; below 0 the point gets less than its demand',
    usedBy: ['check of over-greasing'],
  };
}

function periodInput(ctx: LaneContext) {
  return input('period', `${ctx.dispenser.periodMonths} months`, FROM_DISPENSER);
}
