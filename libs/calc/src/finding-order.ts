import type { Finding, Severity } from './findings.ts';

const ORDER: Readonly<Record<Severity, number>> = { error: 0, warning: 1, note: 2 };

/**
 * Findings in their order: errors first, then warnings, then notes; by code, subject label and key. Those
 * equal in all of these stay in the order in which they come.
 */
export function sortedFindings(lists: readonly (readonly Finding[])[]): Finding[] {
  const byCode = new Map<string, Finding[]>();
  for (const list of lists) {
    for (const finding of list) {
      const kind = ORDER[finding.severity] + finding.code;
      const own = byCode.get(kind);
      if (own) own.push(finding);
      else byCode.set(kind, [finding]);
    }
  }
  const sorted: Finding[] = [];
  for (const kind of [...byCode.keys()].sort(compare)) {
    for (const finding of byCode.get(kind)!.sort(byLabel)) sorted.push(finding);
  }
  return sorted;
}

function byLabel(a: Finding, b: Finding): number {
  return compare(a.subject.label, b.subject.label) || compare(a.key, b.key);
}

/** By code units: the same order on every machine. */
function compare(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

/** The findings of each lane, in the order given, by dispenser id. */
export function findingsByLane(findings: readonly Finding[]): Map<string, Finding[]> {
  const lanes = new Map<string, Finding[]>();
  for (const finding of findings) {
    for (const id of finding.dispenserIds) {
      const own = lanes.get(id);
      if (own) own.push(finding);
      else lanes.set(id, [finding]);
    }
  }
  return lanes;
}
