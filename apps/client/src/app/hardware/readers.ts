import { STANDARD_SECTIONS_MM2 } from '#calc';
import type { Choice } from '../shared/fields/choice';
import { nameOf, numberOrNone, numberWithin, textOf } from '../shared/fields/typed';

/** How the fields of hardware rows are read; the bounds are those of the API. */
export const READ = {
  name: nameOf(),
  description: textOf(500),
  temperature: numberWithin({ min: -40, max: 90 }),
  baseByte: numberWithin({ min: 0, max: 65_535, whole: true }),
  setV: numberWithin({ min: 18, max: 30 }),
  ohm: numberWithin({ min: 0, max: 10 }),
  otherLoadA: numberWithin({ min: 0, max: 1000 }),
  protectionA: numberWithin({ min: 0, max: 1000, above: true }),
  limit: numberOrNone({ min: 1, max: 100_000, whole: true }),
  lengthM: numberWithin({ min: 0, max: 10_000, above: true }),
} as const;

export const PROTECTIONS: readonly Choice<'breaker-B' | 'breaker-C' | 'electronic' | 'fuse'>[] = [
  { value: 'breaker-B', label: 'Breaker, B' }, { value: 'breaker-C', label: 'Breaker, C' },
  { value: 'electronic', label: 'Electronic' }, { value: 'fuse', label: 'Fuse' },
];

export const CONDUCTOR_CLASSES: readonly Choice<2 | 5>[] = [{ value: 2, label: '2, stranded' }, { value: 5, label: '5, flexible' }];

const SECTIONS: readonly Choice<number>[] = STANDARD_SECTIONS_MM2.map((mm2) => ({ value: mm2, label: String(mm2) }));

/** The standard cross-sections, and the one that a row has where it is none of them. */
export const sectionsWith = (mm2: number): readonly Choice<number>[] =>
  STANDARD_SECTIONS_MM2.includes(mm2) ? SECTIONS : [...SECTIONS, { value: mm2, label: String(mm2) }];
