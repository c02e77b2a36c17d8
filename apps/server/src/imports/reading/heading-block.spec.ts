import { describe, expect, it } from 'vitest';
import { brackwaterSetup, tagListBytes } from '#support/brackwater-setup.ts';
import { readCsv } from './csv-grid.ts';
import { headingsAt, headingText, type MergedCells } from './heading-block.ts';
import { importOf } from './testing/plan-of.ts';
import { readWorkbook } from './workbook/index.ts';

function headingsOf(text: string, headerRow: number, merges: readonly MergedCells[] = []): string[] {
  const headings = headingsAt(readCsv(text, ',').grid, headerRow, merges);
  return headings.leaves.map((_, i) => headingText(headings, i));
}

describe('headings of two rows', () => {
  it('spread a group heading over the columns below it until the next', () => {
    expect(headingsOf('Tag,Cable,,Signal,\n,Tag,Length m,Type,Kind\nA,1,2,3,4\n', 2)).toEqual([
      'Tag', 'Cable / Tag', 'Cable / Length m', 'Signal / Type', 'Signal / Kind',
    ]);
  });

  it('follow the merged cells of a sheet, which may leave a column out of the group', () => {
    const merges = [{ top: 1, left: 1, bottom: 1, right: 2 }, { top: 1, left: 0, bottom: 2, right: 0 }];
    expect(headingsOf('Tag,Cable,,\n,Tag,Length m,Note\nA,1,2,3\n', 2, merges)).toEqual(['Tag', 'Cable / Tag', 'Cable / Length m', 'Note']);
  });

  it.each([
    ['a title', 'Brackwater Terminal,,\nTag,Description,Cable m\n', []],
    ['a title over all columns', 'Brackwater Terminal,,\nTag,Description,Cable m\n', [{ top: 1, left: 0, bottom: 1, right: 2 }]],
    ['a revision box', 'Revision,B,\nTag,Description,Cable m\n', []],
    ['a date', 'Cable,2026-03-02,\nTag,Description,Cable m\n', []],
  ])('are not made of %s above the headings', (_name, text, merges) => {
    expect(headingsOf(text, 2, merges)).toEqual(['Tag', 'Description', 'Cable m']);
  });

  it('are found in a CSV that was saved from such a sheet', async () => {
    const design = brackwaterSetup();
    const { sheets: [{ grid }] } = await readWorkbook(tagListBytes('brackwater-signals.xlsx'));
    const csv = grid.rows.map(({ cells }) => cells.map((cell) => `"${cell.replaceAll('"', '""')}"`).join(';')).join('\r\n');
    const fromSheet = await importOf(tagListBytes('brackwater-signals.xlsx'), design);
    const fromCsv = await importOf(csv, design);
    expect(fromCsv.reading.columns.map(({ heading, field }) => [heading, field])).toEqual(fromSheet.reading.columns.map(({ heading, field }) => [heading, field]));
    expect(fromCsv.plan.counts).toEqual(fromSheet.plan.counts);
    expect(fromCsv.plan.rows.map(({ values }) => values)).toEqual(fromSheet.plan.rows.map(({ values }) => values));
  });

  it('tell output and status apart by the group alone, also in German', async () => {
    const list = 'Schmierstelle;Steuerung;Ausgang;;Eingang;;Kabel;\n;;Karte;Kanal;Karte;Kanal;Nr.;Länge m\nA1;PLC1;DO1;2;DI1;3;-W1;12\n';
    const { reading, plan } = await importOf(list, brackwaterSetup());
    expect(Object.values(reading.settings.mapping)).toEqual([
      'tag', 'controller', 'outputModule', 'outputChannel', 'statusModule', 'statusChannel', 'cableTag', 'cableLengthM',
    ]);
    expect(plan.rows[0].values).toMatchObject({ outputAddress: '%QX4.2', statusAddress: '%IX4.3', cableTag: '-W1', cableLengthM: 12 });
  });

  it('are both passed where a printed list repeats them', async () => {
    const head = 'Tag,Cable,\n,Tag,Length m\n';
    const { plan } = await importOf(`${head}A1,-W1,2\n${head}A2,-W2,3\n`, brackwaterSetup());
    expect(plan.rows.map(({ row, why }) => [row, why])).toEqual([[3, null], [4, 'repeated-heading'], [5, 'repeated-heading'], [6, null]]);
  });
});
