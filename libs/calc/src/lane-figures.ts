import type { CircuitContext } from './assess-context.ts';
import type { LaneFigures, PulsePlan, TimedPlan } from './assessment.ts';
import type { Assignment, Dispenser } from './design.ts';
import { groupIndexOf, groupKey } from './design-index.ts';
import { directAddress } from './hardware/address.ts';
import { channelLoad } from './hardware/channel-load.ts';
import { type Lane, laneWiring, type ModulePlace } from './lane-rows.ts';
import { isStandardSection } from './wiring/conductor.ts';
import { aloneVoltage, type CircuitSolution, largestRunA, smallestPassingSection } from './wiring/lane-voltages.ts';
import { signalLevels } from './wiring/signal-levels.ts';

interface Plans {
  readonly plan: PulsePlan | null;
  readonly timed: TimedPlan | null;
}

/**
 * Figures of one lane.
 *
 * @param column place of the lane in its circuit's columns
 */
export function laneFigures(lane: Lane, plans: Plans | null, circuit: CircuitContext | null, column: number): LaneFigures {
  const { type, dispenser } = lane;
  const known = circuit && circuit.solution.network.known[column] === 1;
  const worst = circuit && circuit.lanes.worst[column];
  const signals = circuit && signalLevels(lane, circuit.solution, column, circuit.lanes);
  const runA = circuit && largestRunA(circuit.solution, column);
  return {
    plan: plans && plans.plan,
    timed: plans && plans.timed,
    outputAddress: addressOf(lane.control, lane.output),
    statusAddress: addressOf(lane.status, lane.input),
    outputGroup: outputGroupOf(lane.control, lane.output),
    channelA: circuit?.solution.worst.collapsed ? null : (channelLoad(type, laneWiring(lane), runA)?.amps ?? null),
    runLengthM: runLengthM(dispenser, circuit?.solution),
    worst,
    allOn: circuit && circuit.lanes.allOn[column],
    aloneV: circuit && aloneVoltage(circuit.solution, column),
    idle: circuit && circuit.lanes.idle[column],
    minV: type ? type.minV : null,
    collapsed: known === true && !worst,
    smallestPassingMm2: circuit && smallestSection(lane, circuit, column),
    pulseLevelV: signals && signals.pulseLevelV,
    statusLevelV: signals && signals.statusLevelV,
    profile: circuit ? circuit.lanes.profile[column] : [],
  };
}

/** Address of an assignment; null where the module is missing or the channel lies beyond it. */
function addressOf(assignment: Assignment | null, place: ModulePlace | null): string | null {
  if (!assignment || !place?.type || assignment.channel < 0 || assignment.channel >= place.type.channels) return null;
  return directAddress(place.type.kind, place.module.baseByte, assignment.channel);
}

function outputGroupOf(control: Assignment | null, place: ModulePlace | null): string | null {
  return control && place?.type ? groupKey(control.moduleId, groupIndexOf(place.type, control.channel)) : null;
}

function runLengthM(dispenser: Dispenser, solution: CircuitSolution | undefined): number | null {
  if (dispenser.cableLengthM === null) return null;
  if (dispenser.nodeId === null) return dispenser.cableLengthM;
  const station = solution?.network.tree.stationOf.get(dispenser.nodeId);
  return solution && station !== undefined ? solution.network.tree.metres[station] + dispenser.cableLengthM : null;
}

function smallestSection({ dispenser, type, project }: Lane, { solution, lanes }: CircuitContext, column: number): number | null {
  const { crossSectionMm2: sectionMm2, cableLengthM: lengthM, conductorClass } = dispenser;
  if (!type || lengthM === null || sectionMm2 === null || !isStandardSection(sectionMm2)) return null;
  return smallestPassingSection(solution, lanes, column, { lengthM, sectionMm2, conductorClass, temperatureC: project.voltageTempC });
}
