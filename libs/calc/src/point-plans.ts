import type { PointFigures } from './assessment.ts';
import type { Grease, Point, Project } from './design.ts';
import type { DesignIndex } from './design-index.ts';
import type { Finding } from './findings.ts';
import type { Lane, LaneRows } from './lane-rows.ts';
import { demandOf } from './points/demand.ts';
import { assessWithDemand, type PointAssessment } from './points/lubrication.ts';

/** Demand of every point, and the plan of every lane. */
export interface PointPlans {
  /** The tables that demand was read from. */
  readonly points: DesignIndex['points'];
  readonly greases: DesignIndex['greases'];
  readonly inUse: DesignIndex['pointsInUse'];
  readonly project: Project;
  /** By point id. */
  readonly figures: ReadonlyMap<string, PointFigures>;
  /** By place of the lane; null where its point is not there. */
  readonly plans: readonly (PointAssessment | null)[];
  /** Points without a dispenser, by id. */
  readonly bare: ReadonlyMap<string, BarePoint>;
}

interface BarePoint {
  readonly project: Project;
  readonly point: Point;
  readonly grease: Grease | null;
  readonly findings: readonly Finding[];
}

/** Derives demand and plans, taking over those of `previous` whose rows are the same. */
export function pointPlans(index: DesignIndex, rows: LaneRows, previous: PointPlans | null): PointPlans {
  const { points, greases } = index;
  const figures = demands(index, previous);
  const plans = rows.lanes.map((lane, i) => (rows.keptFrom[i] >= 0 ? previous!.plans[rows.keptFrom[i]] : planOf(lane, figures)));
  return { points, greases, inUse: index.pointsInUse, project: index.design.project, figures, plans, bare: barePoints(index, figures, previous) };
}

function demands({ points, greases, design }: DesignIndex, previous: PointPlans | null): ReadonlyMap<string, PointFigures> {
  const sameGreases = previous?.greases === greases;
  if (sameGreases && previous.points === points) return previous.figures;
  const figures = new Map<string, PointFigures>();
  for (const point of design.points) {
    const kept = sameGreases && previous.points.get(point.id) === point ? previous.figures.get(point.id) : undefined;
    figures.set(point.id, kept ?? demandOf(point, greaseOf(point, greases)?.densityGPerCm3 ?? null));
  }
  return figures;
}

function greaseOf({ greaseId }: Point, greases: DesignIndex['greases']): Grease | null {
  return greaseId === null ? null : (greases.get(greaseId) ?? null);
}

function planOf({ project, point, dispenser, type, grease, sharesPoint }: Lane, figures: ReadonlyMap<string, PointFigures>): PointAssessment | null {
  if (!point) return null;
  const assessed = assessWithDemand({ project, point, dispenser, type, grease }, figures.get(point.id)!);
  if (!sharesPoint || assessed.findings.length === 0) return assessed;
  // Keeps the findings of a point with several dispensers apart.
  return { ...assessed, findings: assessed.findings.map((finding) => ({ ...finding, key: `${finding.key}:${dispenser.id}` })) };
}

function barePoints(index: DesignIndex, figures: ReadonlyMap<string, PointFigures>, previous: PointPlans | null): ReadonlyMap<string, BarePoint> {
  const { pointsInUse, greases } = index;
  const { any } = pointsInUse;
  const { project, points } = index.design;
  if (previous && previous.figures === figures && previous.inUse === pointsInUse && previous.project === project) return previous.bare;
  const bare = new Map<string, BarePoint>();
  for (const point of points) {
    if (any.has(point.id)) continue;
    const grease = greaseOf(point, greases);
    const before = previous?.bare.get(point.id);
    const same = before && before.project === project && before.point === point && before.grease === grease;
    const findings = same ? before.findings : assessWithDemand({ project, point, dispenser: null, type: null, grease }, figures.get(point.id)!).findings;
    bare.set(point.id, same ? before : { project, point, grease, findings });
  }
  return bare;
}
