import type { Finding } from '../findings.ts';
import { blankChecks } from './blank-checks.ts';
import { pointFinding } from './finding.ts';
import type { PlanCheckContext } from './point-context.ts';
import { pulseChecks } from './pulse-checks.ts';
import { timedChecks } from './timed-checks.ts';
import { lifeChecks, typeChecks } from './type-checks.ts';

/** Findings of demand, dose, cartridge, interval and life of one point, in order of their codes. */
export function planFindings(ctx: PlanCheckContext): readonly Finding[] {
  const noticed = [...blankChecks(ctx), ...typeChecks(ctx), ...pulseChecks(ctx), ...timedChecks(ctx), ...lifeChecks(ctx)];
  return noticed.map((each) => pointFinding(ctx, each)).sort((a, b) => (a.code < b.code ? -1 : a.code > b.code ? 1 : 0));
}
