/**
 * How figures are written, everywhere: a thin space before the unit, thousands grouped by commas, a
 * decimal point, a true minus, an en dash for nothing. A computed figure that is compared with a limit
 * rounds toward that limit, so that rounding never makes it look better than it is. No `Intl`: the same
 * text on every machine.
 */

/** Stands for a figure that is not there. */
export const NOTHING = '–';
/** Between figure and unit. */
export const THIN_SPACE = '\u2009';

export type Rounding = 'nearest' | 'down' | 'up';
type Maybe = number | null | undefined;

/**
 * A number without unit; `decimals` left out: as many as it has.
 *
 * @returns the en dash for null, undefined and what is not finite
 */
export function formatNumber(value: Maybe, decimals?: number, rounding: Rounding = 'nearest'): string {
  if (!isFigure(value)) return NOTHING;
  const text = decimals === undefined ? plain(value) : rounded(value, decimals, rounding);
  const negative = text.startsWith('-') && Number(text) !== 0;
  const [whole, fraction] = text.replace('-', '').split('.');
  return (negative ? '−' : '') + grouped(whole) + (fraction === undefined ? '' : `.${fraction}`);
}

/** Figure and unit, a thin space between. */
export function withUnit(figure: string, unit: string): string {
  return figure === NOTHING ? NOTHING : figure + THIN_SPACE + unit;
}

/** The text of a figure taken apart again, for a unit drawn quietly; the unit is empty where there is none. */
export function figureParts(text: string): { readonly figure: string; readonly unit: string } {
  const at = text.lastIndexOf(THIN_SPACE);
  // "3 h 20" is one figure: what follows its last thin space is no unit.
  return at < 0 || /^\d/.test(text.slice(at + 1)) ? { figure: text, unit: '' } : { figure: text.slice(0, at), unit: text.slice(at + 1) };
}

/** Whole number, `1,250`; a count that came out between is rounded down. */
export function formatCount(value: Maybe): string {
  return formatNumber(value, 0, 'down');
}

/** µL shown in cm³ to 0.1. */
export function formatVolume(ul: Maybe): string {
  return withUnit(volumeFigure(ul), 'cm³');
}

/** µL in cm³ to 0.1 without the unit, for a column whose head carries it. */
export function volumeFigure(ul: Maybe): string {
  return formatNumber(isFigure(ul) ? ul / 1000 : null, 1);
}

/** Units in which a demand can be shown. */
export type DemandUnit = '1000h' | '100h' | 'running-day' | 'week';

/** The unit's text, `cm³/1,000 h`. */
export const DEMAND_UNITS: Readonly<Record<DemandUnit, string>> = {
  '1000h': 'cm³/1,000\u00a0h',
  '100h': 'cm³/100\u00a0h',
  'running-day': 'cm³/running day',
  week: 'cm³/week',
};

/**
 * A demand's figure in the unit asked for, without the unit: cm³ to 0.1 per 1,000 h; the shorter spans
 * take one or two decimals more, or nothing would be left to read.
 *
 * @param ulPer1000h µL per 1,000 operating hours
 * @param hoursPerDay null: then per running day and per week cannot be told
 */
export function demandFigure(ulPer1000h: Maybe, per: DemandUnit, hoursPerDay: Maybe, daysPerWeek: number): string {
  if (!isFigure(ulPer1000h)) return NOTHING;
  const cm3Per1000h = ulPer1000h / 1000;
  if (per === '1000h') return formatNumber(cm3Per1000h, 1);
  if (per === '100h') return formatNumber(cm3Per1000h / 10, 2);
  if (!isFigure(hoursPerDay)) return NOTHING;
  const hours = per === 'week' ? hoursPerDay * daysPerWeek : hoursPerDay;
  return formatNumber((cm3Per1000h * hours) / 1000, per === 'week' ? 2 : 3);
}

/** A demand or discharge per 1,000 operating hours, `46.0 cm³/1,000 h`. */
export function formatDemand(ulPer1000h: Maybe): string {
  return withUnit(demandFigure(ulPer1000h, '1000h', null, 7), DEMAND_UNITS['1000h']);
}

/** An interval, `3 h 20`, `4 h 00`, `55 min`, `40 s`, `0.8 s`: rounded down, as the interval itself is. */
export function formatInterval(ms: Maybe): string {
  if (!isFigure(ms)) return NOTHING;
  if (ms < 10_000) return withUnit(formatNumber(ms / 1000, ms % 1000 === 0 ? 0 : 1, 'down'), 's');
  if (ms < 60_000) return withUnit(formatNumber(ms / 1000, 0, 'down'), 's');
  const minutes = Math.floor(ms / 60_000);
  if (minutes < 60) return withUnit(String(minutes), 'min');
  return `${grouped(String(Math.floor(minutes / 60)))}${THIN_SPACE}h${THIN_SPACE}${String(minutes % 60).padStart(2, '0')}`;
}

