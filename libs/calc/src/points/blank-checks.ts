import type { Dispenser, DispenserType } from '../design.ts';
import { formatNumber } from '../format.ts';
import type { Noticed } from './finding.ts';
import { PLAN_CODES } from './plan-codes.ts';
import type { PlanCheckContext } from './point-context.ts';

/** n·dm above which amount and interval become critical, mm/min (article "Optimizing Lubrication Practices"). */
const FAST_MM_PER_MIN = 150_000;

/** What is not decided yet, each with its consequence; and a bearing that asks for care. */
export function blankChecks(ctx: PlanCheckContext, noticed: Noticed[]): void {
  demandChecks(ctx, noticed);
  if (ctx.dispenser) dispenserBlanks(ctx.dispenser, ctx.type, noticed);
  else noticed.push(blank(PLAN_CODES.noDispenser, 'No dispenser at the point', 'The point gets no grease from this design, and no lane.', 'Add a dispenser to the point.'));
}

function demandChecks({ point, figures, dispenser }: PlanCheckContext, noticed: Noticed[]): void {
  if (figures.refusal !== null) {
    noticed.push(blank(PLAN_CODES.demandUnknown, 'Demand is not known', 'Without it there is no interval, no life and no change date.', figures.refusal));
  }
  if (dispenser && point.hoursPerDay === null) {
    noticed.push(blank(PLAN_CODES.hoursBlank, 'Hours per day are blank', 'Without them there is no plan: life in days and change date cannot be told.', 'Enter the hours that the machine runs on a running day.'));
  }
  fastBearing(point, noticed);
}

function dispenserBlanks(dispenser: Dispenser, type: DispenserType | null, noticed: Noticed[]): void {
  if (dispenser.typeId === null) {
    noticed.push(blank(PLAN_CODES.typeBlank, 'Dispenser type is blank', 'Currents, voltages, doses and run times of the lane are unknown and count nowhere.', 'Choose the dispenser type.'));
  }
  if (dispenser.wiring === null) {
    const until = type ? `Until it is chosen the wiring of the type counts: ${type.wiring}.` : 'Cores, terminals and the load on the output cannot be told.';
    noticed.push(blank(PLAN_CODES.wiringBlank, 'Wiring is blank', until, 'Choose two-core or four-core.'));
  }
  if (dispenser.cartridgeUl === null) {
    noticed.push(blank(PLAN_CODES.cartridgeBlank, 'Cartridge size is blank', 'Pulses per cartridge, life and change date are unknown.', 'Choose a cartridge, or take one of the alternatives.'));
  }
  if (dispenser.method === 'pulse' && dispenser.doseUl === null) {
    noticed.push(blank(PLAN_CODES.doseBlank, 'Dose is blank', 'Interval, run time and life are unknown.', 'Choose a dose, or take one of the alternatives.'));
  }
  if (dispenser.method === 'timed' && dispenser.periodMonths === null) {
    noticed.push(blank(PLAN_CODES.periodBlank, 'Period of the timed discharge is blank', 'Discharge and change date are unknown.', 'Choose the months in which the cartridge empties.'));
  }
}

function fastBearing({ demandWay, boreMm, outsideMm, speedRpm }: PlanCheckContext['point'], noticed: Noticed[]): void {
  if (demandWay !== 'bearing' || boreMm === null || outsideMm === null || speedRpm === null) return;
  const speedFactor = (speedRpm * (boreMm + outsideMm)) / 2;
  if (speedFactor <= FAST_MM_PER_MIN) return;
  noticed.push({
    code: PLAN_CODES.fastBearing,
    severity: 'note',
    title: `Speed factor ${formatNumber(speedFactor, 0)} mm/min, amount and interval need care above ${formatNumber(FAST_MM_PER_MIN)}`,
    detail: 'Speed factor n·dm: speed × mean of bore and outside diameter. Too much grease heats a fast bearing.',
    source: 'common practice (article on lubrication practice)',
    remedy: 'Compare demand and grease with the bearing maker’s data; prefer a small dose.',
    compared: [{ name: 'speed factor', value: speedFactor, limit: FAST_MM_PER_MIN, unit: 'mm/min' }],
  });
}

function blank(code: string, title: string, detail: string, remedy: string): Noticed {
  return { code, severity: 'warning', title, detail, source: 'policy', remedy };
}
