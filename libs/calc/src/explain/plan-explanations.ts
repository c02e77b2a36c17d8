import type { Explanation, PulsePlan } from '../assessment.ts';
import {
  formatCount, formatDays, formatDemand, formatDuration, formatHours, formatInterval, formatNumber, formatPercent, formatVolume, withUnit,
} from '../format.ts';
import { running } from './demand-explanation.ts';
import { FROM_DISPENSER, FROM_POLICY, input, step, typeSource, type Input, type LaneContext } from './lane-context.ts';

type PlanContext = LaneContext & { readonly plan: PulsePlan };
export type PlanFigureName = 'interval' | 'pulses' | 'life' | 'lifeDays' | 'changes' | 'over';

/** Figures of a pulse plan; null while there is none. */
export function explainPulsePlan(ctx: LaneContext, figure: PlanFigureName): Explanation | null {
  const { plan } = ctx.figures;
  return plan === null ? null : EXPLAIN[figure]({ ...ctx, plan });
}

const EXPLAIN: Readonly<Record<PlanFigureName, (ctx: PlanContext) => Explanation>> = {
  interval: explainInterval, pulses: explainPulses, life: explainLife, lifeDays: explainLifeDays, changes: explainChanges, over: explainOver,
};

function explainInterval(ctx: PlanContext): Explanation {
  const { plan, design: { project } } = ctx;
  const result = formatInterval(plan.intervalMs);
  return {
    title: `Why ${result}`,
    formula: 'interval = 1,000 h × dose ÷ demand',
    substituted: `1,000 h × ${dose(ctx)} ÷ ${exactDemand(ctx)} = ${formatDuration(plan.exactIntervalMs)}`,
    inputs: [doseInput(ctx), demandInput(ctx), ...(project.slotMs === null ? [] : [input('slot', formatDuration(project.slotMs), FROM_POLICY)])],
    rounding: [
      step('down to whole milliseconds', formatDuration(plan.exactIntervalMs), 'never less grease than the demand'),
      ...(project.slotMs === null ? [] : [step('down to whole slots', formatDuration(plan.intervalMs), 'each run lies inside one slot; never less grease')]),
    ],
    result,
    source: 'Common practice; operating time',
    usedBy: ['life', 'over-greasing', 'pulse schedule', 'PLC program', 'device setting card'],
  };
}

function explainPulses(ctx: PlanContext): Explanation {
  const result = formatCount(ctx.plan.pulsesPerCartridge);
  return {
    title: `Why ${result} pulses`,
    formula: 'pulses = ⌊(nominal − residual) ÷ dose⌋',
    substituted: `⌊(${formatVolume(ctx.dispenser.cartridgeUl)} − ${formatVolume(ctx.type?.residualUl)}) ÷ ${dose(ctx)}⌋`,
    inputs: [...cartridgeInputs(ctx), doseInput(ctx)],
    rounding: [step('down to whole pulses', result, 'a part of a dose is not delivered')],
    result,
    source: 'Common practice; whole-number arithmetic',
    usedBy: ['life', 'cartridge limit of the PLC program', 'device setting card', 'change plan'],
  };
}

function explainLife(ctx: PlanContext): Explanation {
  const { plan } = ctx;
  const result = formatHours(plan.lifeMs);
  return {
    title: `Why ${result}`,
    formula: 'life = pulses per cartridge × interval',
    substituted: `${formatCount(plan.pulsesPerCartridge)} × ${formatDuration(plan.intervalMs)}`,
    inputs: [pulsesInput(plan), intervalInput(plan)],
    rounding: [step('down to whole hours, for reading only', result, 'compared with the longest and shortest life unrounded')],
    result,
    source: 'Definition; operating hours',
    usedBy: ['life in days'],
  };
}

