import type { PulsePlan } from '../assessment.ts';
import type { DispenserType } from '../design.ts';
import { operatingHours } from './demand-result.ts';
import { over, ratio, toNumber } from './exact.ts';
import { decimalOf, floorOfProduct, productOver } from './whole-numbers.ts';

/** Days of a year, so that twelve months of 30.4375 days make one. */
export const YEAR_DAYS = 365.25;
const HOUR_MS = 3_600_000;
/** 1,000 operating hours, ms. */
const DEMAND_SPAN_MS = 1000 * HOUR_MS;

export interface PulsePlanInput {
  /** Whole µL per 1,000 operating hours, above 0. */
  readonly demandUlPer1000h: number;
  /** Whole µL, above 0. */
  readonly doseUl: number;
  /** Nominal volume, whole µL. */
  readonly cartridgeUl: number;
  readonly hoursPerDay: number;
  readonly daysPerWeek: number;
  /** Slots to which the interval is rounded down, ms; null: no schedule. */
  readonly slotMs: number | null;
  readonly type: Pick<DispenserType, 'residualUl' | 'doseStepUl' | 'runMsPerStep' | 'triggerMs'>;
}

/**
 * Interval, pulses and life of a cartridge. The interval is rounded down to whole milliseconds, then to
 * whole slots, so the point never gets less grease than its demand; counts are whole-number arithmetic.
 * A dose between two steps takes the run time of the upper one (and is a finding).
 *
 * @returns null where no plan exists: demand or dose is not above 0, the interval is shorter than a millisecond or a slot, the
 *   cartridge holds no whole dose, or the running time is not one that a week can have
 * @throws {RangeError} when a volume is not a whole number of microlitres
 */
export function pulsePlan(input: PulsePlanInput): PulsePlan | null {
  const { demandUlPer1000h, doseUl, hoursPerDay, daysPerWeek, type } = input;
  if (!(demandUlPer1000h > 0 && doseUl > 0)) return null;
  const intervalMs = intervalOf(input);
  const pulses = pulsesPerCartridge(input.cartridgeUl, type.residualUl, doseUl);
  if (intervalMs === 0 || pulses === 0 || !isRunningTime(hoursPerDay, daysPerWeek)) return null;
  const lifeMs = pulses * intervalMs;
  const dayMs = operatingMsPerDay(hoursPerDay, daysPerWeek);
  const lifeDays = lifeMs / dayMs;
  const runMs = runTimeMs(doseUl, type);
  return {
    exactIntervalMs: exactIntervalMs(demandUlPer1000h, doseUl),
    intervalMs,
    pulsesPerCartridge: pulses,
    lifeMs,
    lifeDays,
    changesPerYear: YEAR_DAYS / lifeDays,
    pulsesPerYear: (YEAR_DAYS * dayMs) / intervalMs,
    overGreasingPercent: overGreasing(demandUlPer1000h, doseUl, intervalMs),
    runMs,
    triggerMs: type.triggerMs ?? runMs,
  };
}

/** Interval before rounding, ms of operating time: 1,000 h × dose ÷ demand. */
export function exactIntervalMs(demandUlPer1000h: number, doseUl: number): number {
  return productOver(DEMAND_SPAN_MS, whole(doseUl), whole(demandUlPer1000h));
}

/** Run time of the motor for a dose, ms: it grows with the dose, step by step. */
export function runTimeMs(doseUl: number, type: Pick<DispenserType, 'doseStepUl' | 'runMsPerStep'>): number {
  return Math.ceil(doseUl / type.doseStepUl) * type.runMsPerStep;
}

/** ⌊(nominal − residual) ÷ dose⌋, never below 0. */
export function pulsesPerCartridge(cartridgeUl: number, residualUl: number, doseUl: number): number {
  const usable = whole(cartridgeUl) - whole(residualUl);
  return usable > 0 ? Math.floor(usable / whole(doseUl)) : 0;
}

/** Operating time in a calendar day, on average, ms: hours per day × days per week ÷ 7. */
export function operatingMsPerDay(hoursPerDay: number, daysPerWeek: number): number {
  const hours = decimalOf(hoursPerDay);
  const days = decimalOf(daysPerWeek);
  const num = hours && days ? hours.num * days.num * HOUR_MS : Infinity;
  if (hours && days && num <= Number.MAX_SAFE_INTEGER) return num / (hours.den * days.den * 7);
  return toNumber(over(operatingHours(ratio(1n, 1n), hoursPerDay, daysPerWeek), ratio(1n, BigInt(HOUR_MS))));
}

/** Hours above 0 and at most 24, days above 0 and at most 7. */
export function isRunningTime(hoursPerDay: number, daysPerWeek: number): boolean {
  return hoursPerDay > 0 && hoursPerDay <= 24 && daysPerWeek > 0 && daysPerWeek <= 7;
}

function intervalOf({ demandUlPer1000h, doseUl, slotMs }: PulsePlanInput): number {
  const ms = floorOfProduct(DEMAND_SPAN_MS, whole(doseUl), whole(demandUlPer1000h));
  return slotMs === null || slotMs <= 0 ? ms : ms - (ms % whole(slotMs));
}

/** (exact − rounded) ÷ rounded, as a whole-number difference so that nothing cancels, %. */
function overGreasing(demandUlPer1000h: number, doseUl: number, intervalMs: number): number {
  const given = DEMAND_SPAN_MS * doseUl;
  const asked = intervalMs * demandUlPer1000h;
  if (given <= Number.MAX_SAFE_INTEGER) return productOver(100, given - asked, asked);
  const exactlyAsked = BigInt(intervalMs) * BigInt(demandUlPer1000h);
  return toNumber(ratio(100n * (BigInt(DEMAND_SPAN_MS) * BigInt(doseUl) - exactlyAsked), exactlyAsked));
}

function whole(value: number): number {
  if (!Number.isSafeInteger(value)) throw new RangeError(`Not a whole number: ${value}`);
  return value;
}
