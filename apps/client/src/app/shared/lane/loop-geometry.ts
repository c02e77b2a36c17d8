import type { LoopView } from './loop-view';

/** Stations of the wide diagram from left to right, px. */
export const X = { cabinetEnd: 178, terminal: 204, trunk: 282, cable: 750, dispenser: 874, point: 1094, end: 1212 } as const;
export const WIDTH = 1212;
/** Where the profile begins, and its height. */
export const PROFILE = { top: 214, height: 150 } as const;
const FIRST_GAP = 52;
const LAST_BOX = 724;
const HALF_BOX = 22;

export type ConductorName = 'supply' | 'zero' | 'pulse' | 'status';

export interface Conductor {
  readonly name: ConductorName;
  readonly label: string;
  /** Height, px. */
  readonly y: number;
}

const FOUR_CORE: readonly Conductor[] = [
  { name: 'supply', label: '+24 V', y: 88 }, { name: 'zero', label: '0 V', y: 113 },
  { name: 'pulse', label: 'pulse', y: 152 }, { name: 'status', label: 'status', y: 177 },
];
/** The output feeds the motor: one core out, 0 V back. */
const TWO_CORE: readonly Conductor[] = [{ name: 'supply', label: 'output', y: 132 }, { name: 'zero', label: '0 V', y: 177 }];

export const conductorsOf = (loop: LoopView): readonly Conductor[] => (loop.wiring === 'four-core' ? FOUR_CORE : TWO_CORE);

/** Centres of the boxes, the last one always at the same place. */
export function boxCentres(count: number): readonly number[] {
  const first = X.terminal + FIRST_GAP;
  return Array.from({ length: count }, (_, i) => Math.round(first + ((LAST_BOX - first) * (i + 1)) / count));
}

/** Half a box's width; narrower where many stand in a row. */
export const halfBox = (count: number): number => Math.min(HALF_BOX, 160 / Math.max(1, count) / 2 + 6);

/** The stations that the voltage profile hangs from; where they are not the boxes, evenly spread. */
export function stationXs(loop: LoopView, stations: number): readonly number[] {
  const centres = boxCentres(loop.boxes.length);
  if (stations === centres.length + 2) return [X.terminal, ...centres, X.dispenser];
  return Array.from({ length: stations }, (_, i) => X.terminal + ((X.dispenser - X.terminal) * i) / Math.max(1, stations - 1));
}

export interface Zone {
  readonly x: number;
  readonly title: string;
  readonly designation: string;
}

export function zonesOf(loop: LoopView): readonly Zone[] {
  const trunks = loop.boxes.map((b) => b.cableTag);
  const trunk = trunks.length < 3 ? trunks.join(', ') : `${trunks[0]} to ${trunks.at(-1)}`;
  return [
    { x: 0, title: 'PLC and supply', designation: loop.supply.cabinet },
    { x: X.cabinetEnd, title: 'Terminals', designation: loop.supply.cabinet },
    ...(trunks.length > 0 ? [{ x: X.trunk, title: 'Trunk', designation: trunk }] : []),
    { x: trunks.length > 0 ? X.cable : X.trunk, title: 'Own cable', designation: loop.cable.tag ?? '' },
    { x: 858, title: 'Dispenser', designation: loop.dispenser.name },
    { x: 1054, title: 'Point', designation: loop.point.tag },
  ];
}
