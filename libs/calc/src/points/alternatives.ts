import type { PointFigures, PulsePlan } from '../assessment.ts';
import type { Dispenser, RankBy } from '../design.ts';
import { demandOf } from './demand.ts';
import { assessWithDemand } from './lubrication.ts';
import { PLAN_CODES } from './plan-codes.ts';
import type { PointContext } from './point-context.ts';

/** One cartridge and dose of the type, with what it would give. */
export interface Alternative {
  readonly cartridgeUl: number;
  readonly doseUl: number;
  /** Null where no plan exists (then it does not pass). */
  readonly plan: PulsePlan | null;
  readonly passes: boolean;
  /** What is wrong with it, a sentence each; empty when it passes. */
  readonly reasons: readonly string[];
  /** Place among those that pass, from 1; null for a rejected one. */
  readonly rank: number | null;
}

export interface Alternatives {
  readonly ranked: readonly Alternative[];
  /** By cartridge, then dose. */
  readonly rejected: readonly Alternative[];
  /** Why there are none at all, as an instruction; null when there are. */
  readonly refusal: string | null;
}

/** What a change of cartridge and dose can mend; all else (such as a blank wiring) concerns every alternative alike. */
const DECIDED_HERE: ReadonlySet<string> = new Set([
  PLAN_CODES.doseRange, PLAN_CODES.doseStep, PLAN_CODES.cartridgeMisfit, PLAN_CODES.noWholeDose,
  PLAN_CODES.intervalTooShort, PLAN_CODES.lifeTooLong, PLAN_CODES.lifeTooShort, PLAN_CODES.overGreasing,
]);

/**
 * Every cartridge × dose of the dispenser's type, pulsed: those that pass ranked by the preference,
 * those that do not with their reasons. Ties are settled by the other two criteria, then by the
 * smaller cartridge and dose, so that the order never depends on chance.
 */
export function alternatives(ctx: PointContext, rankBy: RankBy): Alternatives {
  const { dispenser, type, point } = ctx;
  if (!dispenser || !type) return none('Choose the dispenser type.');
  const demand = demandOf(point, ctx.grease?.densityGPerCm3 ?? null);
  if (demand.refusal !== null) return none(demand.refusal);
  if (point.hoursPerDay === null) return none('Enter the hours that the machine runs on a running day.');
  const all = type.cartridgesUl.flatMap((cartridgeUl) =>
    doses(type.doseMinUl, type.doseMaxUl, type.doseStepUl).map((doseUl) => tried(ctx, demand, { ...dispenser, method: 'pulse', cartridgeUl, doseUl })));
  return {
    ranked: all.filter((each) => each.passes).sort(comparing(rankBy)).map((each, index) => ({ ...each, rank: index + 1 })),
    rejected: all.filter((each) => !each.passes),
    refusal: null,
  };
}

function tried(ctx: PointContext, demand: PointFigures, dispenser: Dispenser): Alternative {
  const { plan, findings } = assessWithDemand({ ...ctx, dispenser }, demand);
  const reasons = findings.filter((each) => DECIDED_HERE.has(each.code)).map((each) => each.title);
  return {
    cartridgeUl: dispenser.cartridgeUl!,
    doseUl: dispenser.doseUl!,
    plan,
    passes: plan !== null && reasons.length === 0,
    reasons: plan === null && reasons.length === 0 ? ['Hours per day or days per week cannot be right'] : reasons,
    rank: null,
  };
}

/** Doses from the smallest to the largest in steps, µL: whole multiples of the step only. */
function doses(minUl: number, maxUl: number, stepUl: number): number[] {
  const first = Math.ceil(minUl / stepUl);
  return Array.from({ length: Math.max(0, Math.floor(maxUl / stepUl) - first + 1) }, (_, index) => (first + index) * stepUl);
}

type Compare = (a: Alternative, b: Alternative) => number;

/**
 * Smaller first, at the precision that matters to people: whole days of life and 0.1 % of grease. The
 * milliseconds that rounding costs differ from dose to dose and would else decide alone.
 */
const CRITERIA: Readonly<Record<RankBy, Compare>> = {
  'fewest-changes': (a, b) => Math.floor(b.plan!.lifeDays) - Math.floor(a.plan!.lifeDays),
  'smallest-dose': (a, b) => a.doseUl - b.doseUl,
  'least-over': (a, b) => Math.round(a.plan!.overGreasingPercent * 10) - Math.round(b.plan!.overGreasingPercent * 10),
};

function comparing(rankBy: RankBy): Compare {
  const rest = (Object.keys(CRITERIA) as RankBy[]).filter((each) => each !== rankBy);
  const order = [rankBy, ...rest].map((each) => CRITERIA[each]);
  return (a, b) => order.map((compare) => compare(a, b)).find((sign) => sign !== 0) ?? (a.cartridgeUl - b.cartridgeUl || a.doseUl - b.doseUl);
}

function none(refusal: string): Alternatives {
  return { ranked: [], rejected: [], refusal };
}
