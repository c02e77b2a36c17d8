import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { runs } from '#support/property-runs.ts';
import { CsvRecords, QuoteNotClosed } from './csv-records.ts';

function recordsOf(text: string, delimiter: string): string[][] | 'not closed' {
  const records = new CsvRecords(text, delimiter);
  const all: string[][] = [];
  try {
    for (let cells = records.next(); cells; cells = records.next()) all.push(cells);
    return all;
  } catch (error) {
    expect(error).toBeInstanceOf(QuoteNotClosed);
    return 'not closed';
  }
}

/** What a parser of other origin makes of it. */
function judged(text: string, delimiter: string): string[][] | 'not closed' {
  try {
    return parse(text, { delimiter, record_delimiter: ['\r\n', '\n', '\r'], relax_quotes: true, relax_column_count: true });
  } catch {
    return 'not closed';
  }
}

describe('the records of a CSV', () => {
  it.each([
    ['a,b\nc,d\n', [['a', 'b'], ['c', 'd']]],
    ['a,b\r\nc\rd,e', [['a', 'b'], ['c'], ['d', 'e']]],
    ['"a,""b"",\r\nc",d', [['a,"b",\r\nc', 'd']]],
    ['24" hatch,"24"" hatch"', [['24" hatch', '24" hatch']]],
    ['"24" hatch,b', [['"24" hatch', 'b']]],
    ['"",\n\n,', [['', ''], [''], ['', '']]],
    ['', []],
  ])('%j', (text, records) => {
    expect(recordsOf(text, ',')).toEqual(records);
  });

  it('are those that a parser of other origin finds, whatever the text', () => {
    const signs = fc.string({ unit: fc.constantFrom('"', '"', ',', ';', '\n', '\r', '\r\n', 'a', 'ü', ' ', '€', '1'), maxLength: 40 });
    fc.assert(
      fc.property(signs, fc.constantFrom(',', ';', '\t'), (text, delimiter) => {
        expect(recordsOf(text, delimiter)).toEqual(judged(text, delimiter));
      }),
      { numRuns: runs(1000) },
    );
  });

  it('know the line on which they begin', () => {
    const records = new CsvRecords('a\r\n"b\nc\r\nd"\n\ne', ',');
    const lines: number[] = [];
    for (let { line } = records; records.next(); { line } = records) lines.push(line);
    expect(lines).toEqual([1, 2, 5, 6]);
  });
});
