import { describe, expect, it } from 'vitest';
import { brackwaterSetup, countingIds, tagListBytes, tagListExpectation } from '#support/brackwater-setup.ts';
import { changesOf, interpretFile, type ImportValues, type ValueMapping } from './index.ts';
import { importOf } from './testing/plan-of.ts';
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

const ENCODING_NAMES: Readonly<Record<string, string>> = {
  'UTF-8 without BOM': 'utf-8',
  'UTF-8 with BOM': 'utf-8',
  'Windows-1252': 'windows-1252',
};

const LISTS = ['brackwater-points', 'brackwater-points-semicolon-1252', 'brackwater-faults', 'designations'] as const;

describe.each(LISTS)('import of %s.csv', async (name) => {
  const expected = tagListExpectation<Expected>(name);
  const design = brackwaterSetup();
  const { reading, plan } = await importOf(tagListBytes(`${name}.csv`), design);
  const kept = plan.rows.filter(({ action }) => action !== 'hold' && action !== 'skip');

  it('detects encoding, delimiter, heading row and decimal sign', () => {
    expect(reading.format).toBe('csv');
    expect(reading.encoding).toBe(ENCODING_NAMES[expected.encoding]);
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
    expect(interpretFile({ ...reading, settings }, design)).toEqual(plan);
  });

  it('changes nothing when the same file comes again', async () => {
    const after = withChanges(design, changesOf(plan, design, countingIds()));
    const second = (await importOf(tagListBytes(`${name}.csv`), after)).plan;
    expect(second.rows.filter(({ action }) => action !== 'hold').map(({ action }) => action)).toEqual(
      kept.map(() => 'same'),
    );
    expect(second.counts.pointsAfter).toBe(plan.counts.pointsAfter);
    const again = changesOf(second, after, countingIds());
    expect([again.points, again.dispensers].flatMap((each) => [...each.create, ...each.update])).toEqual([]);
    expect([...again.assignments.create, ...again.assignments.remove]).toEqual([]);
  });
});
