import { formatMetres, formatNumber } from '#calc';
import { circle, type Mark, path, rect, round, text, unit } from '../drawing/mark';
import { PROFILE, stationXs, X } from './loop-geometry';
import { type LoopProfile, type LoopView, shownStations } from './loop-view';

/** The voltage along the lane, hung from the diagram's stations: worst set, running alone, lowest permitted. */
export function profileShapes(loop: LoopView): readonly Mark[] {
  if (loop.profile === null || loop.profile.stations.length < 2) return [];
  const profile = { ...loop.profile, stations: shownStations(loop) };
  const xs = stationXs(loop, profile.stations.length);
  const y = scaleOf(profile);
  return [...ground(profile, xs, y), ...lines(profile, xs, y), ...verdict(profile, y), ...legend(profile)];
}

type Scale = ((volts: number) => number) & { readonly ticks: readonly number[] };

function scaleOf(profile: LoopProfile): Scale {
  const all = profile.stations.flatMap((s) => [s.worstV, s.aloneV]).concat(profile.minV ?? []);
  const [top, bottom] = [Math.max(...all) + 0.15, Math.min(...all) - 0.45];
  const y = (volts: number): number => PROFILE.top + 8 + ((top - volts) / (top - bottom)) * (PROFILE.height - 26);
  const step = top - bottom > 10 ? 5 : top - bottom > 5 ? 2 : 1;
  const first = Math.ceil(bottom / step) * step;
  return Object.assign(y, { ticks: Array.from({ length: Math.floor((top - first) / step) + 1 }, (_, i) => first + i * step) });
}

function ground(profile: LoopProfile, xs: readonly number[], y: Scale): readonly Mark[] {
  const foot = PROFILE.top + PROFILE.height;
  return [
    ...y.ticks.flatMap((v) => [path('grid', `M${X.terminal} ${round(y(v))}H${X.dispenser}`), text('dim', X.terminal - 8, y(v) + 4, String(v), 'end')]),
    ...xs.flatMap((x, i) => [
      path('plumb', `M${x + 0.5} ${PROFILE.top - 6}V${foot - 14}`),
      text('dim', x, foot - 1, formatMetres(profile.stations[i].metres), i === xs.length - 1 ? 'end' : 'middle'),
    ]),
  ];
}

function lines(profile: LoopProfile, xs: readonly number[], y: Scale): readonly Mark[] {
  const line = (cls: string, of: (s: LoopProfile['stations'][number]) => number): Mark =>
    path(cls, profile.stations.map((s, i) => `${i === 0 ? 'M' : 'L'}${round(xs[i])} ${round(y(of(s)))}`).join(''));
  const last = profile.stations.length - 1;
  return [
    ...minimum(profile, y), line('v-alone', (s) => s.aloneV), line('v-now', (s) => s.worstV),
    ...profile.stations.flatMap((s, i) => [
      circle('v-dot', xs[i], y(s.worstV), 3.2),
      ...(i === last ? [] : [rect('gap', xs[i] + 5, y(s.worstV) + 5, 28, 14), text('strong', xs[i] + 7, y(s.worstV) + 16, formatNumber(s.worstV, 1, 'down'))]),
    ]),
  ];
}

function minimum(profile: LoopProfile, y: Scale): readonly Mark[] {
  if (profile.minV === null) return [];
  const at = y(profile.minV);
  const words = `lowest for this dispenser ${formatNumber(profile.minV, 1)} V`;
  return [path('v-min', `M${X.terminal} ${round(at)}H${X.dispenser}`), rect('gap', X.terminal + 12, at - 15, words.length * 5.9, 13), text('c-err', X.terminal + 14, at - 4.5, words)];
}

/** Right of the chart: the figure that counts, and how it comes about. */
function verdict(profile: LoopProfile, y: Scale): readonly Mark[] {
  const end = profile.stations.at(-1)!;
  const low = profile.minV !== null && end.worstV < profile.minV;
  const [x, at] = [X.dispenser + 16, Math.min(y(end.worstV), PROFILE.top + PROFILE.height - 62)];
  const margin = profile.minV === null ? null : Math.abs(end.worstV - profile.minV);
  return [
    text('', x, at - 18, [{ cls: 'strong', text: formatNumber(end.aloneV, 1) }, unit('V'), ' running alone']),
    text(low ? 'lead c-err' : 'lead', x, at + 12, [formatNumber(end.worstV, 1, 'down'), unit('V')]),
    ...wrapped(profile.worstSet, 40).map((line, i) => text('', x + 76, at + 2 + i * 15, line)),
    ...(margin === null ? [] : [text(low ? 'c-err' : '', x, at + 38, [
      { cls: 'strong', text: formatNumber(margin, 1, low ? 'up' : 'down') }, unit('V'), low ? ' below the lowest' : ' above the lowest',
      ...(profile.allOnV === null ? [] : [`; all ${profile.allOnCount} on: ${formatNumber(profile.allOnV, 1, 'down')} V`]),
    ])]),
  ];
}

const legend = (profile: LoopProfile): readonly Mark[] => {
  const y = PROFILE.top + 16;
  const rows = [['v-now', 'worst permitted set'], ['v-alone', 'running alone'], ...(profile.minV === null ? [] : [['v-min', 'lowest permitted']])] as const;
  return [text('z', 12, y, 'Voltage along the lane'), ...rows.flatMap(([cls, words], i) => [path(cls, `M12 ${y + 18 + i * 18}h26`), text('dim', 46, y + 22 + i * 18, words)])];
};

/** Words broken into at most two lines; what is left over ends in an ellipsis. */
function wrapped(words: string, width: number): readonly string[] {
  if (words.length <= width) return [words];
  const at = words.lastIndexOf(' ', width);
  const rest = words.slice(at + 1);
  return [words.slice(0, at), rest.length > width ? `${rest.slice(0, width - 1)}…` : rest];
}
