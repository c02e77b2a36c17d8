import { formatMetres, formatSection, THIN_SPACE } from '#calc';
import { circle, group, type Mark, path, rect, round, text } from '../drawing/mark';
import { run } from './lane-parts';
import { moreLanes, nameRoom, stateOf } from './loop-cabinet-shapes';
import type { Conductor, Layout } from './loop-geometry';
import type { LoopBox, LoopView } from './loop-view';

/** Trunk, junction boxes and own cable, from the cabinet's terminals to the dispenser. */
export function fieldShapes(loop: LoopView, layout: Layout): readonly Mark[] {
  const { boxes, half, conductors, terminal, dispenser } = layout;
  const stops = [terminal + 3 - half, ...boxes, dispenser + half];
  return [
    ...conductors.flatMap((c) => stops.slice(1).map((to, i) => run(i === 0 ? terminal + 4 + nameRoom(c) : stops[i] + half, to - half, c.y, stateOf(loop, c), { ticks: i === boxes.length ? undefined : [] }))),
    ...loop.boxes.flatMap((box, i) => [...junction(loop, layout, i), ...neighbours(box, layout, i)]),
    ...loop.boxes.flatMap((box, i) => trunkLabel(loop, layout, box, i)),
    ...ownCableLabel(loop, layout),
  ];
}

/** A box: a terminal on both sides of each conductor. */
function junction(loop: LoopView, { boxes, half, conductors }: Layout, i: number): readonly Mark[] {
  const x = boxes[i];
  const [top, bottom] = [conductors[0].y - 14, conductors.at(-1)!.y + 14];
  const through = (c: Conductor): Mark => group(`st-${stateOf(loop, c)}`,
    path('seg fine', `M${round(x - half)} ${c.y}H${round(x + half)}`), circle('term', x - half, c.y, 3.5), circle('term', x + half, c.y, 3.5));
  return [
    group(`st-${loop.state}`, rect('node', x - half, top, 2 * half, bottom - top)), ...conductors.map(through),
    text('mono', x, bottom + 15, loop.boxes[i].location, 'middle'),
  ];
}

/** Who else hangs on this box: other lanes, and the trunk's way on to boxes that this lane does not pass. */
function neighbours(box: LoopBox, { boxes, conductors }: Layout, i: number): readonly Mark[] {
  const [x, top, foot] = [boxes[i], conductors[0].y - 14, conductors.at(-1)!.y + 14];
  const onTo = box.onTo.length > 2 ? `${box.onTo[0]} and ${box.onTo.length - 1} more` : box.onTo.join(', ');
  return [
    ...(box.others > 0 ? [text('dim', x, foot + 30, moreLanes(box.others), 'middle')] : []),
    ...(box.onTo.length > 0 ? [group('branch', path('seg fine', `M${x} ${top}V${top - 9}`), path('head', `M${x} ${top - 15}l3.5 7h-7z`)), text('mono dim', x, top - 20, `to ${onTo}`, 'middle')] : []),
  ];
}

/** Each trunk's name, length and sections, as much as there is room for; the rest stands in the list of stations. */
function trunkLabel(loop: LoopView, { boxes, half, conductors, trunk }: Layout, box: LoopBox, i: number): readonly Mark[] {
  const from = i === 0 ? trunk + 8 : boxes[i - 1] + half;
  const to = boxes[i] - half;
  const room = to - from;
  const section = `2${THIN_SPACE}×${THIN_SPACE}${formatSection(box.powerMm2)}`;
  const pair = [box.cableTag, ...(room > 80 ? [formatMetres(box.lengthM)] : []), ...(room > 132 ? [section] : [])].join(' ');
  const [power, signal] = loop.wiring === 'four-core' ? [conductors[0], conductors[2]] : [conductors[1], conductors[0]];
  const cores = loop.wiring === 'two-core' ? 'own core' : 'cores';
  return [
    text('cb', (from + to) / 2, power.y - 9, pair, 'middle'),
    ...(room > 50 ? [text('cb', (from + to) / 2, signal.y - 9, `${room > 105 ? `${cores} ` : ''}${formatSection(box.signalMm2)}`, 'middle')] : []),
  ];
}

/** Length over its first conductor, cores and section over the last but one. */
function ownCableLabel(loop: LoopView, { boxes, half, conductors, trunk, dispenser }: Layout): readonly Mark[] {
  const middle = ((boxes.length > 0 ? boxes.at(-1)! + half : trunk) + dispenser) / 2;
  const signal = conductors[Math.min(2, conductors.length - 1)];
  return [
    text('cb', middle, conductors[0].y - 9, formatMetres(loop.cable.lengthM), 'middle'),
    ...(loop.cable.sectionMm2 === null ? [] : [text('cb', middle, signal.y - 9, `${conductors.length}${THIN_SPACE}×${THIN_SPACE}${formatSection(loop.cable.sectionMm2)}`, 'middle')]),
  ];
}
