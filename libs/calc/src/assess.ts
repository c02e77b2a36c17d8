import { laneFindings, placeFindings, sortFindings } from './all-findings.ts';
import type { Assessment, LaneFigures, PointFigures, PulsePlan, TimedPlan } from './assessment.ts';
import type { Design, Dispenser } from './design.ts';
import { type DesignIndex, indexDesign, typeOf } from './design-index.ts';
import { solveElectrics } from './electrics.ts';
import type { Finding } from './findings.ts';
import { laneContext } from './lane-figures.ts';
import { assessPoint } from './points/index.ts';

/**
 * Every figure and finding of a project from its rows alone: no clock, no chance, no state. Rows that
 * are blank or contradict each other never throw; they become findings.
 */
export function assess(design: Design): Assessment {
  const index = indexDesign(design);
  const lubrication = assessPoints(index);
  const electrics = solveElectrics(index);
  const lanes = new Map<string, LaneFigures>();
  const findings: Finding[] = [...lubrication.findings, ...placeFindings(electrics)];
  for (const dispenser of design.dispensers) {
    const context = laneContext(electrics, dispenser, lubrication.plans.get(dispenser.id));
    lanes.set(dispenser.id, context.figures);
    for (const finding of laneFindings(context)) findings.push(finding);
  }
  sortFindings(findings);
  return {
    points: lubrication.figures,
    lanes,
    groups: electrics.hardware.groups,
    modules: electrics.hardware.modules,
    circuits: new Map([...electrics.circuits].map(([id, context]) => [id, context.figures])),
    supplies: electrics.supplies,
    findings,
    findingsByLane: byLane(findings),
  };
}

interface Lubrication {
  readonly figures: Map<string, PointFigures>;
  readonly plans: Map<string, { readonly plan: PulsePlan | null; readonly timed: TimedPlan | null }>;
  readonly findings: Finding[];
}

/** Demand and plan of each point with each of its dispensers, or with none. */
function assessPoints(index: DesignIndex): Lubrication {
  const result: Lubrication = { figures: new Map(), plans: new Map(), findings: [] };
  const { project } = index.design;
  for (const point of index.design.points) {
    const grease = point.greaseId === null ? null : (index.greases.get(point.greaseId) ?? null);
    const dispensers: readonly (Dispenser | null)[] = index.dispensersByPoint.get(point.id) ?? [null];
    for (const dispenser of dispensers) {
      const type = dispenser && typeOf(index, dispenser);
      const assessed = assessPoint({ project, point, dispenser, type, grease });
      result.figures.set(point.id, assessed.figures);
      if (dispenser) result.plans.set(dispenser.id, assessed);
      for (const finding of assessed.findings) result.findings.push(dispensers.length > 1 ? ofOne(finding, dispenser) : finding);
    }
  }
  return result;
}

/** Keeps findings of a point with several dispensers apart. */
function ofOne(finding: Finding, dispenser: Dispenser | null): Finding {
  return { ...finding, key: `${finding.key}:${dispenser?.id ?? ''}` };
}

function byLane(findings: readonly Finding[]): Map<string, Finding[]> {
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
