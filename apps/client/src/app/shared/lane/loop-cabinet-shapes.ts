import { formatNumber } from '#calc';
import { circle, group, type Mark, path, rect, text, unit } from '../drawing/mark';
import { type Conductor, X } from './loop-geometry';
import { run } from './lane-parts';
import type { LoopView } from './loop-view';

/** Supply, protection and PLC channels with the cabinet's terminals. */
export function cabinetShapes(loop: LoopView, conductors: readonly Conductor[]): readonly Mark[] {
  const st = `st-${loop.state}`;
  return [
    ...(loop.wiring === 'four-core' ? fourCoreCabinet(loop, st) : twoCoreCabinet(loop, st)),
    ...conductors.flatMap((c) => [group(st, circle('term', X.terminal, c.y + 0.5, 3.5)), ...named(X.terminal + 11, c)]),
  ];
}

function fourCoreCabinet(loop: LoopView, st: string): readonly Mark[] {
  const open = loop.state === 'unmapped';
  return [
    run(66, 92, 88.5, loop.state), run(144, X.terminal - 3, 88.5, loop.state), run(66, X.terminal - 3, 113.5, loop.state),
    ...supplyBox(loop, st, 74, 53), ...protectionBox(loop, st),
    group(st, rect(`node ${open ? 'open' : ''}`, 12, 142, 132, 20), rect(`node ${loop.status ? '' : 'open'}`, 12, 167, 132, 20)),
    run(144, X.terminal - 3, 152.5, loop.output ? loop.state : 'unmapped'), run(152, X.terminal - 3, 177.5, loop.status ? loop.state : 'unmapped'),
    group(st, path('head', 'M144 177.5l9-4.5v9z')),
    ...channel(loop.output, 156, 'no output'), ...channel(loop.status, 181, 'no status input'),
  ];
}

function twoCoreCabinet(loop: LoopView, st: string): readonly Mark[] {
  return [
    run(66, 92, 88.5, loop.state), run(66, X.terminal - 3, 177.5, loop.state),
    ...supplyBox(loop, st, 74, 118), ...protectionBox(loop, st),
    // The output stage takes its current from the protected feeder.
    group(st, path(`seg ${loop.state === 'unmapped' ? 'dotted' : loop.state === 'mapped' ? 'thin' : 'heavy'}`, 'M118 98V122')),
    group(st, rect(`node ${loop.output ? '' : 'open'}`, 76, 122, 92, 20)),
    run(168, X.terminal - 3, 132.5, loop.output ? loop.state : 'unmapped'),
    ...(loop.output
      ? [text('mono dim', 81, 136, loop.output.module), text('mono', 163, 136, loop.output.address, 'end')]
      : [text('off', 122, 136, 'no output', 'middle')]),
  ];
}

const channel = (of: LoopView['output'], y: number, none: string): readonly Mark[] =>
  of === null ? [text('off', 78, y, none, 'middle')] : [text('mono dim', 19, y, of.module), text('mono', 137, y, of.address, 'end')];

const supplyBox = (loop: LoopView, st: string, y: number, height: number): readonly Mark[] => [
  group(st, rect('node', 12, y, 54, height)),
  text('mono', 39, y + height / 2 - 4, loop.supply.name ?? '–', 'middle'),
  text('', 39, y + height / 2 + 12, [formatNumber(loop.supply.setV, 1), unit('V')], 'middle'),
];

const protectionBox = (loop: LoopView, st: string): readonly Mark[] => [
  group(st, rect('node', 92, 78, 52, 20)),
  text('mono', 118, 92.5, loop.supply.circuit ?? '–', 'middle'),
  text(loop.supply.protectionFails ? 'c-err strong' : 'dim', 118, 72, loop.supply.protection ?? '', 'middle'),
];

/** The conductor's name interrupts it. */
function named(x: number, conductor: Conductor): readonly Mark[] {
  const width = conductor.label.length * 6.4 + 8;
  return [rect('gap', x - 4, conductor.y - 7, width, 15), text('dim', x, conductor.y + 4.3, conductor.label)];
}
