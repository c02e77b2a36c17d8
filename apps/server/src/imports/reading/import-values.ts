import type { DraftValues, ImportValues } from './plan.ts';

/** Values of which nothing is said yet. */
export function blankValues(): DraftValues {
  return {
    tag: null,
    description: null,
    function: null,
    location: null,
    product: null,
    machine: null,
    boreMm: null,
    outsideMm: null,
    widthMm: null,
    speedRpm: null,
    hoursPerDay: null,
    daysPerWeek: null,
    demandUlPer100h: null,
    demandUlPer1000h: null,
    grease: null,
    dispenserType: null,
    cartridgeUl: null,
    doseUl: null,
    wiring: null,
    controller: null,
    outputModule: null,
    outputChannel: null,
    outputAddress: null,
    statusModule: null,
    statusChannel: null,
    statusAddress: null,
    junctionBox: null,
    cableTag: null,
    cableLengthM: null,
    crossSectionMm2: null,
    circuit: null,
    remarks: null,
  };
}

/** The same for all rows that say nothing, since a list may have a hundred thousand. */
export const BLANK_VALUES: ImportValues = Object.freeze(blankValues());

/** Names of the values, in the order in which lists show them. */
export const VALUE_KEYS = Object.keys(BLANK_VALUES) as readonly (keyof ImportValues)[];

/** Puts back the old value wherever the new one is only another spelling of it. */
export function adoptAlike(values: DraftValues, old: ImportValues): void {
  for (const key of VALUE_KEYS) {
    const [from, to] = [old[key], values[key]];
    if (from !== null && to !== null && from !== to && alike(from, to)) (values as Record<string, string | number | null>)[key] = from;
  }
}

/**
 * Line ends inside a text and blanks around it are no change: spreadsheet programs rewrite both. Nor is
 * anything behind the fifteen digits that they keep of a number.
 */
function alike(from: string | number, to: string | number): boolean {
  if (typeof from === 'string' && typeof to === 'string') return plain(from) === plain(to);
  return typeof from === 'number' && typeof to === 'number' && from.toPrecision(15) === to.toPrecision(15);
}

function plain(text: string): string {
  return text.replace(/\r\n?/g, '\n').trim();
}
