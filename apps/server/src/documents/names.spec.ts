import { describe, expect, it } from 'vitest';
import { dayInZone } from './day-in-zone.ts';
import { safeFileName } from './file-name.ts';
import { sheetNames } from './sheet-names.ts';

describe('safeFileName', () => {
  it.each([
    [['Brackwater Terminal', 'io-list'], 'brackwater-terminal-io-list.csv'],
    [['Größe "x"\r\n; ../../etc', 'draft'], 'gro-e-x-etc-draft.csv'],
    [['料理'], 'document.csv'],
  ])('%j is %s', (parts, name) => {
    expect(safeFileName(parts, 'csv')).toBe(name);
  });
});

describe('sheetNames', () => {
  it('takes out what workbooks refuse and keeps names apart', () => {
    expect(sheetNames(['+K1/2', '+K1:2', "it's", 'x'.repeat(40), 'x'.repeat(40)])).toEqual(['+K1-2', '+K1-2 2', 'it’s', 'x'.repeat(31), `${'x'.repeat(27)} 2`]);
  });
});

describe('dayInZone', () => {
  const instant = new Date('2026-05-04T23:30:00Z');
  it.each([['UTC', '2026-05-04'], ['Europe/Amsterdam', '2026-05-05'], ['Nowhere/Such', '2026-05-04']])('in %s it is %s', (zone, day) => {
    expect(dayInZone(instant, zone)).toBe(day);
  });
});
