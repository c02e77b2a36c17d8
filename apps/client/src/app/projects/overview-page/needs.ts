import type { Assessment, Design, Finding } from '#calc';
import type { FindingMarkKind } from '../../shared/findings/finding-mark';
import { findingLink } from '../../shared/findings/finding-place';

/** One thing that waits for the engineer; several findings of one code are one thing. */
export interface Need {
  readonly key: string;
  readonly mark: FindingMarkKind;
  readonly title: string;
  readonly detail: string;
  /** Below the project. */
  readonly link: readonly string[];
}

const MOST = 8;

export function needsOf(design: Design, assessment: Assessment): readonly Need[] {
  const gathered = new Map<string, Finding[]>();
  for (const finding of assessment.findings) {
    if (finding.severity === 'note') continue;
    const same = gathered.get(finding.code);
    if (same) same.push(finding);
    else gathered.set(finding.code, [finding]);
  }
  const smaller = smallerLimits(design, assessment);
  return [...smaller, ...[...gathered.values()].map(needOf)].slice(0, MOST);
}

/** Where a smaller k would let a circuit's voltages, groups and supply pass: the cheapest remedy, so it comes first. */
function smallerLimits(design: Design, assessment: Assessment): readonly Need[] {
  return design.circuits.flatMap((circuit) => {
    const figures = assessment.circuits.get(circuit.id);
    const passing = figures?.largestPassingK ?? null;
    const now = circuit.concurrencyLimit ?? figures?.dispensers ?? 0;
    if (passing === null || passing < 1 || passing >= now) return [];
    return [{
      key: `k/${circuit.id}`, mark: 'error' as const, link: ['hardware'],
      title: `Circuit ${circuit.name} passes with k = ${passing}`,
      detail: `Now at most ${now} may run at once; ${passing} keeps voltage, groups and supply within their limits.`,
    }];
  });
}

function needOf(findings: readonly Finding[]): Need {
  const [first] = findings as [Finding];
  const one = findings.length === 1;
  const subjects = findings.slice(0, 3).map((f) => f.subject.label).join(', ');
  return {
    key: first.code, mark: first.severity, link: one ? findingLink(first) : ['findings'],
    title: one ? `${first.subject.label}: ${first.title}` : `${findings.length} × ${first.code}: ${first.title}`,
    detail: one ? first.remedy : `${subjects}${findings.length > 3 ? ` and ${findings.length - 3} more` : ''}. ${first.remedy}`,
  };
}
