import type { Lane } from '../lane-rows.ts';
import type { CircuitSolution, LaneColumns } from './lane-voltages.ts';
import { type ConductorDrops, inputCurrentA, pulseLevelV, pulsePolarity, signalCoreOhm, statusLevelV } from './signals.ts';

export interface SignalLevels {
  readonly pulseLevelV: number | null;
  readonly statusLevelV: number | null;
}

const UNKNOWN: SignalLevels = { pulseLevelV: null, statusLevelV: null };

/** Pulse and status level of the lane at place i of a solved circuit, at the lowest supply with the worst set. */
export function signalLevels(rows: Lane, solution: CircuitSolution, i: number, { zeroRiseV, plusDropV }: LaneColumns): SignalLevels {
  const { network, lowestV } = solution;
  const { type } = rows;
  if (!network.known[i] || !network.fourCore[i] || !type || solution.worst.collapsed) return UNKNOWN;
  const drops: ConductorDrops = { lowestV, zeroRiseV: zeroRiseV[i], plusDropV: plusDropV[i] };
  const coreOhm = signalCoreOhm(network.tree.signalOhm[network.station[i]], network.ownOhm[i]);
  const output = rows.output?.type;
  const input = rows.input?.type;
  return {
    pulseLevelV:
      output?.kind === 'output' && type.controlInputA !== null
        ? pulseLevelV(pulsePolarity(type, output), drops, output.dropV, type.controlInputA, coreOhm)
        : null,
    statusLevelV: input?.kind === 'input' && type.status ? statusLevelV(type.status, drops, inputCurrentA(input), coreOhm) : null,
  };
}
