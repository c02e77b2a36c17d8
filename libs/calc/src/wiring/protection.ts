import type { Circuit, Project, SupplyType } from '../design.ts';
import { ampsAgainstMaximum, formatAmps } from '../format.ts';
import type { Lane } from '../lane-rows.ts';
import { temperatureFactor } from './conductor.ts';
import type { CircuitNetwork } from './network.ts';

/** Upper end of the band of instantaneous tripping, multiples of the rated current, AC (IEC 60898-1). */
const MAGNETIC_UPPER = { 'breaker-B': 5, 'breaker-C': 10 } as const;
/** Multiples of its rating that a breaker carries without tripping for an hour or more, and at which it trips within one or two (IEC 60898-1). */
const CARRIES = 1.13;
const TRIPS = 1.45;
/**
 * Multiple of its rating at which electronic protection is taken to trip at once. An assumption of this
 * program, not a figure of any type or standard: the type's data decide.
 */
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

/**
 * What the protection of a circuit does with a current above its rating with all on, as a sentence that
 * promises no more than IEC 60898-1 does.
 *
 * @returns null where the current does not exceed the rating
 */
export function overloadText(circuit: Circuit, amps: number, breakerDcFactor: number): string | null {
  if (amps <= circuit.protectionA + 1e-9) return null;
  return `${ampsAgainstMaximum(amps)} with all on, above the ${formatAmps(circuit.protectionA)} of ${circuit.name}’s protection${overloadOutcome(circuit, amps, breakerDcFactor)}.`;
}

function overloadOutcome(circuit: Circuit, amps: number, breakerDcFactor: number): string {
  if (circuit.protection === 'fuse') return ': its time-current curve says whether and when it melts';
  if (circuit.protection === 'electronic') return ': its type data say whether and when it switches off';
  if (amps <= CARRIES * circuit.protectionA) return `, which need not act at all below ${CARRIES} times its rating`;
  if (amps < TRIPS * circuit.protectionA) return ': it may carry that for hours before it trips, or not trip';
  return amps >= instantTripA(circuit, breakerDcFactor)! ? ': it trips at once' : ': it will trip sooner or later, not at once';
}

export interface ShortCircuit {
  /** Smallest short-circuit current, A; null where no lane has a known cable behind the protection. */
  readonly amps: number | null;
  readonly at: string | null;
  /** The supply itself delivers no more. */
  readonly limitedBySupply: boolean;
  /** What the supply delivers into a short circuit, A; null: not known. */
  readonly supplyA: number | null;
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
  { voltageTempC, tripTempC }: Project, network: CircuitNetwork, lowestV: number, internalOhm: number, type: SupplyType | undefined,
): ShortCircuit {
  const hotter = temperatureFactor(tripTempC) / temperatureFactor(voltageTempC);
  const upstream = internalOhm + network.circuit.protectionOhm;
  const behindOutput: string[] = [];
  let smallest = Infinity;
  let at: string | null = null;
  network.ids.forEach((id, i) => {
    if (!network.known[i]) return;
    if (!network.fourCore[i] && limitsItself(network.lanes[i])) {
      behindOutput.push(id);
      return;
    }
    const amps = (lowestV - network.outputDropV[i]) / (upstream + hotter * loopOhm(network, i));
    if (amps < smallest) [smallest, at] = [amps, id];
  });
  const limit = type?.shortCircuitA ?? Infinity;
  return { amps: at === null ? null : Math.min(smallest, limit), at, limitedBySupply: at !== null && limit < smallest, supplyA: type?.shortCircuitA ?? null, behindOutput };
}

/** Both conductors from the circuit's terminals to the device, Ω, at the network's temperature. */
export function loopOhm({ tree, station, ownOhm, fourCore }: CircuitNetwork, i: number): number {
  const s = station[i];
  return tree.powerOhm[s] + (fourCore[i] ? tree.powerOhm[s] : tree.signalOhm[s]) + 2 * ownOhm[i];
}

function limitsItself({ output }: Lane): boolean {
  return output?.type != null && output.type.shortCircuitA !== null;
}
