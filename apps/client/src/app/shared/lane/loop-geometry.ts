import type { LoopView } from './loop-view';

/** Width as drawn in the visual language, and the least at which its words still fit, px. */
export const WIDTH = 1212;
export const LEAST_WIDTH = 1000;
/** Height of the voltage profile, px. */
export const PROFILE_HEIGHT = 156;

export type ConductorName = 'supply' | 'zero' | 'pulse' | 'status';

export interface Conductor {
  readonly name: ConductorName;
  readonly label: string;
  /** Height, px. */
  readonly y: number;
}

const FOUR_CORE: readonly Conductor[] = [
  { name: 'supply', label: '+24 V', y: 104.5 }, { name: 'zero', label: '0 V', y: 131.5 },
  { name: 'pulse', label: 'pulse', y: 168.5 }, { name: 'status', label: 'status', y: 193.5 },
];
/** The output feeds the motor: one core out, 0 V back. */
const TWO_CORE: readonly Conductor[] = [{ name: 'supply', label: 'output', y: 144.5 }, { name: 'zero', label: '0 V', y: 193.5 }];

export interface Zone {
  readonly name: 'plc' | 'terminals' | 'trunk' | 'cable' | 'dispenser' | 'point';
  readonly x: number;
  readonly title: string;
  readonly designation: string;
}

/** Where everything stands, for one lane in one width; px. */
export interface Layout {
  readonly width: number;
  readonly conductors: readonly Conductor[];
  /** Terminals in the cabinet, where the trunk begins, the dispenser's and the point's left edge. */
  readonly terminal: number;
  readonly trunk: number;
  readonly dispenser: number;
  readonly point: number;
  /** Centres of the boxes, and half a box's width. */
  readonly boxes: readonly number[];
  readonly half: number;
  /** Middle of the conductors: grease flows on this height. */
  readonly middle: number;
  /** Where the profile begins, and how high the whole is. */
  readonly profileTop: number;
  readonly height: number;
  readonly zones: readonly Zone[];
}

const [TERMINAL, TRUNK, FIRST_GAP, RIGHT_PART, OWN_CABLE] = [204, 288, 52, 354, 162];
const PROFILE_TOP = 256;

/** Everything right of the trunk keeps its place from the right edge; the trunk takes what is left. */
export function layoutOf(loop: LoopView, width: number): Layout {
  const dispenser = width - RIGHT_PART;
  const count = loop.boxes.length;
  const [first, last] = [TERMINAL + FIRST_GAP, dispenser - OWN_CABLE];
  const boxes = Array.from({ length: count }, (_, i) => Math.round(first + ((last - first) * (i + 1)) / count));
  const half = Math.min(22, 160 / Math.max(1, count) / 2 + 6);
  const point = dispenser + 212;
  const conductors = (loop.wiring === 'two-core' ? TWO_CORE : FOUR_CORE).filter((c) => c.name !== 'pulse' || loop.method === 'pulse');
  return {
    width, conductors, dispenser, point, boxes, half, terminal: TERMINAL, trunk: TRUNK, middle: 149, profileTop: PROFILE_TOP,
    height: loop.profile === null ? PROFILE_TOP : PROFILE_TOP + PROFILE_HEIGHT + 4,
    zones: zonesOf(loop, { cable: count > 0 ? last + half + 8 : TRUNK, dispenser: dispenser - 16, point: dispenser + 172 }),
  };
}

function zonesOf(loop: LoopView, x: { readonly cable: number; readonly dispenser: number; readonly point: number }): readonly Zone[] {
  const trunks = loop.boxes.map((b) => b.cableTag);
  return [
    { name: 'plc', x: 0, title: 'PLC and supply', designation: loop.supply.cabinet },
    { name: 'terminals', x: 178, title: 'Terminals', designation: loop.supply.cabinet },
    ...(trunks.length > 0 ? [{ name: 'trunk' as const, x: TRUNK, title: 'Trunk', designation: trunks.length < 3 ? trunks.join(', ') : `${trunks[0]} to ${trunks.at(-1)}` }] : []),
    { name: 'cable', x: x.cable, title: 'Own cable', designation: loop.cable.tag ?? 'no tag' },
    { name: 'dispenser', x: x.dispenser, title: 'Dispenser', designation: loop.dispenser.function },
    { name: 'point', x: x.point, title: 'Point', designation: loop.point.tag },
  ];
}

/** The stations that the voltage profile hangs from; where they are not the boxes, evenly spread. */
export function stationXs(layout: Layout, stations: number): readonly number[] {
  if (stations === layout.boxes.length + 2) return [layout.terminal, ...layout.boxes, layout.dispenser];
  return Array.from({ length: stations }, (_, i) => layout.terminal + ((layout.dispenser - layout.terminal) * i) / Math.max(1, stations - 1));
}
