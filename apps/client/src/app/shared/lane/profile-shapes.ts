import { formatMetres, formatNumber } from '#calc';
import { circle, type Mark, path, rect, round, text } from '../drawing/mark';
import { type Layout, PROFILE_HEIGHT, stationXs } from './loop-geometry';
import { type LoopProfile, type LoopView, type ProfileStation, shownStations } from './loop-view';
import { voltScale } from './profile-scale';
import { allOnMark, idleMark, legend, verdict } from './profile-verdict';

/** One profile put in its place under the diagram. */
interface Chart {
  readonly profile: LoopProfile;
  readonly stations: readonly ProfileStation[];
  readonly xs: readonly number[];
  /** Left and right end, top and foot, px. */
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly foot: number;
  readonly y: (volts: number) => number;
  readonly ticks: readonly number[];
}

/** The voltage along the lane, hung from the diagram's stations: worst set, alone, idle, all on, lowest permitted. */
export function profileShapes(loop: LoopView, layout: Layout): readonly Mark[] {
  if (loop.profile === null) return [];
  const chart = chartOf(loop, loop.profile, layout);
  return [
    ...ground(chart, loop, layout), ...minimum(chart), ...alone(chart), ...worst(chart), ...atDevice(chart),
    ...legend(loop.profile, layout), ...verdict(loop.profile, layout),
  ];
}

function chartOf(loop: LoopView, profile: LoopProfile, layout: Layout): Chart {
  const stations = shownStations(loop);
  const scale = voltScale(profile);
  const [top, foot] = [layout.profileTop, layout.profileTop + PROFILE_HEIGHT];
  return {
    profile, stations, xs: stationXs(layout, stations.length), left: layout.terminal, right: layout.dispenser, top, foot,
    y: (volts) => round(top + 8 + scale.at(volts) * (PROFILE_HEIGHT - 32)), ticks: scale.ticks,
  };
}

function ground({ ticks, y, left, right, xs, stations, top, foot }: Chart, loop: LoopView, { conductors }: Layout): readonly Mark[] {
  const below = conductors.at(-1)!.y + 16;
  return [
    ...ticks.flatMap((v) => [path('grid', `M${left} ${y(v)}H${right}`), text('dim', left - 10, y(v) + 4, String(v), 'end')]),
    ...xs.flatMap((x, i) => {
      const underBox = i > 0 && i <= loop.boxes.length;
      const from = underBox ? below + (loop.boxes[i - 1].others > 0 ? 36 : 20) : i === xs.length - 1 ? below + 4 : i === 0 && loop.othersAtCabinet > 0 ? below + 12 : below;
      return [
        path('plumb', `M${x + 0.5} ${Math.min(from, top)}V${foot - 16}`),
        text('dim', x, foot - 2, formatMetres(stations[i].metres), i === xs.length - 1 ? 'end' : 'middle'),
      ];
    }),
  ];
}

function minimum({ profile: { minV }, y, left, right }: Chart): readonly Mark[] {
  if (minV === null) return [];
  const words = `lowest for this dispenser ${formatNumber(minV, 1)} V`;
  const at = y(minV);
  return [path('v-min', `M${left} ${at}H${right}`), rect('gap', left + 8, at + 3, words.length * 5.9, 14), text('c-err', left + 10, at + 14, words)];
}

const polyline = (cls: string, points: readonly (readonly [number, number])[]): readonly Mark[] =>
  points.length < 2 ? [] : [path(cls, points.map(([x, y], i) => `${i === 0 ? 'M' : 'L'}${round(x)} ${y}`).join(''))];

function placed({ stations, xs, y }: Chart, of: (s: ProfileStation) => number | null): readonly (readonly [number, number, number])[] {
  return stations.flatMap((s, i) => {
    const volts = of(s);
    return volts === null ? [] : [[xs[i], y(volts), volts] as const];
  });
}

function alone(chart: Chart): readonly Mark[] {
  const points = placed(chart, (s) => s.aloneV);
  return [...polyline('v-alone', points.map(([x, y]) => [x, y])), ...(points.length === 1 ? [circle('v-alone', points[0][0], points[0][1], 3.2)] : [])];
}

function worst(chart: Chart): readonly Mark[] {
  if (chart.profile.collapsed) return collapse(chart);
  const points = placed(chart, (s) => s.worstV);
  return [
    ...polyline('v-now', points.map(([x, y]) => [x, y])),
    ...points.flatMap(([x, y, volts], i) => [
      circle('v-dot', x, y, 3.2),
      ...(i === points.length - 1 ? [] : [rect('gap', x + 5, y + 5, 28, 14), text('strong', x + 7, y + 16, formatNumber(volts, 1, 'down'))]),
    ]),
  ];
}

/** No working point, or nothing left at the device: from the supply's lowest voltage the line falls out of the chart, and a cross stands at its end. */
function collapse({ profile: { lowestV }, xs, left, y, foot }: Chart): readonly Mark[] {
  const end = xs[1] ?? left;
  const [from, to] = [lowestV === null ? y(Infinity) : y(lowestV), foot - 20];
  const x = left + (end - left) * 0.5;
  return [
    path('v-fall', `M${left} ${from}C${round(left + (x - left) * 0.7)} ${from} ${round(x)} ${round(from + (to - from) * 0.3)} ${round(x)} ${to}`),
    ...(lowestV === null ? [] : [circle('v-dot', left, from, 3.2), text('strong', left + 9, from - 6, formatNumber(lowestV, 1, 'down'))]),
    path('v-cross', `M${round(x - 5)} ${to - 5}l10 10m0 -10l-10 10`), rect('gap', x + 10, to - 8, 92, 15), text('c-err strong', x + 12, to + 4, 'no voltage left'),
  ];
}

/** At the dispenser besides the worst set: a square while it idles, a rhomb with all on. */
function atDevice({ profile: { idleV, allOnV }, right, y }: Chart): readonly Mark[] {
  return [
    ...(idleV === null ? [] : [idleMark(right, y(idleV))]),
    ...(allOnV === null ? [] : [allOnMark(right, y(allOnV))]),
  ];
}
