import type { Finding } from '../findings.ts';
import { blankChecks } from './blank-checks.ts';
import { type Noticed, pointFinding } from './finding.ts';
import type { PlanCheckContext } from './point-context.ts';
import { pulseChecks } from './pulse-checks.ts';
import { timedChecks } from './timed-checks.ts';
import { lifeChecks, typeChecks } from './type-checks.ts';

/** Findings of demand, dose, cartridge, interval and life of one point, in order of their codes. */
export function planFindings(ctx: PlanCheckContext): readonly Finding[] {
  const noticed: Noticed[] = [];
  for (const check of CHECKS) check(ctx, noticed);
  if (noticed.length === 0) return NOTHING_NOTICED;
  const findings = noticed.map((each) => pointFinding(ctx, each));
  return findings.length < 2 ? findings : findings.sort((a, b) => (a.code < b.code ? -1 : a.code > b.code ? 1 : 0));
}

/** Each adds what it notices. */
const CHECKS = [blankChecks, typeChecks, pulseChecks, timedChecks, lifeChecks] as const;
const NOTHING_NOTICED: readonly Finding[] = [];
