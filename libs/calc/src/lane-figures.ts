import type { Electrics, LaneContext } from './assess-context.ts';
import type { LaneFigures, PulsePlan, TimedPlan } from './assessment.ts';
import type { Assignment, Dispenser, DispenserType } from './design.ts';
import { type DesignIndex, groupIndexOf, groupKey, moduleTypeOf, tagOf, typeOf, wiringOf } from './design-index.ts';
import { directAddress } from './hardware/address.ts';
import { channelLoad } from './hardware/loads.ts';
import { isStandardSection } from './wiring/conductor.ts';
import { type CircuitSolution, type LaneVoltages, smallestPassingSection } from './wiring/lane-voltages.ts';
import { ownCoreOhm } from './wiring/network.ts';
import { signalLevels } from './wiring/signal-levels.ts';

interface Plans {
  readonly plan: PulsePlan | null;
  readonly timed: TimedPlan | null;
}

/** Gathers everything that one lane's figures and checks need. */
export function laneContext(electrics: Electrics, dispenser: Dispenser, plans: Plans | undefined): LaneContext {
  const { index, circuits } = electrics;
  const type = typeOf(index, dispenser);
  const circuitContext = dispenser.circuitId === null ? undefined : circuits.get(dispenser.circuitId);
  const voltages = electrics.voltages.get(dispenser.id) ?? null;
  return {
    index,
    dispenser,
    tag: tagOf(index, dispenser.id),
    type,
    wiring: wiringOf(index, dispenser),
    circuit: circuitContext?.circuit ?? null,
    circuitFigures: circuitContext?.figures ?? null,
    voltages,
    figures: laneFigures(index, dispenser, type, plans, voltages, circuitContext?.solution),
  };
}

function laneFigures(
  index: DesignIndex, dispenser: Dispenser, type: DispenserType | null, plans: Plans | undefined, voltages: LaneVoltages | null,
  solution: CircuitSolution | undefined,
): LaneFigures {
  const control = index.control.get(dispenser.id);
  const place = solution ? placeOf(solution, dispenser.id) : -1;
  const signals = solution && voltages ? signalLevels(index, solution, place, voltages, type) : null;
  return {
    plan: plans?.plan ?? null,
    timed: plans?.timed ?? null,
    outputAddress: addressOf(index, control),
    statusAddress: addressOf(index, index.status.get(dispenser.id)),
    outputGroup: outputGroupOf(index, control),
    channelA: voltages?.noWorkingPoint === 'worst' ? null : (channelLoad(index, dispenser.id, voltages?.runA ?? null)?.amps ?? null),
    runLengthM: runLengthM(dispenser, solution),
    worst: voltages?.worst ?? null,
    allOn: voltages?.allOn ?? null,
    aloneV: voltages?.aloneV ?? null,
    idle: voltages?.idle ?? null,
    minV: type?.minV ?? null,
    collapsed: voltages?.collapsed ?? false,
    smallestPassingMm2: type && voltages ? smallestSection(index, dispenser, type, voltages) : null,
    pulseLevelV: signals?.pulseLevelV ?? null,
    statusLevelV: signals?.statusLevelV ?? null,
    profile: voltages?.profile ?? [],
  };
}

const places = new WeakMap<CircuitSolution, Map<string, number>>();

/** Place of a dispenser in its circuit's columns; the look-up table is made once a solution. */
function placeOf(solution: CircuitSolution, dispenserId: string): number {
  let table = places.get(solution);
  if (!table) places.set(solution, (table = new Map(solution.network.ids.map((id, i) => [id, i]))));
  return table.get(dispenserId) ?? -1;
}

/** Address of an assignment; null where the module is missing or the channel lies beyond it. */
function addressOf(index: DesignIndex, assignment: Assignment | undefined): string | null {
  const module = assignment && index.modules.get(assignment.moduleId);
  const type = module && index.moduleTypes.get(module.typeId);
  if (!assignment || !module || !type || assignment.channel < 0 || assignment.channel >= type.channels) return null;
  return directAddress(type.kind, module.baseByte, assignment.channel);
}

function outputGroupOf(index: DesignIndex, control: Assignment | undefined): string | null {
  const type = control && moduleTypeOf(index, control.moduleId);
  return control && type ? groupKey(control.moduleId, groupIndexOf(type, control.channel)) : null;
}

function runLengthM(dispenser: Dispenser, solution: CircuitSolution | undefined): number | null {
  if (dispenser.cableLengthM === null) return null;
  if (dispenser.nodeId === null) return dispenser.cableLengthM;
  const station = solution?.network.tree.stationOf.get(dispenser.nodeId);
  return solution && station !== undefined ? solution.network.tree.metres[station] + dispenser.cableLengthM : null;
}

function smallestSection(index: DesignIndex, dispenser: Dispenser, type: DispenserType, voltages: LaneVoltages): number | null {
  const sectionMm2 = dispenser.crossSectionMm2;
  if (sectionMm2 === null || !isStandardSection(sectionMm2)) return null;
  const fourCore = wiringOf(index, dispenser) === 'four-core';
  const own = {
    sectionMm2,
    constantPower: type.load === 'constant-power',
    controlA: fourCore && dispenser.method === 'pulse' ? (type.controlInputA ?? 0) : 0,
  };
  const coreOhm = (crossSectionMm2: number): number =>
    ownCoreOhm({ cableLengthM: dispenser.cableLengthM, crossSectionMm2, conductorClass: dispenser.conductorClass }, index.design.project.voltageTempC)!;
  return smallestPassingSection(voltages, type.minV, fourCore, own, coreOhm);
}
