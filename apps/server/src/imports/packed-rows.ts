import type { ImportRow, RowFilter } from '#contract';
import type { PlannedRow } from './reading/index.ts';

/** The rows of a preview as JSON texts behind each other: tens of thousands of them in little memory, sent as they are. */
export interface PackedRows {
  readonly json: Uint8Array;
  /** Where each row's text ends in `json`. */
  readonly ends: Uint32Array;
  /** The filters that each row passes, one bit a filter. */
  readonly kinds: Uint8Array;
}

const BITS: Readonly<Record<RowFilter, number>> = { all: 0, create: 1, update: 2, same: 4, hold: 8, skip: 16, problems: 32 };

export function packRows(rows: readonly PlannedRow[]): PackedRows {
  const ends = new Uint32Array(rows.length);
  const kinds = new Uint8Array(rows.length);
  const texts: Buffer[] = [];
  let end = 0;
  rows.forEach((row, index) => {
    const text = Buffer.from(JSON.stringify(rowOf(row, index)));
    texts.push(text);
    end += text.length;
    ends[index] = end;
    kinds[index] = BITS[row.action] | (row.problems.length > 0 ? BITS.problems : 0);
  });
  return { json: Buffer.concat(texts), ends, kinds };
}

/** One page of the rows that pass a filter, as the JSON text of an ImportRowPage. */
export function pageText({ json, ends, kinds }: PackedRows, show: RowFilter, offset: number, limit: number): string {
  const bit = BITS[show];
  const texts: string[] = [];
  const bytes = Buffer.from(json.buffer, json.byteOffset, json.byteLength);
  let total = 0;
  for (let i = 0; i < kinds.length; i++) {
    if ((kinds[i] & bit) !== bit) continue;
    if (total >= offset && texts.length < limit) texts.push(bytes.toString('utf8', i === 0 ? 0 : ends[i - 1], ends[i]));
    total += 1;
  }
  return `{"total":${total},"rows":[${texts.join(',')}]}`;
}

/** Blank values are left out. */
function rowOf({ sheet, row, line, rows, action, why, values, changes, problems, notes }: PlannedRow, index: number): ImportRow {
  const said = Object.fromEntries(Object.entries(values).filter(([, value]) => value !== null)) as ImportRow['values'];
  return {
    index, sheet, row, line, rows: [...rows], action, why, values: said, changes: [...changes], problems: [...problems], notes: [...notes],
  };
}
