import type { Finding, Severity } from '#calc';

export interface FindingFilter {
  /** A severity, or `all`. */
  readonly severity: string;
  /** A code, or empty for every code. */
  readonly code: string;
  /** Looked for in subject, title and remedy. */
  readonly text: string;
}

export interface FindingGroup {
  readonly severity: Severity;
  readonly findings: readonly Finding[];
}

const ORDER: readonly Severity[] = ['error', 'warning', 'note'];

/** What the filter leaves, errors first. Case does not count. */
export function filtered(findings: readonly Finding[], filter: FindingFilter): readonly FindingGroup[] {
  const text = filter.text.trim().toLowerCase();
  const left = findings.filter((f) =>
    (filter.severity === 'all' || f.severity === filter.severity) &&
    (filter.code === '' || f.code === filter.code) &&
    (text === '' || [f.subject.label, f.title, f.remedy, f.code].some((words) => words.toLowerCase().includes(text))));
  return ORDER.map((severity) => ({ severity, findings: left.filter((f) => f.severity === severity) })).filter((g) => g.findings.length > 0);
}

/** The codes that occur, each once, in order. */
export const codesOf = (findings: readonly Finding[]): readonly string[] => [...new Set(findings.map((f) => f.code))].sort();

/** Findings that say the same of several subjects. */
export interface FindingRun {
  readonly key: string;
  readonly findings: readonly Finding[];
}

/** From this many on, findings that say the same stand in one row that opens. */
export const FOLD_FROM = 4;

/** Neighbours with the same code, title and remedy belong together; their order stays. */
export function runsOf(findings: readonly Finding[]): readonly FindingRun[] {
  const runs = new Map<string, Finding[]>();
  for (const finding of findings) {
    const key = `${finding.code} ${finding.title} ${finding.remedy}`;
    const run = runs.get(key);
    if (run) run.push(finding);
    else runs.set(key, [finding]);
  }
  return [...runs].map(([key, own]) => ({ key, findings: own }));
}
