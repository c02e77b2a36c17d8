import { nameKey } from './design-index.ts';
import type { FieldKey } from './fields.ts';
import { headingText, type Headings } from './heading-block.ts';
import { trimmed } from './grid.ts';
import type { FileReading } from './read-file.ts';

/** What an organisation's earlier imports said, by normalised heading and normalised text. */
export interface Remembered {
  /** The field that a column with this heading was given; null: it was left out. */
  readonly headings: ReadonlyMap<string, FieldKey | null>;
  /** Field → text of the file → value of the project; null leaves it blank. */
  readonly texts: ReadonlyMap<string, ReadonlyMap<string, string | null>>;
}

export const NOTHING_REMEMBERED: Remembered = { headings: new Map(), texts: new Map() };

const LONGEST_KEY = 200;

/**
 * The heading as it is remembered: small letters without accents and signs, the group included, at most
 * 200 characters. Single letters keep their case, since d and D are two things.
 */
export function headingKey(heading: string): string {
  const words = heading
    .replace(/ß/g, 'ss')
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word !== '')
    .map((word) => (word.length === 1 ? word : word.toLowerCase()));
  return (words.length > 0 ? words.join(' ') : trimmed(heading)).slice(0, LONGEST_KEY);
}

/** The text of a choice column as it is remembered, at most 200 characters. */
export function textKey(text: string): string {
  return nameKey(text).slice(0, LONGEST_KEY);
}

/** Keys of all columns of a table; the second column of one heading is "… 2". Empty: no heading, nothing to remember. */
export function columnKeys(headings: Headings): string[] {
  const times = new Map<string, number>();
  return headings.leaves.map((_, i) => {
    const key = headingKey(headingText(headings, i));
    const time = (times.get(key) ?? 0) + 1;
    times.set(key, time);
    return key === '' || time === 1 ? key : `${key.slice(0, LONGEST_KEY - 4)} ${time}`;
  });
}

/** What an import that was carried out adds to it; each heading and each text once. */
export interface ToRemember {
  readonly headings: readonly { readonly heading: string; readonly field: FieldKey | null }[];
  readonly texts: readonly { readonly field: string; readonly text: string; readonly value: string | null }[];
}

/** The field of every headed column, null where it was left out, and what texts were said to stand for. */
export function toRemember({ columns, settings: { mapping, valueMapping } }: FileReading): ToRemember {
  const headed = columns.filter(({ key }) => key !== '');
  return {
    headings: [...new Map(headed.map(({ column, key }) => [key, mapping[column] ?? null]))].map(([heading, field]) => ({ heading, field })),
    texts: Object.entries(valueMapping ?? {}).flatMap(([field, values]) => {
      const byKey = new Map(Object.entries(values).map(([text, value]) => [textKey(text), value]));
      return [...byKey].map(([text, value]) => ({ field, text, value }));
    }),
  };
}
