import type { Assessment, Design, Finding } from '#calc';
import { findingPlace, type FindingPlace } from '../../shared/findings/finding-place';
import type { IconName } from '../../shared/icon/icon-paths';

export interface NavEntry {
  readonly label: string;
  readonly icon: IconName;
  readonly link: readonly string[];
  /** Stands at the right, `46 / 60`. */
  readonly count?: string;
  /** Errors that are mended there. */
  readonly errors?: number;
}

export interface NavGroup {
  readonly title: string | null;
  readonly entries: readonly NavEntry[];
}

/** The pages that exist, with what is waiting on each. Without a project only what stands outside of one. */
export function navOf(projectId: string | null, assessment: Assessment | null, design: Design | null): readonly NavGroup[] {
  const outside: NavGroup = {
    title: projectId === null ? null : 'Organisation',
    entries: [
      { label: 'Projects', icon: 'list', link: ['/projects'] },
      { label: 'Catalogue', icon: 'chip', link: ['/catalogue'] },
    ],
  };
  return projectId === null ? [outside] : [...projectNav(['/projects', projectId], assessment, design), outside];
}

function projectNav(base: readonly string[], assessment: Assessment | null, design: Design | null): readonly NavGroup[] {
  const findings = assessment?.findings ?? [];
  const page = (label: string, icon: IconName, path: string, more: Partial<NavEntry> = {}): NavEntry => ({ label, icon, link: [...base, path], ...more });
  return [
    { title: null, entries: [page('Overview', 'home', 'overview')] },
    {
      title: 'Design',
      entries: [
        page('Points and doses', 'drop', 'points', { count: design ? String(design.points.length) : undefined, errors: errorsAt(findings, 'points') }),
        page('I/O mapping', 'swap', 'mapping', { count: design ? mapped(design) : undefined, errors: errorsAt(findings, 'mapping') }),
        page('Hardware and wiring', 'bolt', 'hardware', { errors: errorsAt(findings, 'hardware') }),
        page('Findings', 'octagon', 'findings', { count: assessment ? String(findings.length) : undefined }),
        page('Import', 'upload', 'import'),
      ],
    },
    { title: 'Record', entries: [page('History', 'clock', 'history')] },
  ];
}

const errorsAt = (findings: readonly Finding[], place: FindingPlace): number =>
  findings.filter((f) => f.severity === 'error' && findingPlace(f) === place).length;

const mapped = (design: Design): string =>
  `${new Set(design.assignments.map((a) => a.dispenserId)).size} / ${design.dispensers.length}`;
