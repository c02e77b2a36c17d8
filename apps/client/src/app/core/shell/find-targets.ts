import type { Assessment, Design } from '#calc';
import type { NavGroup } from './nav';

/** Something that can be gone to: a page, a point, an address, a piece of hardware. */
export interface FindTarget {
  readonly kind: 'page' | 'point' | 'address' | 'hardware';
  readonly label: string;
  readonly detail: string;
  readonly link: readonly string[];
  /** The row to begin with, where the page shows many. */
  readonly point?: string;
}

export function findTargets(nav: readonly NavGroup[], design: Design | null, assessment: Assessment | null): readonly FindTarget[] {
  const pages = nav.flatMap((g) => g.entries).map((e): FindTarget => ({ kind: 'page', label: e.label, detail: '', link: e.link }));
  if (!design) return pages;
  const base = ['/projects', design.project.id];
  const points = new Map(design.points.map((p) => [p.id, p]));
  const withDispenser = new Set(design.dispensers.map((d) => d.pointId));
  return [
    ...pages,
    ...design.dispensers.map((d): FindTarget => {
      const point = points.get(d.pointId);
      return { kind: 'point', label: point?.tag ?? '', detail: point?.description ?? '', link: [...base, 'lanes', d.id] };
    }),
    ...design.points.filter((p) => !withDispenser.has(p.id)).map((p): FindTarget => ({ kind: 'point', label: p.tag, detail: p.description ?? '', link: [...base, 'points'], point: p.id })),
    ...design.dispensers.flatMap((d) => addresses(assessment, d.id).map((address): FindTarget =>
      ({ kind: 'address', label: address, detail: points.get(d.pointId)?.tag ?? '', link: [...base, 'lanes', d.id] }))),
    ...hardware(design).map(([label, detail]): FindTarget => ({ kind: 'hardware', label, detail, link: [...base, 'hardware'] })),
  ];
}

const addresses = (assessment: Assessment | null, dispenserId: string): readonly string[] => {
  const lane = assessment?.lanes.get(dispenserId);
  return [lane?.outputAddress, lane?.statusAddress].filter((a): a is string => typeof a === 'string');
};

const hardware = (design: Design): readonly (readonly [string, string])[] => [
  ...design.cabinets.map((c) => [c.location, c.description] as const),
  ...design.cableNodes.map((n) => [n.location, `box, ${n.cableTag}`] as const),
  ...design.circuits.map((c) => [c.name, 'circuit'] as const),
  ...design.supplies.map((s) => [s.name, 'supply'] as const),
];

const MOST = 12;

/** The best matches: those that begin with the words before those that only contain them. Case does not count. */
export function matching(targets: readonly FindTarget[], query: string): readonly FindTarget[] {
  const wanted = query.trim().toLowerCase();
  if (wanted === '') return targets.filter((t) => t.kind === 'page').slice(0, MOST);
  const rank = (t: FindTarget): number => {
    const label = t.label.toLowerCase();
    return label.startsWith(wanted) ? 0 : label.includes(wanted) ? 1 : t.detail.toLowerCase().includes(wanted) ? 2 : 3;
  };
  const ranked: FindTarget[][] = [[], [], []];
  for (const target of targets) ranked[rank(target)]?.push(target);
  return ranked.flat().slice(0, MOST);
}
