import type { PointFigures, PulsePlan, TimedPlan } from '../assessment.ts';
import type { Finding } from '../findings.ts';
import { demandOf } from './demand.ts';
import { planFindings } from './plan-checks.ts';
import type { PointContext } from './point-context.ts';
import { pulsePlan } from './pulse-plan.ts';
import { timedPlan } from './timed-plan.ts';

export interface PointAssessment {
  readonly figures: PointFigures;
  /** Pulse plan; null for timed discharge and while an input is missing. */
  readonly plan: PulsePlan | null;
  /** Timed discharge; null for pulses and while an input is missing. */
  readonly timed: TimedPlan | null;
  readonly findings: readonly Finding[];
}

/**
 * Demand, plan and findings of one point: chapters 1 and 2 of the computations. Volumes and slots are
 * whole numbers, as the database holds them; a blank or contradictory row never throws: what cannot be
 * computed is null and a finding says why.
 */
export function assessPoint(ctx: PointContext): PointAssessment {
  return assessWithDemand(ctx, demandOf(ctx.point, ctx.grease?.densityGPerCm3 ?? null));
}

/** The same where the point's demand is at hand: it does not depend on the dispenser. */
export function assessWithDemand(ctx: PointContext, figures: PointFigures): PointAssessment {
  const { project, point, dispenser, type, grease, waitBoundMs } = ctx;
  const plan = planOf(ctx, figures);
  const timed = timedOf(ctx, figures);
  return { figures, plan, timed, findings: planFindings({ project, point, dispenser, type, grease, waitBoundMs, figures, plan, timed }) };
}

function planOf({ project, point, dispenser, type }: PointContext, figures: PointFigures): PulsePlan | null {
  const demand = figures.demandUlPer1000h;
  if (!dispenser || !type || dispenser.method !== 'pulse' || demand === null || point.hoursPerDay === null) return null;
  if (dispenser.doseUl === null || dispenser.cartridgeUl === null) return null;
  return pulsePlan({
    demandUlPer1000h: demand,
    doseUl: dispenser.doseUl,
    cartridgeUl: dispenser.cartridgeUl,
    hoursPerDay: point.hoursPerDay,
    daysPerWeek: point.daysPerWeek,
    slotMs: project.slotMs,
    type,
  });
}

function timedOf({ point, dispenser, type }: PointContext, figures: PointFigures): TimedPlan | null {
  if (!dispenser || !type || dispenser.method !== 'timed' || point.hoursPerDay === null) return null;
  if (dispenser.cartridgeUl === null || dispenser.periodMonths === null) return null;
  return timedPlan({
    cartridgeUl: dispenser.cartridgeUl,
    residualUl: type.residualUl,
    periodMonths: dispenser.periodMonths,
    hoursPerDay: point.hoursPerDay,
    daysPerWeek: point.daysPerWeek,
    demandUlPer1000h: figures.demandUlPer1000h,
  });
}
