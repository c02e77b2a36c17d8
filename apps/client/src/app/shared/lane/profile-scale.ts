import type { LoopProfile } from './loop-view';

/** From volts to a place on an axis, and the whole volts that are marked on it. */
export interface VoltScale {
  /** Place of a voltage, from 0 (highest) to 1 (lowest); what lies under the axis stands at its foot. */
  readonly at: (volts: number) => number;
  readonly ticks: readonly number[];
  readonly lowest: number;
}

/** How far under the lowest permitted voltage the axis goes at most, V: a collapse must not flatten the rest. */
const BELOW = 4;

/** Every voltage of a profile on one axis; figures that are missing or not finite are left out. */
export function voltScale(profile: LoopProfile): VoltScale {
  const drawn = profile.stations.flatMap((s) => [s.worstV, s.aloneV]).concat(profile.idleV, profile.allOnV, profile.minV, profile.lowestV).filter(isFigure);
  if (drawn.length === 0) return { at: () => 0, ticks: [], lowest: 0 };
  const floor = profile.minV === null ? -Infinity : profile.minV - BELOW;
  const top = Math.max(...drawn) + 0.15;
  const bottom = Math.max(Math.min(...drawn), floor) - 0.45;
  const step = top - bottom > 10 ? 5 : top - bottom > 5 ? 2 : 1;
  const first = Math.ceil(bottom / step) * step;
  return {
    at: (volts) => Math.min(1, Math.max(0, (top - volts) / (top - bottom))), lowest: bottom,
    ticks: Array.from({ length: Math.floor((top - first) / step) + 1 }, (_, i) => first + i * step),
  };
}

const isFigure = (value: number | null): value is number => value !== null && Number.isFinite(value);
