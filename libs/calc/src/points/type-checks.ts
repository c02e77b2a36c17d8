import { formatDays, formatPercent, formatVolume } from '../format.ts';
import type { Noticed } from './finding.ts';
import { PLAN_CODES } from './plan-codes.ts';
import type { PlanCheckContext } from './point-context.ts';

/** What is set against what the dispenser type can do. */
export function typeChecks({ dispenser, type }: PlanCheckContext, noticed: Noticed[]): void {
  if (!dispenser || !type) return;
  if (dispenser.cartridgeUl !== null && !type.cartridgesUl.includes(dispenser.cartridgeUl)) {
    const fitting = type.cartridgesUl.map((ul) => formatVolume(ul)).join(', ');
    noticed.push({
      code: PLAN_CODES.cartridgeMisfit,
      severity: 'error',
      title: `Cartridge ${formatVolume(dispenser.cartridgeUl)} does not fit; the type takes ${fitting}`,
      source: 'type data',
      remedy: 'Choose a cartridge that fits, or another type.',
      compared: [{ name: 'cartridge', value: dispenser.cartridgeUl, limit: nearest(type.cartridgesUl, dispenser.cartridgeUl), unit: 'µL' }],
    });
  }
  if (dispenser.wiring !== null && dispenser.wiring !== type.wiring) {
    noticed.push({
      code: PLAN_CODES.wiringContradicts,
      severity: 'error',
      title: `Wiring is ${dispenser.wiring}, the type is ${type.wiring}`,
      detail: `Cores, terminals and voltages are computed as ${dispenser.wiring}, currents as the type states them.`,
      source: 'type data',
      remedy: `Set the wiring to ${type.wiring}, or choose a ${dispenser.wiring} type.`,
    });
  }
}

/** Life of the cartridge and over-greasing against the project's policies, for pulses and timed discharge alike. */
export function lifeChecks({ project, plan, timed }: PlanCheckContext, noticed: Noticed[]): void {
  const result = plan ?? timed;
  if (!result) return;
  const pulsed = plan !== null;
  stayCheck(result.lifeDays, project.maxCartridgeDays, pulsed, noticed);
  worthwhileCheck(result.lifeDays, project.minCartridgeDays, pulsed, noticed);
  overGreasingCheck(result.overGreasingPercent, project.maxOverGreasingPercent, pulsed, noticed);
}

/** Compared in whole days: a cartridge of twelve months (365.25 d) keeps a limit of 365 d. */
function stayCheck(lifeDays: number, maxDays: number, pulsed: boolean, noticed: Noticed[]): void {
  const days = Math.floor(lifeDays);
  if (days <= maxDays) return;
  noticed.push({
    code: PLAN_CODES.lifeTooLong,
    severity: 'warning',
    title: `Cartridge stays ${formatDays(days)}, at most ${formatDays(maxDays)}`,
    detail: 'Grease ages and bleeds oil in the cartridge.',
    source: 'policy (common practice: twelve months)',
    remedy: pulsed ? 'Choose a smaller cartridge; see the alternatives.' : 'Choose a shorter period.',
    compared: [{ name: 'life', value: days, limit: maxDays, unit: 'd' }],
  });
}

function worthwhileCheck(lifeDays: number, minDays: number, pulsed: boolean, noticed: Noticed[]): void {
  if (lifeDays >= minDays) return;
  noticed.push({
    code: PLAN_CODES.lifeTooShort,
    severity: 'warning',
    title: `Cartridge lasts ${formatDays(lifeDays)}, at least ${formatDays(minDays)} is worthwhile`,
    detail: 'Each change is a walk and a cartridge.',
    source: 'policy',
    remedy: pulsed ? 'Choose a larger cartridge, or a second dispenser at the point.' : 'Choose a longer period or a larger cartridge.',
    compared: [{ name: 'life', value: lifeDays, limit: minDays, unit: 'd' }],
  });
}

function overGreasingCheck(percent: number | null, maxPercent: number, pulsed: boolean, noticed: Noticed[]): void {
  if (percent === null || percent <= maxPercent) return;
  noticed.push({
    code: PLAN_CODES.overGreasing,
    severity: 'warning',
    title: `${formatPercent(percent, 'up')} more grease than the demand, at most ${formatPercent(maxPercent)}`,
    detail: pulsed ? 'The interval is rounded down, to whole slots where there is a schedule.' : 'The cartridge empties on its own clock, whatever the demand.',
    source: 'policy',
    remedy: pulsed
      ? 'Choose a larger dose, whose interval holds more slots, or shorter slots.'
      : 'Choose a longer period or a smaller cartridge, or let the controller pulse it.',
    compared: [{ name: 'over-greasing', value: percent, limit: maxPercent, unit: '%' }],
  });
}

/** The member of the list that is nearest to the value; the value itself when the list is empty. */
function nearest(values: readonly number[], value: number): number {
  return values.reduce((best, each) => (Math.abs(each - value) < Math.abs(best - value) ? each : best), values[0] ?? value);
}
