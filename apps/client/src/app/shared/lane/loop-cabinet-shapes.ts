import { ampsAgainstMaximum, formatNumber, NOTHING } from '#calc';
import { circle, group, type Mark, path, rect, text, unit } from '../drawing/mark';
import { run } from './lane-parts';
import type { LaneState } from './lane-view';
import type { Conductor, Layout } from './loop-geometry';
import type { LoopChannel, LoopView } from './loop-view';

/** Where boxes of the cabinet stand, px: right edges of supply, protection and channels. */
export const CABINET = { left: 12, supplyRight: 66, protectionLeft: 92, protectionRight: 144, bond: 168 } as const;
const { left, supplyRight, protectionLeft, protectionRight, bond } = CABINET;

/** Supply, protection and PLC channels with the cabinet's terminals. */
export function cabinetShapes(loop: LoopView, layout: Layout): readonly Mark[] {
  const foot = layout.conductors.at(-1)!.y + 21;
  return [
    ...(loop.wiring === 'four-core' ? fourCore(loop, layout) : twoCore(loop, layout)),
    ...earth(loop, layout),
    ...layout.conductors.flatMap((c) => [group(`st-${stateOf(loop, c)}`, circle('term', layout.terminal, c.y, 3.5)), ...named(layout.terminal + 11, c)]),
    ...(loop.othersAtCabinet > 0 ? [text('dim', layout.terminal + 11, foot, moreLanes(loop.othersAtCabinet))] : []),
  ];
}

/** How far a conductor is: the status signal may still be open while the rest is mapped. */
export const stateOf = (loop: LoopView, conductor: Conductor): LaneState => (conductor.name === 'status' ? loop.statusState : loop.state);

/** Others that begin at the same terminals. */
export const moreLanes = (count: number): string => `+${count} ${count === 1 ? 'lane' : 'lanes'}`;

function fourCore(loop: LoopView, layout: Layout): readonly Mark[] {
  const [plus, zero, ...signals] = layout.conductors;
  const end = layout.terminal - 3;
  return [
    run(supplyRight, protectionLeft, plus.y, loop.state, { ticks: [] }), run(protectionRight, end, plus.y, loop.state, { ticks: [] }),
    run(supplyRight, end, zero.y, loop.state, { ticks: [] }),
    ...supplyBox(loop, plus.y - 14, zero.y - plus.y + 28), ...protectionBox(loop, plus.y),
    ...signals.flatMap((signal) => (signal.name === 'pulse' ? channelOut(loop, signal, end) : channelIn(loop, signal, end))),
    ...(loop.method === 'timed' ? [text('dim', left, 172.5, 'no output: it runs on its own clock')] : []),
  ];
}

/** The output stage takes the motor's current from the protected feeder and switches it. */
function twoCore(loop: LoopView, layout: Layout): readonly Mark[] {
  const [out, zero] = layout.conductors;
  const feeder = 104.5;
  const end = layout.terminal - 3;
  const middle = (protectionLeft + protectionRight) / 2;
  return [
    run(supplyRight, protectionLeft, feeder, loop.state, { ticks: [] }), run(supplyRight, end, zero.y, loop.state, { ticks: [] }),
    ...supplyBox(loop, feeder - 14, zero.y - feeder + 28), ...protectionBox(loop, feeder),
    group(`st-${loop.state}`, path(`seg ${DOWN[loop.state]}`, `M${middle} ${feeder + 10}V${out.y - 10}`)),
    ...channelBox(loop.output, loop.state, { x: 74, y: out.y, width: 100, none: 'no output' }),
    run(174, end, out.y, loop.output ? loop.state : 'unmapped', { ticks: [] }),
  ];
}

const DOWN: Readonly<Record<LaneState, string>> = { unmapped: 'dotted', mapped: 'thin', wired: 'heavy', checked: 'heavy', signed: 'heavy', stale: 'heavy' };

const channelOut = (loop: LoopView, { y }: Conductor, end: number): readonly Mark[] => [
  ...channelBox(loop.output, loop.state, { x: left, y, width: 132, none: 'no output' }), run(144, end, y, loop.output ? loop.state : 'unmapped', { ticks: [] }),
];

