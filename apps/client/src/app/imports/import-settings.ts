import type { ImportPreview, ImportSettings, Problem, ReadingSettings } from '#contract';

const MAX_BYTES = 25_000_000;

type UnknownValue = ImportPreview['unknownValues'][number];

/** A text that the project does not know, and what was chosen for it; undefined: nothing yet. */
export type ValueChoice = Omit<UnknownValue, 'value'> & { readonly value: string | null | undefined };

/** Why a file need not be sent at all; the server would refuse it in the middle, which looks like a broken network. */
export const refusalOf = (file: File): Problem | null => (file.size <= MAX_BYTES ? null : {
  type: 'too-large', title: 'The file is too large', status: 413,
  detail: `It has ${(Math.ceil(file.size / 100_000) / 10).toFixed(1)} MB, and a tag list may have 25 MB. Save only the sheets, rows and columns that are needed, or split the list.`,
});

/** How the file is to be read, and nothing else: the columns are then suggested anew. */
export function readingOf({ encoding, delimiter, decimal, headerRow, sheets }: ImportSettings): ReadingSettings {
  return { ...(encoding && { encoding }), ...(delimiter && { delimiter }), ...(decimal && { decimal }), ...(headerRow && { headerRow }), ...(sheets && { sheets }) };
}

/** Column letter → field, as the preview has it. */
export const mappingOf = (preview: ImportPreview | null): Readonly<Record<string, string>> =>
  Object.fromEntries((preview?.columns ?? []).flatMap((c) => (c.field === null ? [] : [[c.column, c.field]])));

/** The mapping with the column given to this field, or left out; a field belongs to one column. */
export function withColumn(mapping: Readonly<Record<string, string>>, column: string, field: string | null): Record<string, string> {
  const others = Object.entries(mapping).filter(([c, f]) => c !== column && f !== field);
  return Object.fromEntries(field === null ? others : [...others, [column, field]]);
}

/** The choices with this one for a text. */
export function withValue(choices: NonNullable<ImportSettings['valueMapping']>, field: string, text: string, value: string | null): NonNullable<ImportSettings['valueMapping']> {
  return { ...choices, [field]: { ...choices[field], [text]: value } };
}

/** The texts met before and those of this preview, each once. */
export function metWith(before: readonly UnknownValue[], preview: ImportPreview): readonly UnknownValue[] {
  const known = new Set(before.map(keyOf));
  return [...before, ...preview.unknownValues.filter((each) => !known.has(keyOf(each)))];
}

/** Texts that still have no value, and those that were given one here, so that the choice can be changed. */
export function choicesOf(met: readonly UnknownValue[], preview: ImportPreview | null, { valueMapping = {} }: ImportSettings): readonly ValueChoice[] {
  const open = new Set((preview?.unknownValues ?? []).map(keyOf));
  return met
    .map((each) => ({ ...each, value: chosenFor(each, valueMapping) }))
    .filter((each) => open.has(keyOf(each)) || each.value !== undefined);
}

function chosenFor({ field, text, remembered, value }: UnknownValue, choices: NonNullable<ImportSettings['valueMapping']>): string | null | undefined {
  const here = choices[field]?.[text];
  return here === undefined && remembered ? value : here;
}

const keyOf = ({ field, text }: Pick<UnknownValue, 'field' | 'text'>): string => JSON.stringify([field, text]);
