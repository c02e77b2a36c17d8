import type { PointFigures } from '../assessment.ts';
import { ceilOf, exact, over, ratio, times, type Rational } from './exact.ts';

/** A cubic metre an hour: beyond it an input is wrong, and counts would leave the exact whole numbers. */
const DEMAND_MAX_UL = 1_000_000_000_000n;

/** A demand, rounded up to whole µL per 1,000 operating hours: never less grease than asked for. */
export function demandFigures(ulPer1000h: Rational): PointFigures {
  const ul = ceilOf(ulPer1000h);
  return ul > DEMAND_MAX_UL
    ? refuse('Correct the inputs: the demand comes out above a cubic metre an hour, which no dispenser gives.')
    : { demandUlPer1000h: Number(ul), refusal: null };
}

/** No demand, and the instruction that would bring one. */
export function refuse(instruction: string): PointFigures {
  return { demandUlPer1000h: null, refusal: instruction };
}

/** Refuses with the names of what is blank, or null when nothing is. */
export function refuseMissing(fields: Readonly<Record<string, number | null>>, instead: string): PointFigures | null {
  const missing = Object.keys(fields).filter((name) => fields[name] === null);
  return missing.length === 0 ? null : refuse(`Give ${listed(missing)}${instead}.`);
}

/** Whether a value is a finite number above 0. */
export function isPositive(value: number): boolean {
  return value > 0 && value < Infinity;
}

/** Refuses a value that must be above 0, or null when all are. */
export function refuseNotPositive(fields: Readonly<Record<string, number>>): PointFigures | null {
  const name = Object.keys(fields).find((key) => !isPositive(fields[key]));
  return name === undefined ? null : refuse(`Correct ${name}: ${fields[name]} is not above 0.`);
}

/** Refuses a running time that no week has, or null when it can be. */
export function refuseRunningTime(hoursPerDay: number, daysPerWeek: number): PointFigures | null {
  if (!(hoursPerDay > 0 && hoursPerDay <= 24)) {
    return refuse(`Correct hours per day: ${hoursPerDay} is not above 0 and at most 24.`);
  }
  if (!(daysPerWeek > 0 && daysPerWeek <= 7)) {
    return refuse(`Correct days per week: ${daysPerWeek} is not above 0 and at most 7.`);
  }
  return null;
}

/** Operating hours in a number of calendar days: days × (days per week ÷ 7) × hours per day. */
export function operatingHours(calendarDays: Rational, hoursPerDay: number, daysPerWeek: number): Rational {
  return over(times(calendarDays, exact(daysPerWeek), exact(hoursPerDay)), ratio(7n, 1n));
}

/** A month, 730.5 h standing = 30.4375 calendar days. */
export const MONTH_DAYS: Rational = { num: 304375n, den: 10000n };

function listed(names: readonly string[]): string {
  return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}
