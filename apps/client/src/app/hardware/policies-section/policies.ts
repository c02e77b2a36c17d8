import type { Project } from '#calc';
import { numberOrNone, numberWithin, type Read, timeZoneOf } from '../../shared/fields/typed';

/** A policy of the project: how it is typed, what it does, and where it comes from. */
export interface Policy {
  readonly field: keyof Project;
  readonly label: string;
  readonly unit: string;
  readonly does: string;
  readonly source: string;
  /** As it is typed. */
  readonly text: (project: Project) => string;
  readonly read: Read<string | number | null>;
  readonly blank?: string;
}

type NumberField = { [K in keyof Project]: Project[K] extends number ? K : never }[keyof Project];

const figure = (field: NumberField, label: string, unit: string, read: Read<number>, does: string, source: string): Policy =>
  ({ field, label, unit, does, source, read, text: (project) => String(project[field]) });

const temperature = numberWithin({ min: -40, max: 120 });

/** In the order in which they are shown; the bounds are those of the API. */
export const POLICIES: readonly { readonly title: string; readonly policies: readonly Policy[] }[] = [
  {
    title: 'Cables and protection',
    policies: [
      figure('voltageTempC', 'Conductors, for voltages', '°C', temperature, 'How warm conductors are taken to be when voltages are computed.', 'Policy; resistances by IEC 60228'),
      figure('tripTempC', 'Conductors, for short circuits', '°C', temperature, 'How warm they are taken to be for the smallest short-circuit current: the hotter, the smaller.', 'Policy; resistances by IEC 60228'),
      figure('breakerDcFactor', 'Breaker on direct current', '×', numberWithin({ min: 1, max: 3 }), 'Raises the current at which a breaker certainly trips at once, because its band is stated for alternating current.', 'Policy; band of IEC 60898-1'),
      figure('supplyMarginPercent', 'Margin on supplies', '%', numberWithin({ min: 0, max: 400 }), 'Put on top of the worst load of a supply before it is compared with the rating.', 'Policy'),
    ],
  },
  {
    title: 'Channels and contacts',
    policies: [
      figure('sparePercent', 'Spare channels', '%', numberWithin({ min: 0, max: 100 }), 'Part of the channels of each kind in a cabinet that stays free.', 'Policy'),
      figure('relayLifeYears', 'Life of relay contacts', 'years', numberWithin({ min: 0, max: 100, above: true }), 'How long a contact must last at the pulses a year that its dispenser gets.', 'Policy'),
    ],
  },
  {
    title: 'Cartridges and doses',
    policies: [
      figure('maxCartridgeDays', 'Longest cartridge life', 'd', numberWithin({ min: 1, max: 3650, whole: true }), 'A cartridge that would last longer is a finding: grease ages.', 'Policy'),
      figure('minCartridgeDays', 'Shortest cartridge life', 'd', numberWithin({ min: 0, max: 3650, whole: true }), 'A cartridge that would last shorter is a finding: too many changes.', 'Policy'),
      figure('maxOverGreasingPercent', 'Over-greasing', '%', numberWithin({ min: 0, max: 100 }), 'What rounding the interval down may cost against the exact interval.', 'Policy'),
    ],
  },
  {
    title: 'Time',
    policies: [
      {
        field: 'slotMs', label: 'Slot', unit: 's', does: 'Intervals are rounded down to whole slots. Blank: to whole milliseconds.', source: 'Policy', blank: 'none',
        text: ({ slotMs }) => (slotMs === null ? '' : String(slotMs / 1000)), read: slotOf,
      },
      { field: 'timeZone', label: 'Time zone', unit: '', does: 'Dates and times of the project are those of this place.', source: 'Names of the IANA time zone database', text: ({ timeZone }) => timeZone, read: timeZoneOf },
    ],
  },
];

/** A slot in seconds, answered in whole ms. */
function slotOf(text: string): ReturnType<Read<number | null>> {
  const seconds = numberOrNone({ min: 0.001, max: 86_400 })(text);
  return seconds.ok && seconds.value !== null ? { ok: true, value: Math.round(seconds.value * 1000) } : seconds;
}
