import type { Finding, Severity } from '../findings.ts';
import type { PlanCheckContext } from './point-context.ts';

/** What a check says; subject and key are added from the point. */
export interface Noticed {
  readonly code: string;
  readonly severity: Severity;
  readonly title: string;
  readonly detail?: string;
  readonly source: string;
  readonly remedy: string;
  readonly compared?: Finding['compared'];
}

/** A finding about a point: its tag is the label, its dispenser's lane shows it. */
export function pointFinding({ point, dispenser }: PlanCheckContext, noticed: Noticed): Finding {
  return {
    key: `${noticed.code}:${point.id}`,
    code: noticed.code,
    severity: noticed.severity,
    subject: { kind: 'point', id: point.id, label: point.tag },
    title: noticed.title,
    detail: noticed.detail ?? '',
    source: noticed.source,
    remedy: noticed.remedy,
    compared: noticed.compared ?? [],
    dispenserIds: dispenser ? [dispenser.id] : [],
  };
}
