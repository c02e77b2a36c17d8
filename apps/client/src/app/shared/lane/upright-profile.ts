import { type Mark, path, round } from '../drawing/mark';
import type { LoopProfile } from './loop-view';
import { voltScale } from './profile-scale';
import type { UprightStation } from './upright-stations';

/** The part of the voltage column beside one station, in percent of its cell: low volts left, high volts right. */
export interface ColumnPart {
  /** From this station's node to the next one's, stretched to the line's height; empty at the end. */
  readonly lines: readonly Mark[];
  /** Where the worst voltage stands, percent from the left; null: it has none. */
  readonly dot: number | null;
  /** Where the lowest permitted voltage stands. */
  readonly min: number | null;
  /** At the dispenser: the lowest while it idles, and with all on. */
  readonly idle: number | null;
  readonly allOn: number | null;
}

/** The profile hung beside the upright lane: one part a station, in the stations' order. */
export function columnParts(profile: LoopProfile | null, stations: readonly UprightStation[]): readonly (ColumnPart | null)[] {
  if (profile === null) return stations.map(() => null);
  const scale = voltScale(profile);
  const x = (volts: number | null): number | null => (volts === null ? null : round(4 + 92 * (1 - scale.at(volts))));
  const last = stations.findLastIndex((s) => s.volts !== undefined);
  return stations.map((station, i) => {
    if (station.volts === undefined) return null;
    const next = stations.slice(i + 1).find((s) => s.volts !== undefined)?.volts;
    const end = i === last;
    return {
      dot: x(station.volts.worstV), min: x(profile.minV), idle: end ? x(profile.idleV) : null, allOn: end ? x(profile.allOnV) : null,
      lines: next === undefined ? [] : [...stretch('v-alone', x(station.volts.aloneV), x(next.aloneV)), ...stretch('v-now', x(station.volts.worstV), x(next.worstV))],
    };
  });
}

const stretch = (cls: string, from: number | null, to: number | null): readonly Mark[] =>
  from === null || to === null ? [] : [path(cls, `M${from} 0L${to} 100`)];
