import { formatAmps, formatDemand, formatNumber, NOTHING, THIN_SPACE } from '#calc';
import { circle, group, type Mark, path, rect, text, unit, type Words } from '../drawing/mark';
import { run, seal } from './lane-parts';
import type { Layout } from './loop-geometry';
import type { LoopDispenser, LoopView } from './loop-view';
import { wrapped } from './wrapped';

/** Dispenser with its pins and cartridge, the grease's way, the point, and the place of the signature. */
export function deviceShapes(loop: LoopView, layout: Layout): readonly Mark[] {
  return [...dispenser(loop, layout), ...cartridge(loop, layout), ...point(loop, layout)];
}

const [BODY, CARTRIDGE] = [122, 131];

function dispenser(loop: LoopView, { dispenser: x, conductors }: Layout): readonly Mark[] {
  const device = loop.dispenser;
  const middle = x + 68;
  return [
    group(`st-${loop.state}`, rect('node', x, 88, BODY, 122, 8)),
    ...conductors.map((c) => text('mono dim', x + 7, c.y + 4, device.pins[c.name] ?? NOTHING)),
    text('mono', middle, 105, device.product, 'middle'),
    ...driven(loop, middle), text('', middle, 175, running(device), 'middle'),
    ...(device.idleA === null || device.idleA === 0 ? [] : [text('dim', middle, 191, `${formatAmps(device.idleA)} standing`, 'middle')]),
  ];
}

/** The pulse with its dose, the clock with its period, or what is missing. */
function driven(loop: LoopView, x: number): readonly Mark[] {
  const { doseUl, periodMonths } = loop.dispenser;
  if (loop.method === 'timed') {
    return [circle('clock big', x, 125, 11), path('clock big', `M${x} 118V125h5`), text('fig', x, 156, periodMonths === null ? 'no period' : `${periodMonths} months`, 'middle')];
  }
  if (doseUl === null) return [text('off', x, 138, 'no dose yet', 'middle')];
  return [path('pulse big', `M${x - 22} 134h13v-18h19v18h13`), text('fig', x, 156, volume(doseUl), 'middle')];
}

/** As it is printed on a cartridge: whole where it is whole. */
const volume = (ul: number | null): readonly (string | Words)[] => (ul === null ? [NOTHING] : [formatNumber(ul / 1000), unit('cm³')]);

const running = ({ runA, runMs }: LoopDispenser): string =>
  [formatAmps(runA), ...(runMs === null ? [] : [`for ${formatNumber(runMs / 1000, runMs % 1000 === 0 ? 0 : 1)}${THIN_SPACE}s`])].join(' ');

/** Full of grease once a size is chosen. */
function cartridge(loop: LoopView, { dispenser, middle }: Layout): readonly Mark[] {
  const x = dispenser + CARTRIDGE;
  const size = loop.dispenser.cartridgeUl;
  return [
    group(`st-${loop.state}`, rect(size === null ? 'node open' : 'node', x, 88, 28, 122, 2), path('seg thin', `M${dispenser + BODY} ${middle}H${x}`)),
    ...(size === null ? [] : [rect('fill-grease', x + 3.5, 98, 21, 108)]),
    text(size === null ? 'off' : '', x + 14, 225, size === null ? 'no size' : volume(size), 'middle'),
  ];
}

/** The bearing, what it needs, and the place where a signature will stand. */
function point(loop: LoopView, { dispenser, point: left, middle, width }: Layout): readonly Mark[] {
  const x = left + 24;
  const state = loop.planned ? loop.state : 'unmapped';
  const balls = Array.from({ length: 8 }, (_, k) => circle('ball', x + 17 * Math.cos((k * Math.PI) / 4), middle + 17 * Math.sin((k * Math.PI) / 4), 3.4));
  const centre = (dispenser + 172 + width) / 2;
  return [
    run(dispenser + CARTRIDGE + 28, left, middle, state, { cls: 'grease', ticks: [] }),
    group(`st-${state} grease`, circle('node', x, middle, 24), circle('node', x, middle, 10), ...(loop.planned ? balls : [])),
    text('', centre, 196, formatDemand(loop.point.demandUlPer1000h), 'middle'),
    ...wrapped(loop.point.description ?? '', 26).map((line, i) => text('dim', centre, 212 + 14 * i, line, 'middle')),
    seal(width - 42, middle, 11, loop.state),
  ];
}
