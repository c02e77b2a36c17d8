import type { ImportPreview } from '#contract';
import { buildRow } from '../testing/preview';
import { cellText, changesOf, isFaulty, oldText, remarkOf, rowFieldsOf, rowNumbers, unsaid } from './row-cells';

const row = (part: Parameters<typeof buildRow>[0]) => buildRow({ action: 'update', ...part });
const fields = [
  { key: 'tag', label: 'Tag' }, { key: 'description', label: 'Description' }, { key: 'demandCm3Per1000h', label: 'Demand, cm³/1000 h' }, { key: 'circuit', label: 'Circuit' },
];
const column = (letter: string, field: string | null) => ({ column: letter, heading: letter, samples: [], field, reason: '' });

describe('cells of an import row', () => {
  it('has a column for each field that the file fills, behind tag and description', () => {
    const preview = { fields, columns: [column('A', 'tag'), column('C', 'demandCm3Per1000h')] } as unknown as ImportPreview;
    expect(rowFieldsOf(preview)).toEqual([{ key: 'demandCm3Per1000h', column: 'C', label: 'Demand', unit: 'cm³/1000 h', width: 84 }]);
  });

  it('puts outputs and status inputs of a list of signals apart', () => {
    const both = [...fields, { key: 'outputAddress', label: 'Output address' }, { key: 'statusAddress', label: 'Status address' }, { key: 'address', label: 'Address' }];
    const preview = { fields: both, columns: [column('E', 'signalType'), column('L', 'address')] } as unknown as ImportPreview;
    expect(rowFieldsOf(preview).map(({ key, column: at }) => [key, at])).toEqual([['outputAddress', 'L'], ['statusAddress', 'L']]);
    const faulty = row({ problems: [{ code: 'input-taken', severity: 'warning', field: 'status', column: 'L', cell: '%IX4.0', message: 'Taken.', remedy: 'Choose another.' }] });
    expect(isFaulty(faulty, 'statusAddress', 'L')).toBe(true);
    expect(isFaulty(faulty, 'outputAddress', 'L')).toBe(false);
  });

  it('shows volumes in cm³, and the text of a cell at fault as it stands in the file', () => {
    expect(cellText(row({ values: { demandUlPer1000h: 300 } }), 'demandCm3Per1000h', 'C')).toBe('0.3');
    const faulty = row({ problems: [{ code: 'output-taken', severity: 'error', field: 'output', column: 'K', cell: '%QX4.0', message: 'Taken.', remedy: 'Choose another.' }] });
    expect(cellText(faulty, 'outputAddress', 'K')).toBe('%QX4.0');
    expect(isFaulty(faulty, 'outputAddress', 'K')).toBe(true);
    expect(isFaulty(faulty, 'circuit', 'L')).toBe(false);
  });

  it('tells old and new of a change', () => {
    const changed = row({ changes: [{ field: 'demandUlPer1000h', from: 300, to: 400 }, { field: 'circuit', from: null, to: 'C1' }] });
    expect(oldText(changed, 'demandCm3Per1000h')).toBe('0.3');
    expect(oldText(changed, 'circuit')).toBe('blank');
    expect(oldText(changed, 'tag')).toBeNull();
    expect(changesOf(changed, fields)).toEqual([{ label: 'Demand, cm³/1000 h', from: '0.3', to: '0.4' }, { label: 'Circuit', from: 'blank', to: 'C1' }]);
  });

  it.each([[[9], '9'], [[9, 10], '9, 10'], [[9, 10, 11], '9 to 11'], [[9, 12, 13], '9, 12, 13']])('names the rows %j of the file', (rows, words) => {
    expect(rowNumbers({ row: 9, rows })).toBe(words);
  });

  it('says first what is wrong or was read otherwise, then what changes, then why a row is skipped', () => {
    const note = { code: 'read-as-blank', field: 'doseUl', column: 'F', cell: 'n/a', message: 'Read as blank.' };
    expect(remarkOf(row({ notes: [note] }), fields)).toBe('Read as blank.');
    const changed = row({ changes: [{ field: 'demandUlPer1000h', from: null, to: 400 }, { field: 'circuit', from: 'C2', to: 'C1' }] });
    expect(remarkOf(changed, fields)).toBe('Demand: blank to 0.4');
    expect(unsaid(changed)).toBe(1);
    expect(remarkOf(row({ why: 'totals' }), fields)).toBe('A row of totals');
    expect(remarkOf(row({}), fields)).toBe('');
  });
});