function explainLifeDays(ctx: PlanContext): Explanation {
  const { plan, point, design: { project } } = ctx;
  const result = formatDays(plan.lifeDays);
  return {
    title: `Why ${result}`,
    formula: 'life in days = life ÷ (hours per day × days per week ÷ 7)',
    substituted: `${formatHours(plan.lifeMs)} ÷ (${point.hoursPerDay} h × ${point.daysPerWeek} ÷ 7)`,
    inputs: [
      input('life', formatHours(plan.lifeMs), 'pulses × interval'),
      ...running(point),
      input('longest', formatDays(project.maxCartridgeDays), FROM_POLICY),
      input('shortest', formatDays(project.minCartridgeDays), FROM_POLICY),
    ],
    rounding: [step('down to whole days, for reading only', result, 'change in time rather than late')],
    result,
    source: 'Definition; calendar days',
    usedBy: ['changes a year', 'change plan', 'checks of longest and shortest life'],
  };
}

function explainChanges({ plan }: PlanContext): Explanation {
  const result = formatNumber(plan.changesPerYear, 1);
  return {
    title: `Why ${result} changes a year`,
    formula: 'changes a year = 365.25 d ÷ life in days',
    substituted: `365.25 d ÷ ${withUnit(formatNumber(plan.lifeDays, 1), 'd')}`,
    inputs: [input('life in days', withUnit(formatNumber(plan.lifeDays, 1), 'd'), 'life ÷ running hours a day')],
    rounding: [step('to 0.1, for reading only', result, 'ranking uses the unrounded life')],
    result,
    source: 'Definition; a year is 365.25 days',
    usedBy: ['alternatives', 'change plan'],
  };
}

function explainOver(ctx: PlanContext): Explanation {
  const { plan, design: { project } } = ctx;
  const result = formatPercent(plan.overGreasingPercent);
  return {
    title: `Why ${result} over the demand`,
    formula: 'over-greasing = exact interval ÷ interval set − 1',
    substituted: `${formatDuration(plan.exactIntervalMs)} ÷ ${formatDuration(plan.intervalMs)} − 1`,
    inputs: [
      input('exact interval', formatDuration(plan.exactIntervalMs), '1,000 h × dose ÷ demand'),
      intervalInput(plan),
      input('at most', formatPercent(project.maxOverGreasingPercent), FROM_POLICY),
    ],
    rounding: [step('to 0.1 %, for reading only', result, 'compared with the policy unrounded')],
    result,
    source: 'Definition, against the exact interval',
    usedBy: ['check of over-greasing', 'alternatives'],
  };
}

/** Nominal volume and residual. */
export function cartridgeInputs({ dispenser, type }: LaneContext): Input[] {
  return [
    input('cartridge, nominal', formatVolume(dispenser.cartridgeUl), FROM_DISPENSER),
    ...(type ? [input('residual', formatVolume(type.residualUl), typeSource(type))] : []),
  ];
}

/** The demand as an input, to the microlitre, since it is divided by. */
export function demandInput(ctx: LaneContext): Input {
  return input('demand', exactDemand(ctx), ctx.point.demandWay === 'bearing' ? 'from the bearing' : ctx.point.demandWay === 'practice' ? 'from today’s practice' : 'stated');
}

function exactDemand({ demandUlPer1000h: ul }: LaneContext): string {
  return ul === null || ul % 100 === 0 ? formatDemand(ul) : withUnit(formatNumber(ul / 1000, 3), 'cm³/1,000\u00a0h');
}

function dose({ dispenser }: LaneContext): string {
  return formatVolume(dispenser.doseUl);
}

function doseInput(ctx: LaneContext): Input {
  return input('dose', dose(ctx), FROM_DISPENSER);
}

function pulsesInput(plan: PulsePlan): Input {
  return input('pulses per cartridge', formatCount(plan.pulsesPerCartridge), '(nominal − residual) ÷ dose');
}

function intervalInput(plan: PulsePlan): Input {
  return input('interval', formatDuration(plan.intervalMs), '1,000 h × dose ÷ demand, rounded down');
}
