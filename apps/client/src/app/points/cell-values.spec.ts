import { describe, expect, it } from 'vitest';
import { bulkEdits, NO_BULK_VALUES as nothing } from './bulk-changes';
import { cellInput, cellText, typedCell } from './cell-values';
import { changesOf, clearEdits, fillEdits, pasteEdits, refusalText } from './grid-changes';
import { aPointRow, contextOf } from './testing/point-row';

const row = aPointRow('GC1-L01');
const other = aPointRow('GC1-L02', { hoursPerDay: 12 }, { doseUl: 500, cartridgeUl: 80_000 });
const third = aPointRow('GC1-L03');
const context = contextOf([row, other, third]);

describe('cellText', () => {
  it('writes figures as the column wants them', () => {
    expect(cellText('doseUl', row, '1000h')).toBe('0.2');
    expect(cellText('cartridgeUl', row, '1000h')).toBe('160');
    expect(cellText('demand', row, '1000h')).toBe('50.0');
    expect(cellText('demand', row, 'running-day')).toBe('0.800');
    expect(cellText('interval', row, '1000h')).toBe('–');
  });
});

describe('typedCell', () => {
  it('turns what was typed into an edit of the row that holds it', () => {
    expect(typedCell('doseUl', '0,3', row, context)).toEqual({ ok: true, value: { collection: 'dispensers', id: 'd GC1-L01', values: { doseUl: 300 } } });
    expect(typedCell('hoursPerDay', '', row, context)).toEqual({ ok: true, value: { collection: 'points', id: 'GC1-L01', values: { hoursPerDay: null } } });
    expect(typedCell('demand', '2', row, { ...context, demandPer: 'week' }))
      .toMatchObject({ ok: true, value: { values: { demandWay: 'stated', statedUl: 2000, statedPer: 'week' } } });
  });
  it.each([
    ['doseUl', 'much', '“much” is not a number.'],
    ['doseUl', '0.25', 'A dose is a whole number of 0.1\u2009cm³ steps.'],
    ['doseUl', '9', 'The type gives 0.1 to 2.5\u2009cm³.'],
    ['cartridgeUl', '120', 'Cartridges of this type: 80, 160 cm³.'],
    ['tag', ' ', 'A point needs a tag.'],
    ['tag', 'GC1-L02', 'GC1-L02 is the tag of another point.'],
    ['hoursPerDay', '25', 'Enter more than 0 and at most 24 h.'],
    ['interval', '4', 'This column is computed; change what it comes from.'],
  ] as const)('refuses %s "%s" with its reason', (column, text, reason) => expect(typedCell(column, text, row, context)).toEqual({ ok: false, reason }));
  it('sends a demand from the bearing to where it is made', () => {
    expect(typedCell('demand', '5', aPointRow('B', { demandWay: 'bearing' }), context)).toMatchObject({ ok: false });
  });
  it('says that no dispenser is there', () => expect(typedCell('doseUl', '0.2', { ...row, dispenser: null }, context)).toMatchObject({ ok: false }));
  it('takes back what it gave for editing', () => {
    for (const column of ['tag', 'description', 'hoursPerDay', 'demand', 'doseUl', 'cartridgeUl'] as const) {
      expect(typedCell(column, cellInput(column, row, '1000h'), row, context)).toMatchObject({ ok: true });
    }
  });
});

describe('several cells', () => {
  it('fills down, leaving the first as it is', () => {
    const { edits } = fillEdits(row, 'doseUl', [row, other, third], context);
    expect(edits.map((e) => [e.id, e.values])).toEqual([['d GC1-L02', { doseUl: 200 }], ['d GC1-L03', { doseUl: 200 }]]);
  });
  it('puts a block in from the cell on, one change a row', () => {
    const result = pasteEdits([['16', '', '0.4', '80'], ['18', '', '0.5', '160']], [row], 'hoursPerDay', [row, other, third], context);
    expect(result.refusals).toEqual([]);
    expect(changesOf(result.edits).map((c) => [c.id, c.values])).toEqual([
      ['GC1-L01', { hoursPerDay: 16, statedUl: null }], ['d GC1-L01', { doseUl: 400, cartridgeUl: 80_000 }],
      ['GC1-L02', { hoursPerDay: 18, statedUl: null }], ['d GC1-L02', { doseUl: 500, cartridgeUl: 160_000 }],
    ]);
  });
  it('puts a single value into all rows of the range', () => {
    expect(pasteEdits([['0.4']], [row, other], 'doseUl', [row, other, third], context).edits).toHaveLength(2);
  });
  it('tells the first refusal and how many more there are', () => {
    const result = pasteEdits([['x'], ['9'], ['0.2']], [row], 'doseUl', [row, other, third], context);
    expect(refusalText(result)).toBe('GC1-L01, dose: “x” is not a number. 1 more cell cannot take it either.');
  });
  it('does not give one tag twice within a block', () => {
    expect(pasteEdits([['N1'], ['N1']], [row], 'tag', [row, other], context).refusals).toHaveLength(1);
  });
  it('does not blank a tag', () => expect(clearEdits([row], 'tag', context).refusals).toHaveLength(1));
});

describe('bulkEdits', () => {
  it('leaves alone what is blank', () => expect(bulkEdits([row, other], nothing).edits).toEqual([]));
  it('keeps the factors that are not named', () => {
    expect(bulkEdits([row], { ...nothing, factors: { moisture: 0.4 } }).edits[0]?.values).toEqual({ factors: { ...row.point.factors, moisture: 0.4 } });
  });
  it('takes the wiring of the new type and reads the dose against it', () => {
    const type = { ...row.type!, id: 't2', wiring: 'two-core' as const, doseMaxUl: 1000 };
    expect(bulkEdits([row], { ...nothing, type, dose: '1' }).edits[0]?.values).toEqual({ typeId: 't2', wiring: 'two-core', doseUl: 1000 });
    expect(bulkEdits([row], { ...nothing, type, dose: '2' }).refusals).toHaveLength(1);
  });
});
