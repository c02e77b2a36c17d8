import { stringify } from 'csv-stringify/sync';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readCsv } from './csv-grid.ts';
import { DELIMITERS } from './delimiter.ts';
import { columnIndex, columnLetter, LIMITS } from './grid.ts';

describe('reading CSV', () => {
  it.each(DELIMITERS)('detects the delimiter %j though the others stand in quoted and plain text', (delimiter) => {
    const rows = Array.from({ length: 9 }, (_, i) => [`T${i}`, 'a, b; c\td | e', '1', i % 2 ? 'x' : 'x|y,z;w']);
    expect(readCsv(stringify([['Tag', 'Text', 'Dose', 'Note'], ...rows], { delimiter })).delimiter).toBe(delimiter);
  });

  it('takes the delimiter that a person chose', () => {
    expect(readCsv('a;b,c\n1;2,3\n', ',').grid.rows[1].cells).toEqual(['1;2', '3']);
  });

  it('counts records and, apart from them, lines', () => {
    const { grid } = readCsv('Tag,Text\r\nA,"one\ntwo\r\nthree"\r\n\r\nB,x\r\n\r\n');
    expect(grid.rows.map(({ number, line, cells }) => [number, line, cells[0]])).toEqual([
      [1, 1, 'Tag'],
      [2, 2, 'A'],
      [3, 5, ''],
      [4, 6, 'B'],
    ]);
  });

  it('keeps a stray quotation mark as text', () => {
    expect(readCsv('Tag,Text\nA,24" hatch\nB,x\n').grid.rows[1].cells).toEqual(['A', '24" hatch']);
  });

  it('says where an unclosed quotation mark may be looked for', () => {
    expect(() => readCsv('Tag,Text\nA,"open\nB,x\n')).toThrow(/never closed/);
  });

  it('refuses what passes a limit', () => {
    expect(() => readCsv(`Tag\n${'A\n'.repeat(LIMITS.rows)}`)).toThrow(/too many rows/);
    expect(() => readCsv(`${'a,'.repeat(LIMITS.columns)}a\n`)).toThrow(/too many columns/);
    expect(() => readCsv(`Tag,Text\nA,${'x'.repeat(LIMITS.cellLength + 1)}\n`)).toThrow(/Cell B of row 2/);
  });

  it('reads what RFC 4180 writing wrote, whatever the texts', () => {
    const cell = fc.string({ unit: 'grapheme', maxLength: 30 }).filter((text) => !text.includes('\ufeff'));
    const table = fc.integer({ min: 2, max: 6 }).chain((width) =>
      fc.array(
        fc.array(fc.oneof(cell, fc.constantFrom('a"b', '"', 'x\ny', 'x\r\ny', ',', ';')), {
          minLength: width,
          maxLength: width,
        }),
        { minLength: 1, maxLength: 8 },
      ),
    );
    fc.assert(
      fc.property(table, fc.constantFrom(...DELIMITERS), (rows, delimiter) => {
        const filled = rows.map((row) => ['tag', ...row]);
        const read = readCsv(stringify(filled, { delimiter, quoted: true, record_delimiter: 'windows' }), delimiter);
        expect(read.grid.rows.map(({ cells }) => cells)).toEqual(filled);
      }),
    );
  });
});

describe('column letters', () => {
  it('count as spreadsheets do, both ways', () => {
    expect([0, 25, 26, 51, 52, 701, 702].map(columnLetter)).toEqual(['A', 'Z', 'AA', 'AZ', 'BA', 'ZZ', 'AAA']);
    for (let i = 0; i < 2000; i += 1) expect(columnIndex(columnLetter(i))).toBe(i);
    expect(columnIndex('a1')).toBe(-1);
  });
});
