import type { DispenserType, Supply, SupplyType, Wiring } from '../design.ts';
import { NOMINAL_V } from '../wiring/network.ts';
import { HIGHEST_UNSTATED_V, highestSupplyV } from '../wiring/supply-voltage.ts';

/** What an output channel carries, A. */
export interface ChannelLoad {
  readonly amps: number;
  /** When the motor starts; null where only a pulse input is driven. */
  readonly peakA: number | null;
}

/**
 * Load on the output channel of a dispenser: two-core the motor's current with its starting peak,
 * four-core the current of the pulse input.
 *
 * @param runA largest current through the motor as the network says; null where it is in none
 * @returns null while type or wiring is unknown, or the device takes no pulse from an output
 */
export function channelLoad(type: DispenserType | null, wiring: Wiring | null, runA: number | null): ChannelLoad | null {
  if (!type) return null;
  if (wiring === 'two-core') return { amps: runA ?? type.runA, peakA: type.peakA };
  if (wiring === 'four-core' && type.controlInputA !== null) return { amps: type.controlInputA, peakA: null };
  return null;
}

/**
 * Smallest current on the output channel while it is on, A: with constant power through the motor that at
 * the supply's highest voltage and no drop, else the one current there is.
 *
 * @param supply of the lane's circuit; null: not known
 */
export function leastChannelA(type: DispenserType | null, wiring: Wiring | null, supply: Supply | null, supplyType: SupplyType | null, amps: number): number {
  if (!type || type.load !== 'constant-power' || wiring !== 'two-core') return amps;
  const highest = supply ? highestSupplyV(supply, supplyType ?? undefined) : HIGHEST_UNSTATED_V;
  return Math.min(amps, (type.runA * NOMINAL_V) / highest);
}
