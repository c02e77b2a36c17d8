import { describe, expect, it } from 'vitest';
import {
  ampsAgainstMaximum, ampsAgainstMinimum, demandFigure, figureParts, formatAmps, formatCount, formatDays, formatDemand, formatDuration,
  formatHours, formatInterval, formatMetres, formatNumber, formatPercent, formatSection, formatVolts, formatVolume, voltsAgainstMaximum, voltsAgainstMinimum,
} from './format.ts';

const thin = (text: string) => text.replaceAll('_', '\u2009');

describe('numbers', () => {
  it.each([
    [1250, undefined, '1,250'], [999, undefined, '999'], [1_234_567.5, undefined, '1,234,567.5'], [-3.25, 1, '−3.3'],
    [-0.01, 1, '0.0'], [0.000_000_1, undefined, '0.0000001'], [12.345, 2, '12.35'], [24.1, 1, '24.1'],
  ])('%s to %s decimals is %s', (value, decimals, text) => {
    expect(formatNumber(value, decimals)).toBe(text);
  });

  it('writes an en dash for nothing, without a unit', () => {
    expect([formatVolume(null), formatVolts(undefined), formatAmps(Number.NaN), formatInterval(null), formatDemand(null), formatCount(Infinity)])
      .toEqual(['–', '–', '–', '–', '–', '–']);
  });
});

describe('rounding toward the limit', () => {
  it('takes volts down against a minimum and up against a maximum', () => {
    expect([voltsAgainstMinimum(20.99), voltsAgainstMaximum(20.91), formatVolts(20.94)]).toEqual(['20.9_V', '21.0_V', '20.9_V'].map(thin));
  });

  it('leaves a value on its step, whatever its binary form', () => {
    expect([voltsAgainstMinimum(24.1), voltsAgainstMinimum(24 + 0.1), voltsAgainstMaximum(0.1 + 0.2), voltsAgainstMinimum(20.4)])
      .toEqual(['24.1_V', '24.1_V', '0.3_V', '20.4_V'].map(thin));
  });

  it('takes amperes up against a maximum and down against a minimum', () => {
    expect([ampsAgainstMaximum(1.671), ampsAgainstMinimum(1.679), ampsAgainstMaximum(0.0081), ampsAgainstMaximum(0.0121)])
      .toEqual(['1.68_A', '1.67_A', '8.1_mA', '13_mA'].map(thin));
  });

  it('changes to amperes from 0.1 A, also when rounding gets there', () => {
    expect([formatAmps(0.1), ampsAgainstMaximum(0.0996), formatAmps(0.099), formatAmps(0)]).toEqual(['0.10_A', '0.10_A', '99_mA', '0_mA'].map(thin));
  });
});

describe('figures with units', () => {
  it.each([
    [formatVolume(200), '0.2_cm³'], [formatVolume(120_000), '120.0_cm³'], [formatDemand(46_000), '46.0_cm³/1,000\u00a0h'],
    [formatInterval(12_000_000), '3_h_20'], [formatInterval(14_400_000), '4_h_00'], [formatInterval(3_300_000), '55_min'],
    [formatInterval(40_900), '40_s'], [formatInterval(800), '0.8_s'], [formatDuration(15_652_173), '4_h 20_min 52.173_s'],
    [formatHours(8_640_000_000), '2,400_h'], [formatDays(108.7), '108_d'], [formatPercent(0.33), '0.3_%'],
    [formatMetres(34.04), '34_m'], [formatSection(0.75), '0.75_mm²'],
  ])('%s', (text, expected) => {
    expect(text).toBe(thin(expected));
  });

  it('shows a demand in the unit asked for', () => {
    expect([demandFigure(46_000, '1000h', 16, 6), demandFigure(46_000, '100h', 16, 6), demandFigure(46_000, 'running-day', 16, 6), demandFigure(46_000, 'week', 16, 6), demandFigure(46_000, 'week', null, 6)])
      .toEqual(['46.0', '4.60', '0.736', '4.42', '–']);
  });

  it('takes a text apart into figure and unit', () => {
    expect([formatVolume(200), formatDemand(46_000), formatInterval(12_000_000), '–'].map(figureParts)).toEqual([
      { figure: '0.2', unit: 'cm³' }, { figure: '46.0', unit: 'cm³/1,000\u00a0h' }, { figure: thin('3_h_20'), unit: '' }, { figure: '–', unit: '' },
    ]);
  });
});
