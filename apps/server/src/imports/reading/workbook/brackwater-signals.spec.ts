import { beforeAll, describe, expect, it } from 'vitest';
import { tagListBytes, tagListExpectation } from '#support/brackwater-setup.ts';
import { columnIndex } from '../grid.ts';
import { readWorkbook, type SheetReading } from './index.ts';

interface Expectation {
  readonly sheets: readonly string[];
  readonly numbersKeptAsText: readonly string[];
  readonly mapping: readonly { readonly column: string; readonly heading: string; readonly field: string }[];
  readonly points: readonly {
    readonly rows: readonly number[];
    readonly values: Readonly<Record<string, string | number | null>>;
  }[];
}

const expected = tagListExpectation<Expectation>('brackwater-signals');
let sheets: readonly SheetReading[];
const at = (ref: string, sheet = 0): string => {
  const [, letters, row] = /^([A-Z]+)(\d+)$/.exec(ref) ?? [];
  return sheets[sheet].grid.rows[Number(row) - 1].cells[columnIndex(letters)];
};

beforeAll(async () => {
  sheets = (await readWorkbook(tagListBytes('brackwater-signals.xlsx'))).sheets;
});

describe('the issued signal list', () => {
  it('has its two sheets, the list up to its totals', () => {
    expect(sheets.map(({ name, hidden }) => [name, hidden])).toEqual(expected.sheets.map((name) => [name, false]));
    expect(sheets.map(({ grid }) => grid.rows.length)).toEqual([61, 8]);
    expect(new Set(sheets[0].grid.rows.map(({ cells }) => cells.length))).toEqual(new Set([17]));
    expect(sheets[0].grid.rows.map(({ number, line }) => [number, line])).toEqual(
      Array.from({ length: 61 }, (_, i) => [i + 1, i + 1]),
    );
  });

  it('has its title block with a date, and merged group headings over the headings', () => {
    expect(['A1', 'B1', 'B3', 'H3', 'H4'].map((ref) => at(ref))).toEqual([
      'Brackwater Terminal',
      '',
      'A. Ferrow',
      '2026-03-02',
      '1 of 2',
    ]);
    const headings = expected.mapping.map(({ column }) =>
      [at(`${column}5`), at(`${column}6`)].filter((text) => text !== ''),
    );
    const groups = new Map([
      ['E', 'Signal'],
      ['H', 'Dispenser'],
      ['J', 'PLC'],
      ['K', 'PLC'],
      ['L', 'PLC'],
      ['N', 'Cable'],
      ['O', 'Cable'],
      ['P', 'Cable'],
    ]);
    const whole = headings.map((texts, i) =>
      [groups.get(expected.mapping[i].column), ...texts].filter(Boolean).join(' / '),
    );
    expect(whole).toEqual(expected.mapping.map(({ heading }) => heading));
  });

  it('says which cells are merged', () => {
    expect(sheets[0].merges).toHaveLength(10);
    for (const [left, right] of [
      ['D', 'E'],
      ['G', 'H'],
      ['I', 'L'],
      ['M', 'P'],
    ]) {
      expect(sheets[0].merges).toContainEqual({
        top: 5,
        left: columnIndex(left),
        bottom: 5,
        right: columnIndex(right),
      });
    }
  });

  it('has numbers kept as text with their blanks', () => {
    const texts = expected.numbersKeptAsText.map((ref) => at(ref));
    expect(texts.every((text) => /^\d+(\.\d+)? *$/.test(text))).toBe(true);
    expect(texts.filter((text) => text.endsWith(' ')).length).toBeGreaterThan(5);
    expect([at('N9'), at('C7')]).toEqual(['30  ', 'Head pulley, bearing drive side ']);
  });

  it('has the stored results of its totals and nothing behind them', () => {
    const lengths = expected.points.flatMap(({ rows, values }) =>
      rows.map((row) => [`N${row}`, values['cableLengthM']]),
    );
    // the sum of a column leaves out the numbers kept as text
    const sum = lengths.reduce(
      (all, [ref, m]) => all + (expected.numbersKeptAsText.includes(String(ref)) ? 0 : Number(m)),
      0,
    );
    expect([at('A61'), at('E61'), at('N61')]).toEqual(['Total', '54', String(sum)]);
    expect(sheets[0].formulasWithoutValue).toBe(0);
  });

  it('has every value of every point where it should be', () => {
    const columns = new Map(expected.mapping.map(({ column, field }) => [field, column]));
    const shared = [
      'tag',
      'description',
      'controller',
      'cableTag',
      'cableLengthM',
      'crossSectionMm2',
      'circuit',
      'remarks',
    ];
    for (const { rows, values } of expected.points) {
      const [first, second] = rows;
      const text = (field: string, row: number): string => at(`${columns.get(field)}${row}`).trim();
      for (const row of rows) for (const field of shared) expect(text(field, row)).toBe(String(values[field] ?? ''));
      for (const field of ['dispenserType', 'wiring']) expect(text(field, first)).toBe(values[field]);
      expect([text('module', first), text('channel', first)]).toEqual([
        values['outputModule'],
        String(values['outputChannel']),
      ]);
      if (second)
        expect([text('address', second), text('channel', second)]).toEqual([
          values['statusAddress'],
          String(values['statusChannel']),
        ]);
    }
  });
});
