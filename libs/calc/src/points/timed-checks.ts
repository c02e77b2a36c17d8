import { wiringBy } from '../design-index.ts';
import { formatDemand, formatPercent } from '../format.ts';
import type { Noticed } from './finding.ts';
import { PLAN_CODES } from './plan-codes.ts';
import type { PlanCheckContext } from './point-context.ts';

/** A dispenser on its own clock against its type and its demand. */
export function timedChecks(ctx: PlanCheckContext, noticed: Noticed[]): void {
  const { dispenser } = ctx;
  if (!dispenser || dispenser.method !== 'timed') return;
  supplyCheck(ctx, noticed);
  periodCheck(ctx, noticed);
  dischargeCheck(ctx, noticed);
}

function supplyCheck({ dispenser, type }: PlanCheckContext, noticed: Noticed[]): void {
  if (wiringBy(dispenser, type) !== 'two-core') return;
  noticed.push({
    code: PLAN_CODES.timedTwoCore,
    severity: 'error',
    title: 'Timed discharge needs a standing supply, which two-core wiring has not',
    source: 'type data',
    remedy: 'Let the controller pulse it, or choose four-core wiring and a four-core type.',
  });
}

function periodCheck({ dispenser, type }: PlanCheckContext, noticed: Noticed[]): void {
  if (!type) return;
  if (type.timedMonths.length === 0) {
    noticed.push({
      code: PLAN_CODES.timedUnknown,
      severity: 'error',
      title: 'The type has no timed discharge',
      source: 'type data',
      remedy: 'Let the controller pulse it, or choose a type with timed discharge.',
    });
    return;
  }
  const months = dispenser?.periodMonths ?? null;
  if (months === null || type.timedMonths.includes(months)) return;
  noticed.push({
    code: PLAN_CODES.periodMisfit,
    severity: 'error',
    title: `Period of ${months} months; the type offers ${type.timedMonths.join(', ')}`,
    source: 'type data',
    remedy: 'Choose a period that the type offers.',
    compared: [{ name: 'period', value: months, limit: type.timedMonths.at(-1)!, unit: 'months' }],
  });
}

function dischargeCheck({ figures, timed }: PlanCheckContext, noticed: Noticed[]): void {
  const demand = figures.demandUlPer1000h;
  if (demand === null || !timed || timed.overGreasingPercent === null || timed.overGreasingPercent >= 0) return;
  noticed.push({
    code: PLAN_CODES.timedTooLittle,
    severity: 'error',
    title: `Discharges ${formatDemand(timed.dischargeUlPer1000h)}, the point needs ${formatDemand(demand)}`,
    detail: `The point gets ${formatPercent(-timed.overGreasingPercent, 'up')} less than its demand.`,
    source: 'policy (never less grease than the demand)',
    remedy: 'Choose a shorter period or a larger cartridge, or let the controller pulse it.',
    compared: [{ name: 'discharge', value: timed.dischargeUlPer1000h, limit: demand, unit: 'µL per 1,000 h' }],
  });
}
