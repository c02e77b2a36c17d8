import type { DispenserType } from '../design.ts';
import { formatDuration, formatVolume } from '../format.ts';
import type { Noticed } from './finding.ts';
import { PLAN_CODES } from './plan-codes.ts';
import type { PlanCheckContext } from './point-context.ts';
import { exactIntervalMs, pulsesPerCartridge, runTimeMs } from './pulse-plan.ts';

/** Dose and interval of a dispenser that the controller pulses. */
export function pulseChecks(ctx: PlanCheckContext, noticed: Noticed[]): void {
  const { dispenser, type } = ctx;
  if (!dispenser || !type || dispenser.method !== 'pulse' || dispenser.doseUl === null) return;
  doseChecks(dispenser.doseUl, type, noticed);
  wholeDose(dispenser.cartridgeUl, dispenser.doseUl, type, noticed);
  intervalCheck(ctx, dispenser.doseUl, type, noticed);
}

function doseChecks(doseUl: number, type: DispenserType, noticed: Noticed[]): void {
  if (doseUl < type.doseMinUl || doseUl > type.doseMaxUl) {
    const range = `${formatVolume(type.doseMinUl)} to ${formatVolume(type.doseMaxUl)}`;
    noticed.push({
      code: PLAN_CODES.doseRange,
      severity: 'error',
      title: `Dose ${formatVolume(doseUl)} is outside ${range}`,
      source: 'type data',
      remedy: `Choose a dose from ${range}, or another type.`,
      compared: [{ name: 'dose', value: doseUl, limit: doseUl < type.doseMinUl ? type.doseMinUl : type.doseMaxUl, unit: 'µL' }],
    });
    return;
  }
  if (doseUl % type.doseStepUl === 0) return;
  noticed.push({
    code: PLAN_CODES.doseStep,
    severity: 'error',
    title: `Dose ${cm3(doseUl)} is not a whole number of steps of ${cm3(type.doseStepUl)}`,
    detail: 'The device cannot be set to it; figures count the run time of the next step up.',
    source: 'type data',
    remedy: `Choose ${cm3(doseUl - (doseUl % type.doseStepUl))} or ${cm3(doseUl - (doseUl % type.doseStepUl) + type.doseStepUl)}.`,
    compared: [{ name: 'dose', value: doseUl, limit: type.doseStepUl, unit: 'µL' }],
  });
}

function wholeDose(cartridgeUl: number | null, doseUl: number, type: DispenserType, noticed: Noticed[]): void {
  if (cartridgeUl === null || !(doseUl > 0) || pulsesPerCartridge(cartridgeUl, type.residualUl, doseUl) > 0) return;
  const usable = Math.max(0, cartridgeUl - type.residualUl);
  noticed.push({
    code: PLAN_CODES.noWholeDose,
    severity: 'error',
    title: `Cartridge gives ${formatVolume(usable)}, a dose takes ${formatVolume(doseUl)}`,
    source: 'type data',
    remedy: 'Choose a larger cartridge or a smaller dose.',
    compared: [{ name: 'usable volume', value: usable, limit: doseUl, unit: 'µL' }],
  });
}

/** Wait bound + run + recovery must fit between two pulses, and a schedule needs at least one slot. */
function intervalCheck(ctx: PlanCheckContext, doseUl: number, type: DispenserType, noticed: Noticed[]): void {
  const demand = ctx.figures.demandUlPer1000h;
  if (demand === null || !(doseUl > 0)) return;
  const exactMs = exactIntervalMs(demand, doseUl);
  const slotMs = Math.max(1, ctx.project.slotMs ?? 1);
  const intervalMs = Math.floor(Math.floor(exactMs) / slotMs) * slotMs;
  const runMs = runTimeMs(doseUl, type);
  const waitMs = ctx.waitBoundMs ?? 0;
  const neededMs = Math.max(waitMs + runMs + type.recoveryMs, slotMs);
  if (intervalMs >= neededMs) return;
  const given = intervalMs > 0 ? intervalMs : exactMs;
  const parts = `${waitMs > 0 ? `wait ${formatDuration(waitMs)}, ` : ''}run ${formatDuration(runMs)}, recovery ${formatDuration(type.recoveryMs)}`;
  noticed.push({
    code: PLAN_CODES.intervalTooShort,
    severity: 'error',
    title: `Interval ${formatDuration(given)}, at least ${formatDuration(neededMs)} needed`,
    detail: `Between two pulses must fit: ${parts}${ctx.project.slotMs === null ? '' : `; a slot is ${formatDuration(slotMs)}`}.`,
    source: 'type data',
    remedy: intervalRemedy(ctx, doseUl, type),
    compared: [{ name: 'interval', value: given, limit: neededMs, unit: 'ms' }],
  });
}

function intervalRemedy({ waitBoundMs }: PlanCheckContext, doseUl: number, type: DispenserType): string {
  if (doseUl < type.doseMaxUl) return `Choose a larger dose, up to ${formatVolume(type.doseMaxUl)}; see the alternatives.`;
  return waitBoundMs ? 'Allow more dispensers at once, or choose a type with a larger dose.' : 'Choose a type with a larger dose, or a second dispenser at the point.';
}

/** Volumes to the microlitre, since a dose between two steps may differ by less than 0.1 cm³. */
function cm3(ul: number): string {
  return `${ul / 1000}\u2009cm³`;
}
