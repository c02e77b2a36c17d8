import { describe, expect, it } from 'vitest';
import type { Design } from '#calc';
import { brackwaterSetup, countingIds, tagListBytes, tagListExpectation } from '#support/brackwater-setup.ts';
import {
  changesOf,
  interpretGrid,
  readCsvFile,
  type CsvFileReading,
  type ImportPlan,
  type ImportValues,
  type ValueMapping,
} from './index.ts';
import { withChanges } from './testing/with-changes.ts';

interface Expected {
  readonly encoding: string;
  readonly separator: string;
  readonly decimalSign: string;
  readonly headerRow: number;
  readonly mapping: readonly { readonly column: string; readonly heading: string; readonly field: string }[];
  readonly valueMapping?: ValueMapping;
  readonly counts: Readonly<Record<string, number>>;
  readonly problems: readonly {
    readonly row: number;
    readonly field: string;
    readonly code: string;
    readonly severity: string;
  }[];
  readonly notes: readonly { readonly row: number; readonly field: string; readonly code: string }[];
  readonly skipped: readonly unknown[];
  readonly points: readonly { readonly row: number; readonly line?: number; readonly values: Partial<ImportValues> }[];
}

const ENCODING_NAMES: Readonly<Record<string, { encoding: string; bom: boolean }>> = {
  'UTF-8 without BOM': { encoding: 'utf-8', bom: false },
  'UTF-8 with BOM': { encoding: 'utf-8', bom: true },
  'Windows-1252': { encoding: 'windows-1252', bom: false },
};

const LISTS = ['brackwater-points', 'brackwater-points-semicolon-1252', 'brackwater-faults', 'designations'] as const;

/** Reads and interprets a list with the settings that the product suggests. */
function importOf(name: string, design: Design): { reading: CsvFileReading; plan: ImportPlan } {
  const reading = readCsvFile(tagListBytes(`${name}.csv`), {}, design);
  return { reading, plan: interpretGrid(reading.grid, reading.settings, design) };
}

describe.each(LISTS)('import of %s.csv', (name) => {
  const expected = tagListExpectation<Expected>(name);
  const design = brackwaterSetup();
  const { reading, plan } = importOf(name, design);
  const kept = plan.rows.filter(({ action }) => action !== 'hold' && action !== 'skip');

  it('detects encoding, delimiter, heading row and decimal sign', () => {
    expect({ encoding: reading.encoding, bom: reading.bom }).toEqual(ENCODING_NAMES[expected.encoding]);
    expect(reading.delimiter).toBe(expected.separator);
    expect(reading.settings.headerRow).toBe(expected.headerRow);
    expect(reading.settings.decimal).toBe(expected.decimalSign);
    expect(reading.ownExport).toBe(false);
  });

  it('suggests the mapping that a user would choose', () => {
    const suggested = reading.columns
      .filter(({ field }) => field !== null)
      .map(({ column, heading, field }) => ({ column, heading, field }));
    expect(suggested).toEqual(expected.mapping);
    expect(reading.columns.every(({ reason, field }) => (field === null) === (reason === null))).toBe(true);
  });

  it('counts as expected', () => {
    expect(plan.counts).toMatchObject(expected.counts);
  });

  it('finds each problem and no other', () => {
    const found = plan.rows.flatMap(({ row, problems }) =>
      problems.map(({ field, code, severity }) => ({ row, field, code, severity })),
    );
    expect(found).toEqual(expected.problems.map(({ row, field, code, severity }) => ({ row, field, code, severity })));
  });

  it('notes each cell that is read otherwise than it stands, and no other', () => {
    const found = plan.rows.flatMap(({ row, notes }) => notes.map(({ field, code }) => ({ row, field, code })));
    expect(found).toEqual(expected.notes);
  });

  it('skips what is no data', () => {
    expect(plan.rows.filter(({ action }) => action === 'skip')).toEqual(expected.skipped);
  });

  it('gives every value of every point', () => {
    expect(kept.map(({ row }) => row)).toEqual(expected.points.map(({ row }) => row));
    kept.forEach((row, i) => {
      expect(row.values).toMatchObject(expected.points[i].values);
      if (expected.points[i].line !== undefined) expect(row.line).toBe(expected.points[i].line);
    });
  });

  it('reads the same with the value mapping that a user would set', () => {
    const settings = { ...reading.settings, ...(expected.valueMapping && { valueMapping: expected.valueMapping }) };
    expect(interpretGrid(reading.grid, settings, design)).toEqual(plan);
  });

  it('changes nothing when the same file comes again', () => {
    const after = withChanges(design, changesOf(plan, design, countingIds()));
    const second = importOf(name, after).plan;
    expect(second.rows.filter(({ action }) => action !== 'hold').map(({ action }) => action)).toEqual(
      kept.map(() => 'same'),
    );
    expect(second.counts.pointsAfter).toBe(plan.counts.pointsAfter);
    const again = changesOf(second, after, countingIds());
    expect([again.points, again.dispensers].flatMap((each) => [...each.create, ...each.update])).toEqual([]);
    expect([...again.assignments.create, ...again.assignments.remove]).toEqual([]);
  });
});
