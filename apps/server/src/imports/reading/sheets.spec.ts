import exceljs from 'exceljs';
import { describe, expect, it } from 'vitest';
import { brackwaterSetup } from '#support/brackwater-setup.ts';
import type { ChosenSettings, ImportPlan } from './index.ts';
import { importOf, problemsOf } from './testing/plan-of.ts';

type Cells = readonly (string | number | null)[];

interface SheetOf {
  readonly name: string;
  readonly rows: readonly Cells[];
  readonly hidden?: boolean;
}

async function bookOf(...sheets: readonly SheetOf[]): Promise<Uint8Array> {
  const book = new exceljs.Workbook();
  for (const { name, rows, hidden } of sheets) {
    const sheet = book.addWorksheet(name, hidden ? { state: 'hidden' } : {});
    for (const cells of rows) sheet.addRow([...cells]);
  }
  return new Uint8Array(await book.xlsx.writeBuffer());
}

const HEAD = ['Tag', 'Controller', 'Output address', 'Cable length m'];
const K1: SheetOf = { name: '+K1', rows: [HEAD, ['A1', 'PLC1', '%QX4.0', 12.5], ['A2', 'PLC1', '%QX4.1', 13]] };
const K2: SheetOf = { name: '+K2', rows: [['Cabinet +K2'], [], HEAD, ['B1', 'PLC2', '%QX4.0', 7]] };
const LEGEND: SheetOf = { name: 'Legend', rows: [['Short', 'Meaning'], ['DO', 'digital output'], ['DI', 'digital input'], ['Tag', 'of the point'], ['X', 'y']] };
const HIDDEN: SheetOf = { name: 'Old', hidden: true, rows: [[...HEAD], ['OLD1', 'PLC1', '%QX4.2', 1], ['OLD2', 'PLC1', '%QX4.3', 1], ['OLD3', 'PLC1', null, 1]] };
const OTHER: SheetOf = { name: 'Spare', rows: [['Controller', 'Module', 'Free'], ['PLC1', 'DO1', 4]] };

const taken = async (sheets: readonly SheetOf[], chosen: ChosenSettings = {}) => importOf(await bookOf(...sheets), brackwaterSetup(), chosen);
const tagsOf = ({ rows }: ImportPlan): unknown[] => rows.filter(({ action }) => action !== 'skip').map(({ sheet, row, values }) => [sheet, row, values.tag]);

describe('the sheets of a workbook', () => {
  it('are taken together where their headings are alike, each with its own heading row; legends and hidden ones are not', async () => {
    const { reading, plan } = await taken([LEGEND, K1, OTHER, HIDDEN, K2]);
    expect(reading.sheets).toEqual([
      { name: 'Legend', rows: 4, taken: false, alike: false },
      { name: '+K1', rows: 2, taken: true, alike: true },
      { name: 'Spare', rows: 1, taken: false, alike: false },
      { name: 'Old', rows: 3, taken: false, alike: true },
      { name: '+K2', rows: 1, taken: true, alike: true },
    ]);
    expect(reading.parts.map(({ sheet, headerRow }) => [sheet, headerRow])).toEqual([['+K1', 1], ['+K2', 3]]);
    expect(tagsOf(plan)).toEqual([['+K1', 2, 'A1'], ['+K1', 3, 'A2'], ['+K2', 4, 'B1']]);
    expect(plan.counts).toMatchObject({ toCreate: 3, problems: 0, pointsAfter: 3 });
  });

  it('are those that a person chooses, a hidden one too', async () => {
    const { plan, reading } = await taken([K1, HIDDEN, K2], { sheets: ['Old'] });
    expect(tagsOf(plan).length).toBe(3);
    expect(reading.sheets.map((each) => each.taken)).toEqual([false, true, false]);
  });

  it('keep their own heading row where the chosen one is that of the first', async () => {
    const { plan } = await taken([K1, K2], { headerRow: 1 });
    expect(tagsOf(plan)).toHaveLength(3);
  });

  it('are refused where they are unlike or not there', async () => {
    await expect(taken([K1, OTHER], { sheets: ['+K1', 'Spare'] })).rejects.toThrow(/sheet “Spare” are not those/);
    await expect(taken([K1], { sheets: ['+K9'] })).rejects.toThrow(/no sheet “\+K9”/);
    await expect(taken([{ name: 'Empty', rows: [] }])).rejects.toThrow(/no content/);
  });

  it('share their tags and channels, and messages name the sheet', async () => {
    const again: SheetOf = { name: '+K3', rows: [HEAD, ['A1', 'PLC1', '%QX5.0', 1], ['C1', 'PLC1', '%QX4.0', 1]] };
    const { plan } = await taken([K1, again]);
    expect(problemsOf(plan)).toEqual([[2, 'tag', 'tag-doubled'], [3, 'output', 'output-taken']]);
    const messages = plan.rows.flatMap(({ problems }) => problems.map(({ message }) => message));
    expect(messages[0]).toContain('row 2 of sheet “+K1”');
    expect(messages[1]).toContain('row 2 of sheet “+K1”');
  });

  it('may hold the signals of one point', async () => {
    const head = ['Tag', 'Signal type', 'Controller', 'Module', 'Channel'];
    const outputs: SheetOf = { name: 'Outputs', rows: [head, ['A1', 'DO', 'PLC1', 'DO1', 0], ['A2', 'DO', 'PLC1', 'DO1', 1]] };
    const inputs: SheetOf = { name: 'Inputs', rows: [head, ['A2', 'DI', 'PLC1', 'DI1', 1], ['A1', 'DI', 'PLC2', 'DI1', 0]] };
    const { plan } = await taken([outputs, inputs]);
    expect(plan.rows.map(({ sheet, rows }) => [sheet, rows])).toEqual([['Outputs', [2, 3]], ['Outputs', [3, 2]]]);
    expect(plan.rows[1].values).toMatchObject({ outputAddress: '%QX4.1', statusAddress: '%IX4.1' });
    expect(plan.rows[0].problems.map(({ code, message }) => [code, message])).toEqual([
      ['rows-differ', expect.stringContaining('row 2 of sheet “Outputs” says “PLC1”, row 3 of sheet “Inputs” “PLC2”')],
    ]);
  });
});

describe('numbers of a workbook', () => {
  it('have a decimal point whatever the sign in numbers kept as text', async () => {
    const rows: Cells[] = [HEAD, ['A1', null, null, 1.125], ['A2', null, null, '1,5'], ['A3', null, null, 62.5]];
    const { reading, plan } = await taken([{ name: 'List', rows }]);
    expect(reading.settings.decimal).toBe(',');
    expect(plan.rows.map(({ values }) => values.cableLengthM)).toEqual([1.125, 1.5, 62.5]);
    expect(plan.counts).toMatchObject({ problems: 0, notes: 0 });
  });
});
