import type { ImportPreview, ImportRow } from '#contract';

/** A preview with nothing in it but what the test says. */
export const buildPreview = (part: Partial<ImportPreview> = {}): ImportPreview => ({
  id: 'import', fileName: 'list.csv', settings: { encoding: 'utf-8', delimiter: ',', decimal: '.', headerRow: 1 }, sheets: [], ownExport: false, formulasWithoutValue: 0,
  columns: [], fields: [], unknownValues: [], refusal: null, counts: buildCounts(), ...part,
});

export const buildCounts = (part: Partial<ImportPreview['counts']> = {}): ImportPreview['counts'] => ({
  rows: 0, toCreate: 0, toUpdate: 0, same: 0, heldBack: 0, skipped: 0, withProblems: 0, problems: 0, notes: 0, pointsAfter: 0, ...part,
});

export const buildRow = (part: Partial<ImportRow> = {}): ImportRow => ({
  index: 0, sheet: null, row: 2, line: 2, rows: [2], action: 'create', why: null, values: {}, changes: [], problems: [], notes: [], ...part,
});

/** A column of the file; `field` null: left out. */
export const buildColumn = (column: string, field: string | null, reason = 'by name'): ImportPreview['columns'][number] =>
  ({ column, heading: `Heading ${column}`, samples: [], field, reason });
