import { describe, expect, it } from 'vitest';
import { filteredRows, gridLines, groupedRows, nextWithFinding, rangeOf } from './point-rows';
import { aPointRow } from './testing/point-row';
import type { Finding } from '#calc';

const finding = { code: 'PL-15', severity: 'warning', title: 'Stays 400 d' } as Finding;
const rows = [
  aPointRow('GC1-L01'), aPointRow('GC1-L02', { hoursPerDay: 12 }), { ...aPointRow('GC2-L01', { function: '=T1.GL10' }), findings: [finding] },
  aPointRow('GC3-L01', { function: '=T1.GL2', machine: 'Gallery conveyor 2', daysPerWeek: 6 }), aPointRow('X', { function: null, machine: null }),
];

describe('groupedRows', () => {
  const groups = groupedRows(rows);
  it('groups by function designation in natural order, those without one last', () => {
    expect(groups.map((g) => g.designation)).toEqual(['=T1.GL1', '=T1.GL2', '=T1.GL10', '']);
    expect(groups.at(-1)?.machine).toBe('Without function designation');
  });
  it('says what the points of a group have in common', () => {
    expect(groups[0]?.note).toBe('hours differ, +K1, circuit C1');
    expect(groups[1]).toMatchObject({ machine: 'Gallery conveyor 2', note: '16 h on 6 days a week, +K1, circuit C1' });
  });
  it('gives a line to each group and each point', () => expect(gridLines(groups)).toHaveLength(9));
});

describe('rows', () => {
  it('are filtered by every word and by having a finding', () => {
    expect(filteredRows(rows, 'gc1 l02', false)).toHaveLength(1);
    expect(filteredRows(rows, '', true).map((r) => r.point.tag)).toEqual(['GC2-L01']);
  });
  it('make a range in either direction', () => {
    expect(rangeOf(rows, 'GC2-L01', 'GC1-L02')).toEqual(['GC1-L02', 'GC2-L01']);
    expect(rangeOf(rows, 'gone', 'GC1-L02')).toEqual([]);
  });
  it('lead to the next finding, round at the end', () => {
    expect(nextWithFinding(rows, 'X')?.point.tag).toBe('GC2-L01');
    expect(nextWithFinding(rows, 'GC2-L01')?.point.tag).toBe('GC2-L01');
    expect(nextWithFinding([rows[0]], null)).toBeNull();
  });
});
