import { describe, expect, it } from 'vitest';
import { brackwaterSetup } from '#support/brackwater-setup.ts';
import { markHeadings } from './apostrophe-guard.ts';
import { readCsv } from './csv-grid.ts';
import { detectDecimalMark } from './decimal-mark.ts';
import { FIELDS, headingOf, type FieldKey } from './fields.ts';
import { rowsBelow } from './grid.ts';
import { findHeaderRow } from './header-row.ts';
import { headingsAt } from './heading-block.ts';
import { NOTHING_REMEMBERED } from './remembered.ts';
import { mappingOf, suggestMapping } from './suggest-mapping.ts';

function suggested(text: string): Record<string, FieldKey> {
  const { grid } = readCsv(text);
  const headerRow = findHeaderRow(grid)!.number;
  return mappingOf(suggestMapping(headingsAt(grid, headerRow, []), rowsBelow(grid, headerRow), brackwaterSetup(), NOTHING_REMEMBERED));
}

describe('suggesting a mapping', () => {
  it('finds every field by the heading of our own lists', () => {
    const found = Object.values(suggested(`${markHeadings(FIELDS.map(({ key }) => headingOf(key)), '.').join(';')}\nA\n`));
    expect(found).toEqual(FIELDS.map(({ key }) => key));
  });

  it.each([
    ['Tagnummer;Omschrijving;Kabellengte m;Doorsnede mm²', ['tag', 'description', 'cableLengthM', 'crossSectionMm2']],
    ['Repère;Libellé;Alésage d (mm);Vitesse tr/min', ['tag', 'description', 'boreMm', 'speedRpm']],
    ['Etiqueta;Descripción;Dosis [cm³];Longitud de cable, m', ['tag', 'description', 'doseCm3', 'cableLengthM']],
    ['Schmierstelle;d mm;D mm;B mm;n 1/min', ['tag', 'boreMm', 'outsideMm', 'widthMm', 'speedRpm']],
    ['Tag;Cable m;Cable;Demand cm³/1,000 h', ['tag', 'cableLengthM', 'cableTag', 'demandCm3Per1000h']],
  ])('reads the headings %s', (headings, fields) => {
    expect(Object.values(suggested(`${headings}\nA1\n`))).toEqual(fields);
  });

  it('suggests nothing where the unit is another or, for a demand, missing', () => {
    expect(suggested('Tag;Cable length ft;Demand;Bore in\nA1;1;1;1\n')).toEqual({ A: 'tag' });
    expect(suggested('Tag;Length in m\nA1;1\n')).toEqual({ A: 'tag', B: 'cableLengthM' });
  });

  it('knows columns by their values where headings say nothing', () => {
    const rows = [
      'P;Q;R;S;T;U;V',
      'GC1-L01;=T1.GL1;+G1;%QX4.0;2-core;C1;Dispenser, two-core, 80 cm³ family',
      'GC1-L02;=T1.GL1;+G1;%QX4.1;2-core;C1;Dispenser, two-core, 160 cm³ family',
    ];
    expect(suggested(rows.join('\n'))).toEqual({
      A: 'tag',
      B: 'function',
      C: 'location',
      D: 'outputAddress',
      E: 'wiring',
      F: 'circuit',
      G: 'dispenserType',
    });
  });

  it('suggests each field once', () => {
    expect(suggested('Tag;Tag;Description\nA;B;C\n')).toEqual({ A: 'tag', C: 'description' });
  });
});

describe('finding the heading row', () => {
  it('passes title lines and blank rows above it', () => {
    const { grid } = readCsv('Brackwater Terminal;;\nIssue C, 2 March;;\n;;\nTag;Description;Dose cm³\nA1;x;0,3\n');
    expect(findHeaderRow(grid)).toEqual({ number: 4, named: 3 });
  });

  it('takes the first full row of texts when no heading is known', () => {
    expect(findHeaderRow(readCsv('List;;\nFoo;Bar;Baz\nA;1;2\n').grid)?.number).toBe(2);
  });
});

describe('finding the decimal sign', () => {
  it.each([
    [['0.3', '1,480'], '.'],
    [['0,3', '1.480'], ','],
    [['1.480,5', '12'], ','],
    [['1,480.5', '12'], '.'],
    [['12', '13'], ','],
    [['95,5 m'], ','],
  ])('of %j is %s', (cells, mark) => {
    const { grid } = readCsv(`Tag;Length m\n${cells.map((cell, i) => `A${i};${cell}`).join('\n')}\n`, ';');
    expect(detectDecimalMark([rowsBelow(grid, 1)], { B: 'cableLengthM' }, ';')).toBe(mark);
  });
});