const channelIn = (loop: LoopView, { y }: Conductor, end: number): readonly Mark[] => [
  ...channelBox(loop.status, loop.statusState, { x: left, y, width: 132, none: 'no status input' }),
  run(152, end, y, loop.statusState, { ticks: [] }), group(`st-${loop.statusState}`, path('head', `M144 ${y}l9 -4.5v9z`)),
];

/** Module, channel and direct address. */
function channelBox(of: LoopChannel | null, state: LaneState, at: { readonly x: number; readonly y: number; readonly width: number; readonly none: string }): readonly Mark[] {
  const box = group(`st-${state}`, rect(`node ${of ? '' : 'open'}`, at.x, at.y - 10, at.width, 20));
  if (of === null) return [box, text('off', at.x + at.width / 2, at.y + 4, at.none, 'middle')];
  const long = at.width > 120 && of.module.length < 6;
  return [box, text('mono dim', at.x + 7, at.y + 4, long ? `${of.module}:${of.channel}` : of.module.slice(0, 9)), text('mono', at.x + at.width - 7, at.y + 4, of.address, 'end')];
}

const supplyBox = (loop: LoopView, y: number, height: number): readonly Mark[] => [
  group(`st-${loop.state}`, rect('node', left, y, supplyRight - left, height)),
  text('mono', 39, y + height / 2 - 3, loop.supply.name ?? NOTHING, 'middle'),
  text('', 39, y + height / 2 + 13, [formatNumber(loop.supply.setV, 1), unit('V')], 'middle'),
];

/** Its rating and characteristic stand above it, in brick where its check fails; over them the worst load of the circuit. */
function protectionBox(loop: LoopView, y: number): readonly Mark[] {
  const fails = loop.findings.some((f) => f.place === 'protection' && f.severity === 'error');
  const { worstA, ratingA } = loop.supply;
  const over = worstA !== null && ratingA !== null && worstA > ratingA;
  return [
    group(`st-${loop.state}`, rect('node', protectionLeft, y - 10, protectionRight - protectionLeft, 20)),
    text('mono', 118, y + 4, loop.supply.circuit ?? NOTHING, 'middle'),
    ...(worstA === null ? [] : [text(over ? 'c-err strong' : 'dim', 118, y - 31, `${ampsAgainstMaximum(worstA)} at worst`, 'middle')]),
    text(fails ? 'c-err strong' : 'dim', 118, y - 16, loop.supply.protection ?? '', 'middle'),
  ];
}

/** PELV: 0 V is bonded to protective earth in the cabinet, once. SELV has no bond. */
function earth(loop: LoopView, layout: Layout): readonly Mark[] {
  const zero = layout.conductors.find((c) => c.name === 'zero')!;
  const foot = layout.conductors.at(-1)!.y + 27;
  if (loop.supply.extraLowVoltage === 'SELV') return [text('dim', bond - 24, foot + 4, 'SELV: no earth bond', 'end')];
  if (loop.supply.extraLowVoltage === null) return [];
  const bars = `M${bond - 8} ${foot}h16M${bond - 5} ${foot + 4}h10M${bond - 2} ${foot + 8}h4`;
  return [
    group(`st-${loop.state}`, path('seg fine', `M${bond} ${zero.y}V${foot}`), circle('head', bond, zero.y, 3), path('seg fine', bars)),
    text('dim', bond - 14, foot, 'PELV: 0 V bonded to PE', 'end'), text('dim', bond - 14, foot + 14, 'here and nowhere else', 'end'),
  ];
}

/** The conductor's name interrupts it. */
function named(x: number, conductor: Conductor): readonly Mark[] {
  return [rect('gap', x - 4, conductor.y - 7.5, nameRoom(conductor) - 4, 15), text('dim', x, conductor.y + 4, conductor.label)];
}

/** Room that a conductor's name takes after its terminal, px. */
export const nameRoom = (conductor: Conductor): number => conductor.label.length * 6.4 + 12;
