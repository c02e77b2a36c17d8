export { alternatives, type Alternative, type Alternatives } from './alternatives.ts';
export { bearingSteps, type BearingSteps } from './bearing-demand.ts';
export { demandOf } from './demand.ts';
export { assessPoint, type PointAssessment } from './lubrication.ts';
export { planFindings } from './plan-checks.ts';
export { PLAN_CODES } from './plan-codes.ts';
export type { PlanCheckContext, PointContext } from './point-context.ts';
export { pulsePlan, type PulsePlanInput } from './pulse-plan.ts';
export { timedPlan, type TimedPlanInput } from './timed-plan.ts';
