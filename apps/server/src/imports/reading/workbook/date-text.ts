/** Which parts of a point in time a number format shows. */
export interface ShownTime {
  readonly date: boolean;
  readonly time: boolean;
  readonly seconds: boolean;
  /** The unit that a duration is counted in throughout, as in `[h]:mm`; null for a time of day. */
  readonly elapsed: 'h' | 'm' | 's' | null;
}

const DAY_SECONDS = 86_400;
/** Serial 25569 is 1970-01-01 where serial 1 is 1900-01-01. */
const UNIX_EPOCH = 25_569;
const DAYS_TO_1904 = 1_462;
/** 9999-12-31, the last date that spreadsheets have. */
const LAST_DAY = 2_958_465;
/** The 29th of February 1900, which spreadsheets have and the calendar has not. */
const PHANTOM_DAY = 60;

/**
 * A serial number of a spreadsheet as a date, a time or both, in ISO 8601 with a blank between the two.
 *
 * @param serial days since the epoch of the workbook, the fraction being the time of day
 * @param from1904 whether serial 0 is 1904-01-01; else serial 1 is 1900-01-01
 * @returns null for a number that is no such date
 */
export function dateText(serial: number, shown: ShownTime, from1904: boolean): string | null {
  if (serial < 0 || serial > LAST_DAY + 1) return null;
  if (shown.elapsed) return durationText(serial, shown.elapsed, shown.seconds);
  const seconds = Math.round(serial * DAY_SECONDS);
  const time = clockText(seconds % DAY_SECONDS, shown.seconds);
  if (!shown.date) return time;
  // a time of day that came to a whole day by rounding belongs to the next, a bare date stays where it is
  const day = (shown.time ? Math.floor(seconds / DAY_SECONDS) : Math.floor(serial)) + (from1904 ? DAYS_TO_1904 : 0);
  const date = dayText(day);
  return date === null || !shown.time ? date : `${date} ${time}`;
}

function dayText(day: number): string | null {
  if (day < 1 || day > LAST_DAY) return null;
  if (day === PHANTOM_DAY) return '1900-02-29';
  const calendarDay = day < PHANTOM_DAY ? day + 1 : day;
  return new Date((calendarDay - UNIX_EPOCH) * DAY_SECONDS * 1000).toISOString().slice(0, 10);
}

function clockText(secondsOfDay: number, withSeconds: boolean): string {
  const parts = [Math.floor(secondsOfDay / 3600), Math.floor(secondsOfDay / 60) % 60, secondsOfDay % 60];
  return parts
    .slice(0, withSeconds ? 3 : 2)
    .map(twoDigits)
    .join(':');
}

function durationText(days: number, unit: 'h' | 'm' | 's', withSeconds: boolean): string {
  const seconds = Math.round(days * DAY_SECONDS);
  if (unit === 's') return String(seconds);
  const minutes = Math.floor(seconds / 60);
  const whole = unit === 'h' ? `${Math.floor(minutes / 60)}:${twoDigits(minutes % 60)}` : String(minutes);
  return withSeconds ? `${whole}:${twoDigits(seconds % 60)}` : whole;
}

function twoDigits(n: number): string {
  return String(n).padStart(2, '0');
}

/**
 * A date that a cell holds as ISO 8601 text (cell type `d`), written the same way: a blank for the T, and
 * neither midnight nor seconds that are none. Anything else stays as it is.
 */
export function isoCellText(text: string): string {
  const match = /^(\d{4}-\d\d-\d\d)?T?(?:(\d\d:\d\d)(:\d\d)?(?:\.\d+)?)?Z?$/.exec(text);
  if (!match) return text;
  const [, date, minutes, seconds = ''] = match;
  const time = minutes === undefined ? '' : minutes + (seconds === ':00' ? '' : seconds);
  if (date === undefined) return time === '' ? text : time;
  return time === '' || time === '00:00' ? date : `${date} ${time}`;
}
