import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { guardText, hasGuardMark, markHeadings, unguardText } from './apostrophe-guard.ts';
import { runs } from '#support/property-runs.ts';

/** Texts made of the signs that matter, besides any other text. */
const texts = fc.oneof(
  fc.string({ unit: 'binary' }),
  fc.string({
    unit: fc.constantFrom("'", '=', '+', '-', '@', '＝', '＠', '\t', '\r', '\n', '\0', ' ', '\u00a0', 'a', '1'),
  }),
);

describe('the apostrophe guard', () => {
  it.each(['=1+1', '+10 °C', '-W1101', '@SUM(1)', '＝1+1', '\t=1', '\rx', '\0=1', ' =1', "'=x", "''=x"])(
    'guards %j',
    (text) => {
      expect(guardText(text)).toBe(`'${text}`);
    },
  );

  it.each(['GC1-L01', "it's", "'quoted'", '', '1E5', 'a=b', "'"])('leaves %j alone', (text) => {
    expect(guardText(text)).toBe(text);
    expect(unguardText(text)).toBe(text);
  });

  it('comes off again from every text', () => {
    fc.assert(
      fc.property(texts, (text) => unguardText(guardText(text)) === text),
      { numRuns: runs(2000) },
    );
  });

  it('leaves no text that begins with what a spreadsheet runs', () => {
    fc.assert(
      fc.property(texts, (text) => !/^\s*[=+\-@＝＋－＠]|^[\t\r\n\0]/u.test(guardText(text))),
      { numRuns: runs(2000) },
    );
  });

  it('is taken off only where the headings say so', () => {
    expect(hasGuardMark(['Tag', 'Remarks'])).toBe(false);
    expect(hasGuardMark(markHeadings(['Tag', 'Remarks'], '.'))).toBe(true);
  });
});
