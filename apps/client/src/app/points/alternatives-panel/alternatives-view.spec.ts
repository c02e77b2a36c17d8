import { describe, expect, it } from 'vitest';
import type { Project } from '#calc';
import { aPointRow } from '../testing/point-row';
import { alternativesView, changesInYear } from './alternatives-view';

const project: Project = {
  id: 'p', name: '', description: '', timeZone: 'UTC', voltageTempC: 40, tripTempC: 70, sparePercent: 20, supplyMarginPercent: 25,
  maxCartridgeDays: 365, minCartridgeDays: 120, maxOverGreasingPercent: 5, relayLifeYears: 10, slotMs: null, breakerDcFactor: 1.5,
  rankBy: 'fewest-changes', demandPer: '1000h',
};
const view = alternativesView(aPointRow('GC1-L01'), project, 'smallest-dose');

describe('alternativesView', () => {
  it('has a line for each cartridge and a cell for each dose', () => {
    expect(view.refusal).toBeNull();
    expect(view.lines.map((line) => line.cartridgeUl)).toEqual([80_000, 160_000]);
    expect(view.dosesUl[0]).toBe(100);
    expect(view.lines.every((line) => line.cells.length === view.dosesUl.length)).toBe(true);
  });
  it('finds what is set now, the first in rank and another', () => {
    expect(view.now).toMatchObject({ cartridgeUl: 160_000, doseUl: 200 });
    expect(view.first).toMatchObject({ cartridgeUl: 160_000, doseUl: 100, rank: 1 });
    expect(view.third).toMatchObject({ doseUl: 300 });
  });
  it('tells doses that fail alike together', () => {
    expect(view.rejected).toHaveLength(1);
    expect(view.rejected[0]?.what).toBe('80\u2009cm³, any dose');
  });
  it('hands on why there are none', () => {
    expect(alternativesView(aPointRow('X', { hoursPerDay: null }), project, 'least-over')).toMatchObject({ refusal: expect.stringContaining('hours'), now: null, lines: [] });
  });
  it('places the changes of a year', () => expect(changesInYear(146.1).map((part) => Math.round(part * 10) / 10)).toEqual([0.4, 0.8]));
});
