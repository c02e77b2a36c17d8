import { formatAmps, formatDemand, formatMetres, formatNumber, formatSection, formatVolume, THIN_SPACE } from '#calc';
import { circle, group, type Mark, path, rect, round, text } from '../drawing/mark';
import { boxCentres, type Conductor, halfBox, X } from './loop-geometry';
import { run, signaturePlace } from './lane-parts';
import type { LaneState } from './lane-view';
import type { LoopView } from './loop-view';

/** Cables, junction boxes, dispenser and point. */
export function fieldShapes(loop: LoopView, conductors: readonly Conductor[]): readonly Mark[] {
  const centres = boxCentres(loop.boxes.length);
  const half = halfBox(centres.length);
  const stops = [X.terminal + 3 - half, ...centres, X.dispenser + half];
  return [
    ...conductors.flatMap((c) => stops.slice(1).map((to, i) => run(i === 0 ? X.terminal + 4 + nameRoom(c) : stops[i] + half, to - half, c.y + 0.5, stateOf(loop, c)))),
    ...centres.flatMap((x, i) => box(loop, x, half, conductors, loop.boxes[i].location)),
    ...trunkLabels(loop, centres, half, conductors),
    ...ownCableLabel(loop, centres, half, conductors),
    ...dispenser(loop, conductors), ...point(loop),
  ];
}

const nameRoom = (c: Conductor): number => c.label.length * 6.4 + 10;

const stateOf = (loop: LoopView, conductor: Conductor): LaneState => (conductor.name === 'status' && loop.status === null ? 'unmapped' : loop.state);

function box(loop: LoopView, x: number, half: number, conductors: readonly Conductor[], location: string): readonly Mark[] {
  const [top, bottom] = [conductors[0].y - 14, conductors.at(-1)!.y + 15];
  const pins = conductors.flatMap((c) => [
    path('seg fine', `M${round(x - half)} ${c.y + 0.5}H${round(x + half)}`), circle('term', x - half, c.y + 0.5, 3.5), circle('term', x + half, c.y + 0.5, 3.5),
  ]);
  return [group(`st-${loop.state}`, rect('node', x - half, top, 2 * half, bottom - top), ...pins), text('mono', x, bottom + 15, location, 'middle')];
}

/** Each trunk's name, length and sections, as much as there is room for. */
function trunkLabels(loop: LoopView, centres: readonly number[], half: number, conductors: readonly Conductor[]): readonly Mark[] {
  return loop.boxes.flatMap((b, i) => {
    const from = i === 0 ? X.trunk - 6 : centres[i - 1] + half;
    const to = centres[i] - half;
    const [x, room] = [(from + to) / 2, to - from];
    const pair = `${b.cableTag} ${formatMetres(b.lengthM)}${room > 105 ? ` 2${THIN_SPACE}×${THIN_SPACE}${formatSection(b.powerMm2)}` : ''}`;
    const cores = `${room > 105 ? 'cores ' : ''}${formatSection(b.signalMm2)}`;
    const [power, signal] = loop.wiring === 'four-core' ? [conductors[0], conductors[2]] : [conductors[1], conductors[0]];
    return [text('cb', x, labelY(power, conductors), pair, 'middle'), ...(room > 60 ? [text('cb', x, labelY(signal, conductors), cores, 'middle')] : [])];
  });
}

/** Above the boxes for the topmost conductor, between the conductors for the others. */
const labelY = (of: Conductor, conductors: readonly Conductor[]): number => of.y - (of === conductors[0] ? 20 : 10);

function ownCableLabel(loop: LoopView, centres: readonly number[], half: number, conductors: readonly Conductor[]): readonly Mark[] {
  const from = centres.length > 0 ? centres.at(-1)! + half : X.trunk;
  const size = loop.cable.sectionMm2 === null ? '' : ` ${conductors.length}${THIN_SPACE}×${THIN_SPACE}${formatSection(loop.cable.sectionMm2)}`;
  return [text('cb', (from + X.dispenser) / 2, labelY(conductors[0], conductors), `${formatMetres(loop.cable.lengthM)}${size}`, 'middle')];
}

function dispenser(loop: LoopView, conductors: readonly Conductor[]): readonly Mark[] {
  const [d, x, device] = [X.dispenser, X.dispenser + 68, loop.dispenser];
  const running = [formatAmps(device.runA), ...(device.runMs === null ? [] : [`for ${formatNumber(device.runMs / 1000, device.runMs % 1000 === 0 ? 0 : 1)}${THIN_SPACE}s`])].join(' ');
  return [
    group(`st-${loop.state}`, rect('node', d, 73, 122, 119, 8)),
    ...conductors.map((c) => text('mono dim', d + 7, c.y + 4, device.pins[c.name] ?? '')),
    path(`pulse big`, `M${d + 46} 114h13v-19h19v19h13`),
    text('fig', x, 136, formatVolume(device.doseUl), 'middle'), text('', x, 157, running, 'middle'),
    ...(device.idleA === null || device.idleA === 0 ? [] : [text('dim', x, 174, `${formatAmps(device.idleA)} standing`, 'middle')]),
    group(`st-${loop.state}`, rect('node', d + 131, 73, 28, 119, 2), rect('fill-grease', d + 134.5, 84, 21, 104), path('seg thin', `M${d + 122} 133H${d + 131}`)),
    text('', d + 145, 208, formatVolume(device.cartridgeUl), 'middle'),
  ];
}

/** The grease's way, the bearing, and the place where a signature will stand. */
function point(loop: LoopView): readonly Mark[] {
  const [x, y] = [X.point + 22, 132.5];
  const balls = Array.from({ length: 8 }, (_, k) => circle('ball', x + 17 * Math.cos((k * Math.PI) / 4), y + 17 * Math.sin((k * Math.PI) / 4), 3.4));
  return [
    run(X.dispenser + 159, X.point - 2, y, loop.state, 'grease'),
    group(`st-${loop.state} grease`, circle('node', x, y, 24), circle('node', x, y, 10), ...balls),
    text('', X.point + 30, 184, formatDemand(loop.point.demandUlPer1000h), 'middle'),
    text('dim', X.end - 8, 201, short(loop.point.description ?? ''), 'end'),
    signaturePlace(X.end - 34, y, 11),
  ];
}

const short = (words: string): string => (words.length > 26 ? `${words.slice(0, 25).trimEnd()}…` : words);
