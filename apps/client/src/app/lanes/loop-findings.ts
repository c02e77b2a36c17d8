import type { Finding } from '#calc';
import type { LoopFinding, LoopPlace } from '../shared/lane/loop-view';

/** Codes by the part of the lane at which they stand; the first that fits counts. */
const PLACES: readonly (readonly [RegExp, LoopPlace])[] = [
  [/^(MP-02|MP-11|SG-02|SG-04|SG-06|SG-07|SG-10)$/, 'status'],
  [/^(SG-01|TG|VD)/, 'dispenser'],
  [/^(PR|MP-12)/, 'protection'],
  [/^(IO|SG|MP)/, 'output'],
  [/^SU/, 'supply'],
  [/^CB-0[45]$/, 'trunk'],
  [/^CB/, 'cable'],
  [/^(AR|PL-01|PL-06|PL-3)/, 'point'],
  [/^PL/, 'dispenser'],
];

/** The lane's findings at the parts where they stand; what concerns the project as a whole stands at none. */
export function loopFindingsOf(findings: readonly Finding[], dispenserId: string): readonly LoopFinding[] {
  return findings.flatMap((finding) => {
    const place = placeOf(finding, dispenserId);
    return place === null ? [] : [{ place, severity: finding.severity, code: finding.code, title: finding.title }];
  });
}

function placeOf(finding: Finding, dispenserId: string): LoopPlace | null {
  // A tag on two cables: its subject is the dispenser whose own cable it is, or the box that the trunk leads to.
  if (finding.code === 'CB-03' && finding.subject.id !== dispenserId && !finding.dispenserIds.includes(dispenserId)) return 'trunk';
  return PLACES.find(([codes]) => codes.test(finding.code))?.[1] ?? null;
}
