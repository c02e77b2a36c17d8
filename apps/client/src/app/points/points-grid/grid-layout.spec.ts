import { describe, expect, it } from 'vitest';
import { gridLines, groupedRows } from '../point-rows';
import { aPointRow } from '../testing/point-row';
import { columnTemplate, rowsInView } from './grid-layout';

const lines = gridLines(groupedRows([
  aPointRow('A1'), aPointRow('A2'), aPointRow('B1', { function: '=T1.GL2' }), aPointRow('B2', { function: '=T1.GL2' }),
]));

describe('rowsInView', () => {
  it('counts points, not the heads of groups', () => {
    expect(rowsInView(lines, { top: 0, height: 28 * 4 }, 28)).toEqual({ first: 1, last: 2 });
    expect(rowsInView(lines, { top: 28 * 2, height: 28 * 3 }, 28)).toEqual({ first: 2, last: 3 });
    expect(rowsInView(lines, { top: 0, height: 9999 }, 28)).toEqual({ first: 1, last: 4 });
  });
  it('says none where there is none', () => expect(rowsInView([], { top: 0, height: 500 }, 28)).toEqual({ first: 0, last: 0 }));
});

describe('columnTemplate', () => {
  it('fits the longest tag up to a limit', () => {
    expect(columnTemplate(['A'.repeat(10)]).frozenPx).toBe(44 + 88);
    expect(columnTemplate(['A'.repeat(99)]).frozenPx).toBe(44 + 190);
  });
});
