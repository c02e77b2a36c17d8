import { describe, expect, it } from 'vitest';
import { brackwaterSetup, countingIds, tagListBytes, tagListExpectation } from '#support/brackwater-setup.ts';
import { changesOf, type ImportPlan, type ImportValues } from './index.ts';
import { importOf, planOf, problemsOf } from './testing/plan-of.ts';
import { withChanges } from './testing/with-changes.ts';

interface Expected {
  readonly mapping: readonly { readonly column: string; readonly heading: string; readonly field: string }[];
  readonly unmapped: readonly { readonly column: string; readonly heading: string | null }[];
  readonly headerRows: readonly number[];
  readonly counts: Readonly<Record<string, number>>;
  readonly skipped: readonly { readonly row: number }[];
  readonly points: readonly { readonly rows: readonly number[]; readonly values: Partial<ImportValues> }[];
}

describe('import of brackwater-signals.xlsx', async () => {
  const expected = tagListExpectation<Expected>('brackwater-signals');
  const bytes = tagListBytes('brackwater-signals.xlsx');
  const design = brackwaterSetup();
  const { reading, plan } = await importOf(bytes, design);
  const kept = plan.rows.filter(({ action }) => action !== 'skip');

  it('takes the sheet of signals with both heading rows, and leaves the legend', () => {
    expect(reading).toMatchObject({ format: 'workbook', encoding: null, delimiter: null, ownExport: false, formulasWithoutValue: 0 });
    expect(reading.sheets).toEqual([
      { name: 'Signals', rows: 55, taken: true, alike: true },
      { name: 'Legend', rows: 6, taken: false, alike: false },
    ]);
    expect(reading.settings).toMatchObject({ headerRow: Math.max(...expected.headerRows), decimal: '.' });
  });

  it('suggests the mapping that a user would choose, by name throughout', () => {
    const mapped = reading.columns.filter(({ field }) => field !== null);
    expect(mapped.map(({ column, heading, field }) => ({ column, heading, field }))).toEqual(
      expected.mapping.map(({ column, heading, field }) => ({ column, heading, field: field.split(' ')[0] })),
    );
    expect(new Set(mapped.map(({ reason }) => reason))).toEqual(new Set(['by name']));
    const left = reading.columns.filter(({ field }) => field === null).map(({ column, heading }) => ({ column, heading: heading || null }));
    expect(left).toEqual(expected.unmapped);
    expect(reading.values.filter(({ value }) => value === null)).toEqual([]);
  });

  it('counts as expected: rows are signals, all else are points', () => {
    const { signals, ...counts } = expected.counts;
    expect(plan.counts).toMatchObject({ ...counts, rows: signals });
  });

  it('makes each point of its rows, with every value, and finds nothing wrong', () => {
    expect(kept.map(({ rows }) => rows)).toEqual(expected.points.map(({ rows }) => rows));
    kept.forEach((row, i) => {
      expect(row.values).toMatchObject(expected.points[i].values);
      expect(row).toMatchObject({ sheet: 'Signals', row: row.rows[0], action: 'create', problems: [], notes: [] });
    });
    expect(plan.rows.filter(({ action }) => action === 'skip')).toMatchObject([{ row: expected.skipped[0].row, why: 'totals' }]);
  });

  it('changes nothing when the same file comes again', async () => {
    const after = withChanges(design, changesOf(plan, design, countingIds()));
    expect(after.assignments).toHaveLength(54);
    const second = await planOf(bytes, after);
    expect(second.counts).toMatchObject({ same: 30, toCreate: 0, toUpdate: 0, problems: 0 });
  });
});

const HEAD = 'Tag,Signal type,Controller,Module,Channel,Address,Wiring,Cable length m,Description';
const signals = (...rows: readonly string[]): Promise<ImportPlan> => planOf([HEAD, ...rows].join('\n'), brackwaterSetup());

