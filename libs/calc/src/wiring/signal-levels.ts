import type { Assignment, DispenserType, ModuleType } from '../design.ts';
import { type DesignIndex, moduleTypeOf } from '../design-index.ts';
import type { CircuitSolution, LaneVoltages } from './lane-voltages.ts';
import { type ConductorDrops, inputCurrentA, pulseLevelV, pulsePolarity, signalCoreOhm, statusLevelV } from './signals.ts';

export interface SignalLevels {
  readonly pulseLevelV: number | null;
  readonly statusLevelV: number | null;
}

const UNKNOWN: SignalLevels = { pulseLevelV: null, statusLevelV: null };

/** Pulse and status level of the lane at place i of a solved circuit, at the lowest supply with the worst set. */
export function signalLevels(index: DesignIndex, solution: CircuitSolution, i: number, lane: LaneVoltages, type: DispenserType | null): SignalLevels {
  const { network, lowestV } = solution;
  if (!network.known[i] || !network.fourCore[i] || !type || solution.worst.collapsed) return UNKNOWN;
  const drops: ConductorDrops = { lowestV, zeroRiseV: lane.zeroRiseV, plusDropV: lane.plusDropV };
  const coreOhm = signalCoreOhm(network.tree.signalOhm[network.station[i]], network.ownOhm[i]);
  const output = moduleAt(index, index.control.get(network.ids[i]));
  const input = moduleAt(index, index.status.get(network.ids[i]));
  return {
    pulseLevelV:
      output?.kind === 'output' && type.controlInputA !== null
        ? pulseLevelV(pulsePolarity(type, output), drops, output.dropV, type.controlInputA, coreOhm)
        : null,
    statusLevelV: input?.kind === 'input' && type.status ? statusLevelV(type.status, drops, inputCurrentA(input), coreOhm) : null,
  };
}

function moduleAt(index: DesignIndex, assignment: Assignment | undefined): ModuleType | undefined {
  return assignment && moduleTypeOf(index, assignment.moduleId);
}
