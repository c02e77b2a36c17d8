import type { Supply, SupplyType } from '../design.ts';

/** Lowest voltage that counts where a supply states no tolerance, V: 24 V − 15 % (IEC 61131-2). */
export const LOWEST_UNSTATED_V = 20.4;

/** Lowest voltage of a supply, V: setpoint × (1 − tolerance), or 20.4 V where none is stated. */
export function lowestSupplyV(supply: Supply, type: SupplyType | undefined): number {
  const tolerance = type?.tolerancePercent ?? null;
  return tolerance === null ? Math.min(supply.setV, LOWEST_UNSTATED_V) : supply.setV * (1 - tolerance / 100);
}

/** Highest voltage that counts where a supply states no tolerance, V: 24 V + 20 % (IEC 61131-2). */
export const HIGHEST_UNSTATED_V = 28.8;

/** Highest voltage of a supply, V: setpoint × (1 + tolerance), or 28.8 V where none is stated. */
export function highestSupplyV(supply: Supply, type: SupplyType | undefined): number {
  const tolerance = type?.tolerancePercent ?? null;
  return tolerance === null ? Math.max(supply.setV, HIGHEST_UNSTATED_V) : supply.setV * (1 + tolerance / 100);
}