describe('rows that are signals', () => {
  it('make one point whatever their order and however far apart', async () => {
    const plan = await signals('A1,DI,PLC1,DI1,0,%IX4.0,,,', 'A2,Q,PLC1,DO1,1,,two-core,,', 'A1,DO,PLC1,DO1,0,%QX4.0,four-core,12,Head pulley');
    expect(plan.rows.map(({ row, rows, action }) => [row, rows, action])).toEqual([
      [2, [2, 4], 'create'],
      [3, [3], 'create'],
    ]);
    expect(plan.rows[0].values).toMatchObject({
      outputModule: 'DO1', outputChannel: 0, statusAddress: '%IX4.0', wiring: 'four-core', cableLengthM: 12, description: 'Head pulley',
    });
    expect(plan.counts).toMatchObject({ rows: 3, toCreate: 2, problems: 0, outputsAssigned: 2, statusInputsAssigned: 1 });
  });

  it.each([
    ['DO', 'DI'], ['DQ', 'di'], ['Q', 'I'], ['output', 'input'], ['Ausgang', 'Eingang'], ['uitgang', 'ingang'], ['sortie', 'entrée'], ['Salida', 'entrada'],
  ])('know %j and %j as output and input', async (output, input) => {
    const plan = await signals(`A1,${output},PLC1,DO1,0,,,,`, `A1,${input},PLC1,DI1,0,,,,`);
    expect(plan.rows[0]).toMatchObject({ rows: [2, 3], problems: [], values: { outputAddress: '%QX4.0', statusAddress: '%IX4.0' } });
  });

  it('that contradict each other leave the value blank and name both rows', async () => {
    const plan = await signals('A1,DO,PLC1,DO1,0,,,12,x', 'A1,DI,PLC1,DI1,0,,,13,x', 'A1,,,,,,,12,');
    expect(problemsOf(plan)).toEqual([[2, 'cableLengthM', 'rows-differ']]);
    expect(plan.rows[0]).toMatchObject({ rows: [2, 3, 4], action: 'create', values: { cableLengthM: null, description: 'x' } });
    expect(plan.rows[0].problems[0]).toMatchObject({ severity: 'warning', column: 'H', cell: '13' });
    expect(plan.rows[0].problems[0].message).toMatch(/row 2 says “12”, row 3 “13”/);
  });

  it('hold back a second output of the point, and only that', async () => {
    const plan = await signals('A1,DO,PLC1,DO1,0,,,,', 'A1,DO,PLC1,DO1,1,,,,', 'A1,DI,PLC1,DI1,0,,,,');
    expect(plan.rows.map(({ rows, action }) => [rows, action])).toEqual([[[2, 4], 'create'], [[3], 'hold']]);
    expect(problemsOf(plan)).toEqual([[3, 'signalType', 'signal-doubled']]);
    expect(plan.rows[1].problems[0].message).toContain('row 2');
  });

  it('say which of their rows a problem is on', async () => {
    const plan = await signals('A1,DO,PLC1,DO1,0,,,,', 'A1,DI,PLC1,DI1,99,,,-3,');
    expect(problemsOf(plan)).toEqual([[2, 'status', 'no-such-channel'], [2, 'cableLengthM', 'not-positive']]);
    expect(plan.rows[0].problems).toMatchObject([{ column: 'E', cell: '99' }, { column: 'H', cell: '-3' }]);
    for (const { message } of plan.rows[0].problems) expect(message).toMatch(/^Row 3: /);
  });

  it('are held back where their type is unknown or missing, until a person says what it stands for', async () => {
    const rows = ['A1,AI,PLC1,DO1,0,,,,', 'A2,,PLC1,DO1,1,,,,', 'A3,DO,PLC1,DO1,2,,,,'];
    expect(problemsOf(await signals(...rows))).toEqual([[2, 'signalType', 'signal-type-unknown'], [3, 'signalType', 'signal-type-missing']]);
    const mapped = await importOf([HEAD, ...rows].join('\n'), brackwaterSetup(), { valueMapping: { signalType: { AI: 'no signal of a dispenser' } } });
    expect(mapped.reading.values).toContainEqual({ field: 'signalType', text: 'AI', rows: 1, value: null, reason: null });
    expect(mapped.plan.rows.map(({ row, action, why }) => [row, action, why])).toEqual([[2, 'skip', 'other-signal'], [3, 'hold', null], [4, 'create', null]]);
  });

  it('take their channels from a column of DO and DI even under another heading', async () => {
    const { reading, plan } = await importOf('Tag,Type,Controller,Card,Channel\nA1,DO,PLC1,DO1,3\nA1,DI,PLC1,DI1,3\n', brackwaterSetup());
    expect(reading.settings.mapping).toEqual({ A: 'tag', B: 'signalType', C: 'controller', D: 'module', E: 'channel' });
    expect(plan.rows[0]).toMatchObject({ rows: [2, 3], values: { outputAddress: '%QX4.3', statusAddress: '%IX4.3' } });
  });

  it('need the column that says which signal each is', async () => {
    const mapping = { A: 'tag', D: 'module' } as const;
    await expect(planOf(`${HEAD}\nA1,DO,PLC1,DO1,0,,,,\n`, brackwaterSetup(), { mapping })).rejects.toThrow(/which signal a row is/);
  });
});
