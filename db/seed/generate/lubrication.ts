import type { BearingFactors, DispenserType, Point, Wiring } from '#calc';
import type { Size } from './bearings.ts';
import type { Random } from './random.ts';

/** How a point's demand is met: what the point states, the type, and what is set in it. */
export interface Lubrication {
  readonly point: Partial<Point>;
  readonly type: DispenserType;
  readonly cartridgeUl: number;
  readonly doseUl: number;
}

/** What the choice rests on. */
export interface Surroundings {
  readonly hoursPerDay: number;
  readonly densityGPerCm3: number;
  /** Types of the lane's wiring that suit its zone. */
  readonly types: readonly DispenserType[];
}

/** Life that a generated plan stays within, running days: clear of the policies' 30 and 365, also with a day off each week. */
const LIFE_DAYS = [50, 310] as const;
/** Life that a stated demand is made for, running days. */
const STATED_LIFE_DAYS = [80, 300] as const;
const DOSES_UL = [200, 300, 400, 500, 600] as const;

const NONE: BearingFactors = { temperature: 1, contamination: 1, moisture: 1, vibration: 1, position: 1, design: 1 };
/** Surroundings by the common factor table, from clean to harsh. */
const ENVIRONMENTS: readonly BearingFactors[] = [
  NONE,
  { ...NONE, contamination: 0.7 },
  { ...NONE, contamination: 0.7, moisture: 0.7 },
  { ...NONE, contamination: 0.4, vibration: 0.6 },
  { ...NONE, contamination: 0.4, moisture: 0.4, vibration: 0.6 },
  { ...NONE, contamination: 0.4, moisture: 0.4, vibration: 0.3 },
  { ...NONE, contamination: 0.2, moisture: 0.4, vibration: 0.3 },
  { ...NONE, contamination: 0.2, moisture: 0.1, vibration: 0.3 },
];

/**
 * A bearing's demand by the common formula, with factors, type and cartridge that together last one to
 * twelve months.
 *
 * @returns null where no surroundings make it so: the bearing turns too slowly
 */
export function bearingLubrication(size: Size, speedRpm: number, around: Surroundings, random: Random): Lubrication | null {
  const fitting = ENVIRONMENTS.flatMap((factors) => {
    const ulPerDay = (bearingUlPer1000h(size, speedRpm, factors, around.densityGPerCm3) * around.hoursPerDay) / 1000;
    return cartridges(around.types).filter(({ usableUl }) => isBetween(usableUl / ulPerDay, LIFE_DAYS)).map((cartridge) => ({ factors, cartridge }));
  });
  if (fitting.length === 0) return null;
  const { factors, cartridge } = random.pick(fitting);
  const [boreMm, outsideMm, widthMm] = size;
  return { point: { demandWay: 'bearing', boreMm, outsideMm, widthMm, speedRpm, factors }, ...set(cartridge, random) };
}

/** A stated demand, or one from today's practice, that a cartridge meets for one to twelve months. */
export function statedLubrication(around: Surroundings, random: Random): Lubrication {
  const cartridge = random.pick(cartridges(around.types));
  const ulPerDay = cartridge.usableUl / random.whole(...STATED_LIFE_DAYS);
  const point = random.next() < 0.3 ? practice(ulPerDay, around) : stated(ulPerDay, around, random);
  return { point, ...set(cartridge, random) };
}

/** A demand that empties a cartridge in so many days, stated per 1,000 operating hours, µL. */
export const statedUlFor = (usableUl: number, days: number, hoursPerDay: number): number => Math.round((usableUl * 1000) / (days * hoursPerDay));

const GRAMS_A_STROKE = 1.2;
const EVERY_DAYS = 14;

function practice(ulPerDay: number, { densityGPerCm3 }: Surroundings): Partial<Point> {
  const grams = (ulPerDay / 1000) * densityGPerCm3 * EVERY_DAYS;
  return { demandWay: 'practice', practiceStrokes: Math.ceil(grams / GRAMS_A_STROKE), practiceGramsPerStroke: GRAMS_A_STROKE, practiceEveryDays: EVERY_DAYS };
}

function stated(ulPerDay: number, { hoursPerDay }: Surroundings, random: Random): Partial<Point> {
  const statedPer = random.pick(['1000h', '100h', 'running-day', 'week'] as const);
  const days = { '1000h': 1000 / hoursPerDay, '100h': 100 / hoursPerDay, 'running-day': 1, week: 7 }[statedPer];
  // Whole tenths of a cubic centimetre, as people state it, where that is not too coarse.
  const ul = ulPerDay * days;
  return { demandWay: 'stated', statedPer, statedUl: ul > 1000 ? Math.round(ul / 100) * 100 : Math.round(ul) };
}

interface Cartridge {
  readonly type: DispenserType;
  readonly cartridgeUl: number;
  readonly usableUl: number;
}

function cartridges(types: readonly DispenserType[]): Cartridge[] {
  return types.flatMap((type) => type.cartridgesUl.map((cartridgeUl) => ({ type, cartridgeUl, usableUl: cartridgeUl - type.residualUl })));
}

function set({ type, cartridgeUl }: Cartridge, random: Random): Omit<Lubrication, 'point'> {
  return { type, cartridgeUl, doseUl: random.pick(DOSES_UL) };
}

/** As the calculation has it, in plain floating point: near enough for a choice. */
function bearingUlPer1000h([bore, outside, width]: Size, rpm: number, factors: BearingFactors, density: number): number {
  const { temperature, contamination, moisture, vibration, position, design } = factors;
  const k = temperature * contamination * moisture * vibration * position * design;
  const hours = k * (14e6 / (rpm * Math.sqrt(bore)) - 4 * bore);
  return hours > 0 ? (1e6 * 0.005 * outside * width) / (density * hours) : Infinity;
}

const isBetween = (value: number, [least, most]: readonly [number, number]): boolean => value >= least && value <= most;

/** Types of a wiring whose protection level suits a zone. */
export const typesFor = (types: readonly DispenserType[], wiring: Wiring, needs: 'Db' | 'Dc'): DispenserType[] =>
  types.filter((type) => type.wiring === wiring && (needs === 'Dc' || type.protectionLevels.includes('Db')));
