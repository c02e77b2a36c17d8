import type { Finding } from '#calc';

export type FindingPlace = 'points' | 'mapping' | 'hardware';

/** The page on which a finding is mended. */
export function findingPlace(finding: Finding): FindingPlace {
  if (finding.subject.kind === 'point' || finding.code.startsWith('PL') || finding.code.startsWith('AR')) return 'points';
  if (finding.subject.kind === 'channel' || finding.code.startsWith('MP')) return 'mapping';
  return 'hardware';
}

/** Where a click on it leads: the one lane that it is about, else the page that mends it. Below `/projects/:id`. */
export function findingLink(finding: Finding): readonly string[] {
  if (finding.subject.kind === 'dispenser') return ['lanes', finding.subject.id];
  const [only, ...others] = finding.dispenserIds;
  const ofOneLane = only !== undefined && others.length === 0 && ['channel', 'cable'].includes(finding.subject.kind);
  return ofOneLane ? ['lanes', only] : [findingPlace(finding)];
}
