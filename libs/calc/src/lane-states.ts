import { laneFindings } from './all-findings.ts';
import type { LaneFigures } from './assessment.ts';
import type { Electrics } from './electrics.ts';
import type { Finding } from './findings.ts';
import { laneFigures } from './lane-figures.ts';
import type { LaneRows } from './lane-rows.ts';
import type { PointPlans } from './point-plans.ts';

/** Figures and findings of one lane. */
export interface LaneState {
  readonly figures: LaneFigures;
  /** Of its plan and of its chain. */
  readonly findings: readonly Finding[];
}

/** All lanes in order, with the electrics that they were read from. */
export interface LaneStates {
  readonly states: readonly LaneState[];
  readonly electrics: Electrics;
}

/** Derives every lane, taking over from `previous` those whose rows and circuit are the same. */
export function laneStates(rows: LaneRows, { plans }: PointPlans, electrics: Electrics, previous: LaneStates | null): LaneStates {
  const { circuitOf, columnOf } = electrics;
  const states = rows.lanes.map((lane, i): LaneState => {
    const from = rows.keptFrom[i];
    if (from >= 0 && previous!.electrics.circuitOf[from] === circuitOf[i]) return previous!.states[from];
    const figures = laneFigures(lane, plans[i], circuitOf[i], columnOf[i]);
    const findings: Finding[] = [];
    for (const finding of plans[i]?.findings ?? NONE) findings.push(finding);
    laneFindings({ rows: lane, circuit: circuitOf[i], column: columnOf[i], figures }, findings);
    return { figures, findings: findings.length === 0 ? NONE : findings };
  });
  return { states, electrics };
}

const NONE: readonly Finding[] = [];