/** A span to the millisecond, `4 h 20 min 52.173 s`, for explanations. */
export function formatDuration(ms: Maybe): string {
  if (!isFigure(ms)) return NOTHING;
  const whole = Math.floor(ms + 1e-9);
  const hours = Math.floor(whole / 3_600_000);
  const minutes = Math.floor(whole / 60_000) % 60;
  const seconds = withUnit(formatNumber((whole % 60_000) / 1000), 's');
  if (whole < 60_000) return seconds;
  return [...(hours > 0 ? [withUnit(formatCount(hours), 'h')] : []), withUnit(String(minutes), 'min'), seconds].join(' ');
}

/** Whole hours of a span in ms, rounded down. */
export function formatHours(ms: Maybe): string {
  return withUnit(formatNumber(isFigure(ms) ? ms / 3_600_000 : null, 0, 'down'), 'h');
}

/** Whole days; a life is rounded down. */
export function formatDays(days: Maybe, rounding: Rounding = 'down'): string {
  return withUnit(formatNumber(days, 0, rounding), 'd');
}

/** Percent to 0.1. */
export function formatPercent(percent: Maybe, rounding: Rounding = 'nearest'): string {
  return withUnit(formatNumber(percent, 1, rounding), '%');
}

/** Metres, at most one decimal. */
export function formatMetres(metres: Maybe): string {
  return withUnit(formatNumber(isFigure(metres) ? Number(rounded(metres, 1, 'nearest')) : null), 'm');
}

/** Cross-section as it is named, `0.75 mm²`. */
export function formatSection(mm2: Maybe): string {
  return withUnit(formatNumber(mm2), 'mm²');
}

/** A voltage that has no limit to be compared with, or a reading: to 0.1. */
export function formatVolts(volts: Maybe, rounding: Rounding = 'nearest'): string {
  return withUnit(formatNumber(volts, 1, rounding), 'V');
}

/** A computed voltage compared with a minimum: down to 0.1. */
export function voltsAgainstMinimum(volts: Maybe): string {
  return formatVolts(volts, 'down');
}

/** A computed voltage compared with a maximum: up to 0.1. */
export function voltsAgainstMaximum(volts: Maybe): string {
  return formatVolts(volts, 'up');
}

/** A current: A to 0.01 from 0.1 A, below it mA (to 0.1 under 10 mA). */
export function formatAmps(amps: Maybe, rounding: Rounding = 'nearest'): string {
  if (!isFigure(amps)) return NOTHING;
  const milli = Math.abs(amps) * 1000;
  const milliText = rounded(amps * 1000, milli < 10 && milli !== 0 ? 1 : 0, rounding);
  return Math.abs(Number(milliText)) < 100
    ? withUnit(formatNumber(Number(milliText)), 'mA')
    : withUnit(formatNumber(amps, 2, rounding), 'A');
}

/** A computed current compared with a maximum, such as a rating: rounded up. */
export function ampsAgainstMaximum(amps: Maybe): string {
  return formatAmps(amps, 'up');
}

/** A computed current compared with a minimum, such as a trip current: rounded down. */
export function ampsAgainstMinimum(amps: Maybe): string {
  return formatAmps(amps, 'down');
}

function isFigure(value: Maybe): value is number {
  return typeof value === 'number' && Number.isFinite(value);
}

/** A value this close to a step counts as on it, so that 24.1 written in binary stays 24.1. */
const STEP_TOLERANCE = 1e-9;

function rounded(value: number, decimals: number, rounding: Rounding): string {
  const scaled = value * 10 ** decimals;
  const near = Math.sign(scaled) * Math.round(Math.abs(scaled) + STEP_TOLERANCE);
  const onStep = Math.abs(scaled - near) <= STEP_TOLERANCE * Math.max(1, Math.abs(scaled));
  const steps = onStep || rounding === 'nearest' ? near : rounding === 'down' ? Math.floor(scaled) : Math.ceil(scaled);
  return (steps / 10 ** decimals).toFixed(decimals);
}

/** Without an exponent, which `String` gives to very small numbers. */
function plain(value: number): string {
  const text = String(value);
  return text.includes('e') ? value.toFixed(12).replace(/\.?0+$/, '') : text;
}

function grouped(digits: string): string {
  return digits.length < 4 ? digits : digits.replace(/\B(?=(\d{3})+$)/g, ',');
}
