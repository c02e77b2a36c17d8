import type { ImportPreview } from '#contract';
import { actWords, effectWords, fileWords, formulaWords, headingParts, readingWords } from './import-words';
import { buildCounts as counts, buildPreview } from './testing/preview';

describe('words of an import', () => {
  it('says on the button and beside it what the import will do', () => {
    expect(actWords(counts({ toCreate: 30, toUpdate: 2, heldBack: 3 }))).toBe('Import: create 30, change 2');
    expect(effectWords(counts({ toCreate: 30, toUpdate: 2, heldBack: 3 }))).toBe('Creates 30 points, changes 2; 3 rows are held back.');
    expect(effectWords(counts({ toUpdate: 1, heldBack: 1 }))).toBe('Changes 1 point; 1 row is held back.');
    expect(actWords(counts({ toCreate: 50_000 }))).toBe('Import: create 50,000');
  });

  it('says that there is nothing to do', () => {
    expect(actWords(counts({ same: 60 }))).toBe('Nothing to import');
    expect(effectWords(counts({ same: 60 }))).toBe('The file changes nothing.');
  });

  it('names file, sheets taken and rows', () => {
    const sheet = (name: string, taken: boolean) => ({ name, rows: 9, taken, alike: taken });
    const preview = { fileName: 'list.xlsx', sheets: [sheet('GC1', true), sheet('GC2', true), sheet('Legend', false)], counts: counts({ rows: 54 }) } as unknown as ImportPreview;
    expect(fileWords(preview)).toBe('list.xlsx, sheets “GC1”, “GC2”, 54 rows');
    expect(fileWords({ ...preview, fileName: 'list.csv', sheets: [] })).toBe('list.csv, 54 rows');
  });

  it('says what to do about formulas without a result', () => {
    expect(formulaWords(buildPreview())).toBe('');
    expect(formulaWords(buildPreview({ formulasWithoutValue: 1 }))).toMatch(/^1 formula was saved without a result, so that its cell is read as blank/);
    expect(formulaWords(buildPreview({ formulasWithoutValue: 1200 }))).toMatch(/^1,200 formulas were saved .* their cells are read as blank/);
  });

  it('parts a heading into group and name', () => {
    expect(headingParts('Signal / Type')).toEqual({ group: 'Signal', name: 'Type' });
    expect(headingParts('Tag')).toEqual({ group: '', name: 'Tag' });
  });

  it('says how the file was read, with what its format has', () => {
    const settings = (part: object) => ({ settings: { encoding: 'utf-8', delimiter: ';', decimal: ',', headerRow: 1, ...part } }) as unknown as ImportPreview;
    expect(readingWords(settings({}))).toBe('Read as UTF-8, parted by semicolon, decimal comma, headings in row 1');
    expect(readingWords(settings({ encoding: null, delimiter: null, decimal: '.', headerRow: 6 }))).toBe('Read as a workbook, decimal point, headings in row 6');
  });
});
