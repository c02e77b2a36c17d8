import type { Circuit, SupplyType } from '../design.ts';
import { type DesignIndex, moduleTypeOf } from '../design-index.ts';
import { temperatureFactor } from './conductor.ts';
import type { CircuitNetwork } from './network.ts';

/** Upper end of the band of instantaneous tripping, multiples of the rated current, AC (IEC 60898-1). */
const MAGNETIC_UPPER = { 'breaker-B': 5, 'breaker-C': 10 } as const;
/** Margin over its rating with which electronic protection is taken to trip at once. */
export const ELECTRONIC_TRIP_FACTOR = 1.5;

/**
 * Current above which a protective device certainly trips at once, A: breakers the upper end of the
 * magnetic band times the DC factor, electronic protection its rating with margin.
 *
 * @returns null for a fuse, whose time-current curve decides
 */
export function instantTripA({ protection, protectionA }: Circuit, breakerDcFactor: number): number | null {
  if (protection === 'fuse') return null;
  if (protection === 'electronic') return protectionA * ELECTRONIC_TRIP_FACTOR;
  return protectionA * MAGNETIC_UPPER[protection] * breakerDcFactor;
}

export interface ShortCircuit {
  /** Smallest short-circuit current, A; null where no lane has a known cable behind the protection. */
  readonly amps: number | null;
  readonly at: string | null;
  /** The supply itself delivers no more. */
  readonly limitedBySupply: boolean;
  /** Lanes behind an output that limits its own short-circuit current: that limit governs. */
  readonly behindOutput: readonly string[];
}

/**
 * Smallest short-circuit current of a circuit: lowest supply voltage over supply, protection and both
 * conductors to the farthest device, hot, and never more than the supply can deliver at all. The short
 * circuit itself counts as 0 Ω, other loads as none.
 *
 * @param network as built for voltages; its resistances are carried over to `tripTempC`
 */
export function smallestShortCircuit(
  index: DesignIndex, network: CircuitNetwork, lowestV: number, internalOhm: number, type: SupplyType | undefined,
): ShortCircuit {
  const { voltageTempC, tripTempC } = index.design.project;
  const hotter = temperatureFactor(tripTempC) / temperatureFactor(voltageTempC);
  const upstream = internalOhm + network.circuit.protectionOhm;
  const behindOutput: string[] = [];
  let smallest = Infinity;
  let at: string | null = null;
  network.ids.forEach((id, i) => {
    if (!network.known[i]) return;
    if (!network.fourCore[i] && limitsItself(index, id)) {
      behindOutput.push(id);
      return;
    }
    const amps = (lowestV - network.outputDropV[i]) / (upstream + hotter * loopOhm(network, i));
    if (amps < smallest) [smallest, at] = [amps, id];
  });
  const limit = type?.shortCircuitA ?? Infinity;
  return { amps: at === null ? null : Math.min(smallest, limit), at, limitedBySupply: at !== null && limit < smallest, behindOutput };
}

/** Both conductors from the circuit's terminals to the device, Ω, at the network's temperature. */
export function loopOhm({ tree, station, ownOhm, fourCore }: CircuitNetwork, i: number): number {
  const s = station[i];
  return tree.powerOhm[s] + (fourCore[i] ? tree.powerOhm[s] : tree.signalOhm[s]) + 2 * ownOhm[i];
}

function limitsItself(index: DesignIndex, dispenserId: string): boolean {
  const control = index.control.get(dispenserId);
  const type = control && moduleTypeOf(index, control.moduleId);
  return type !== undefined && type.shortCircuitA !== null;
}
