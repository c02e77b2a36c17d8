import type { BearingFactors } from '#calc';
import { BEARING_GREASE, FOUR_CORE_160, TWO_CORE_160, TWO_CORE_80 } from './brackwater-catalogue.ts';
import type { SeedLane } from './seed-rows.ts';

/** Grain dust is abrasive, the galleries sweat; take-ups and light frames shake. Values of the common factor table. */
const DUSTY = { contamination: 0.4, moisture: 0.4, vibration: 0.6 };
const DUSTY_SHAKING = { contamination: 0.4, moisture: 0.4, vibration: 0.3 };
const OPEN_SHAKING = { contamination: 0.2, moisture: 0.4, vibration: 0.3 };

const SIDES = ['drive side', 'non-drive side'] as const;
type Pulley = 'Head pulley' | 'Tail pulley' | 'Snub pulley' | 'Take-up pulley';
const PULLEYS: readonly Pulley[] = ['Head pulley', 'Tail pulley', 'Snub pulley', 'Take-up pulley'];

/** Bore, outside diameter and width, mm. */
type Size = readonly [number, number, number];
const SIZES: Readonly<Record<Pulley, Size>> = {
  'Head pulley': [100, 180, 46], 'Tail pulley': [90, 160, 40], 'Snub pulley': [80, 140, 33], 'Take-up pulley': [80, 140, 26],
};

interface Conveyor {
  readonly prefix: string;
  readonly number: number;
  readonly speeds: Readonly<Record<Pulley, number>>;
  readonly hours: number;
  readonly firstM: number;
  readonly stepM: number;
  readonly section: number;
  readonly box?: string;
  readonly fourCore: (pulley: Pulley) => boolean;
  readonly factors: (pulley: Pulley) => Partial<BearingFactors>;
}

const FAST = { 'Head pulley': 75, 'Tail pulley': 95.5, 'Snub pulley': 150, 'Take-up pulley': 120 };
const SLOW = { 'Head pulley': 60, 'Tail pulley': 76, 'Snub pulley': 119, 'Take-up pulley': 95.5 };
const takeUpsShake = (pulley: Pulley) => (pulley === 'Take-up pulley' ? DUSTY_SHAKING : DUSTY);

const CONVEYORS: readonly Conveyor[] = [
  { prefix: 'GC1', number: 1, speeds: FAST, hours: 18, firstM: 18, stepM: 6, section: 0.75, fourCore: () => false, factors: takeUpsShake },
  { prefix: 'GC2', number: 2, speeds: FAST, hours: 18, firstM: 62.5, stepM: 7.5, section: 1.5, box: '+JB1', fourCore: () => true, factors: takeUpsShake },
  {
    prefix: 'GC3', number: 3, speeds: SLOW, hours: 16.5, firstM: 104, stepM: 10, section: 1.5, box: '+JB2',
    fourCore: (pulley) => pulley === 'Head pulley' || pulley === 'Snub pulley', factors: () => DUSTY_SHAKING,
  },
];

/** Where no dose has been chosen yet. */
const UNDECIDED = new Set(['GC3-L05', 'GC3-L06']);

/** What only some points have: a remark, and the channels that are mapped so far. */
const REMARKS: Readonly<Record<string, string>> = {
  'GC1-L01': 'Guard has a 24" hatch, open before priming',
  'GC1-L07': 'Take-up travels 1.2 m, leave slack in the cable',
  'GC2-L03': 'Dusty, wash-down weekly',
  'GC3-L05': 'Dose to be chosen; see bearing sheet, page 2',
  'GC4-L05': 'Longest run of circuit C1',
  'GC4-L06': 'Longest run of circuit C1',
};

/** The gallery conveyors: cabinet +K1, circuit C1. */
export function galleryLanes(): SeedLane[] {
  return [...CONVEYORS.flatMap((conveyor) => PULLEYS.flatMap((pulley, p) => SIDES.map((side, s) => conveyorLane(conveyor, pulley, side, 2 * p + s)))), ...shuttleLanes()];
}

function conveyorLane(conveyor: Conveyor, pulley: Pulley, side: string, i: number): SeedLane {
  const { prefix, number, speeds, hours, firstM, stepM, section, box, factors } = conveyor;
  const tag = tagOf(prefix, i);
  const fourCore = conveyor.fourCore(pulley);
  return {
    tag,
    point: {
      ...bearing(SIZES[pulley], speeds[pulley], hours), description: `${pulley}, bearing ${side}`, function: `=T1.GL${number}`, location: `+G${number}`,
      product: productOf(i), machine: `Gallery conveyor ${number}`, remarks: REMARKS[tag] ?? null, factors: factors(pulley),
    },
    dispenser: {
      type: fourCore ? FOUR_CORE_160 : TWO_CORE_160, wiring: fourCore ? 'four-core' : 'two-core', cartridgeUl: 160_000,
      doseUl: UNDECIDED.has(tag) ? null : 300, controller: 'PLC1', circuit: 'C1', ...(fourCore && { box }),
      cableTag: `-W1${number}${twoDigits(i)}`, cableLengthM: firstM + stepM * i, crossSectionMm2: section,
    },
    ...(prefix === 'GC1' && { output: ['DO1', i] }),
    ...(prefix === 'GC2' && { output: ['DO1', 8 + i], status: ['DI1', i] }),
  };
}

const SHUTTLE: readonly (readonly [string, Size, number])[] = [
  ['Head pulley', [80, 140, 26], 76], ['Tail pulley', [60, 110, 22], 95.5], ['Bend pulley', [60, 110, 22], 121],
];

function shuttleLanes(): SeedLane[] {
  return SHUTTLE.flatMap(([pulley, size, rpm], p) =>
    SIDES.map((side, s): SeedLane => {
      const i = 2 * p + s;
      const tag = tagOf('GC4', i);
      return {
        tag,
        point: {
          ...bearing(size, rpm, 12), description: `${pulley}, bearing ${side}`, function: '=T1.GL4', location: '+G4', product: productOf(i),
          machine: 'Shuttle conveyor 4', remarks: REMARKS[tag] ?? null, factors: OPEN_SHAKING,
        },
        dispenser: {
          type: TWO_CORE_80, wiring: 'two-core', cartridgeUl: 80_000, doseUl: 200, controller: 'PLC1', circuit: 'C1',
          cableTag: `-W14${twoDigits(i)}`, cableLengthM: 190 + 11 * i, crossSectionMm2: 0.75,
        },
        output: ['DO2', i],
      };
    }),
  );
}

function bearing([boreMm, outsideMm, widthMm]: Size, speedRpm: number, hoursPerDay: number): SeedLane['point'] {
  return { demandWay: 'bearing', boreMm, outsideMm, widthMm, speedRpm, hoursPerDay, grease: BEARING_GREASE, zone: '22' };
}

const twoDigits = (i: number) => String(i + 1).padStart(2, '0');
const tagOf = (prefix: string, i: number) => `${prefix}-L${twoDigits(i)}`;
const productOf = (i: number) => `-GP${twoDigits(i)}`;
