import type { PointFigures, PulsePlan, TimedPlan } from '../assessment.ts';
import type { Dispenser, DispenserType, Grease, Point, Project } from '../design.ts';

/** One point with what stands at it; `null`: not there or not decided yet. */
export interface PointContext {
  readonly project: Project;
  readonly point: Point;
  readonly dispenser: Dispenser | null;
  readonly type: DispenserType | null;
  readonly grease: Grease | null;
  /** Longest wait for the circuit's arbiter, ms; left out: none (a schedule, or no limit *k*). */
  readonly waitBoundMs?: number;
}

/** A point with what was computed for it. */
export interface PlanCheckContext extends PointContext {
  readonly figures: PointFigures;
  readonly plan: PulsePlan | null;
  readonly timed: TimedPlan | null;
}
