import { fieldOf, type FieldKey } from './fields.ts';
import { columnIndex } from './grid.ts';
import { ImportRefusal } from './import-refusal.ts';
import type { Mapping } from './plan.ts';
import { OWN_PARTS, type MappedColumn } from './row-reading.ts';

/**
 * The columns of a mapping from left to right.
 *
 * @param width how many columns the headings have
 * @throws {ImportRefusal} when the mapping fits no import
 */
export function mappedColumns(mapping: Mapping, width: number): MappedColumn[] {
  const columns = Object.entries(mapping).map(([letter, key]) => ({ index: columnIndex(letter), letter, field: fieldOf(key) }));
  refuseOutside(columns, width);
  refuseTwice(columns);
  refuseIncomplete(new Set(columns.map(({ field }) => field.key)));
  return columns.sort((a, b) => a.index - b.index);
}

function refuseOutside(columns: readonly MappedColumn[], width: number): void {
  const outside = columns.find(({ index }) => index < 0 || index >= width);
  if (!outside) return;
  throw new ImportRefusal(
    'column-outside',
    'There is no such column',
    `The file has no column ${outside.letter}.`,
    'Choose the columns again.',
  );
}

function refuseTwice(columns: readonly MappedColumn[]): void {
  const twice = columns.find(({ field }, i) => columns.slice(0, i).some((each) => each.field.key === field.key));
  if (!twice) return;
  throw new ImportRefusal(
    'field-twice',
    'Two columns for one thing',
    `More than one column is mapped to “${twice.field.label}”.`,
    'Leave out all but one of them.',
  );
}

function refuseIncomplete(keys: ReadonlySet<FieldKey>): void {
  if (!keys.has('tag')) {
    throw new ImportRefusal(
      'tag-unmapped',
      'No column holds the tag',
      'Points are told apart by their tag.',
      'Choose the column with the tags.',
    );
  }
  const part = OWN_PARTS.find((key) => keys.has(key));
  if (!part || keys.has('signalType')) return;
  throw new ImportRefusal(
    'signal-type-unmapped',
    'No column says which signal a row is',
    `“${fieldOf(part).label}” is that of the row's own signal, which may be an output or an input.`,
    'Choose the column with the signal type, or give the column to the output or the status input.',
  );
}
