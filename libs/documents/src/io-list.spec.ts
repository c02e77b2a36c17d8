import { assess, type Assignment, type Design, type Module } from '#calc';
import { buildDesign, buildLane, buildNode } from '#support/design-builder.ts';
import { describe, expect, it } from 'vitest';
import { IO_COLUMNS, type IoCell } from './io-columns.ts';
import { ioList } from './io-list.ts';
import { rangesOf } from './io-summary.ts';
import { naturalCompare } from './order.ts';

const module = (name: string, typeId: string, baseByte: number, slot: number): Module => ({ id: name, controllerId: 'controller', typeId, name, baseByte, slot });
const control = (dispenserId: string, moduleId: string, channel: number): Assignment => ({ id: `${dispenserId} out`, dispenserId, moduleId, channel, purpose: 'control' });

const design: Design = buildDesign({
  modules: [module('DO10', 'out-16', 8, 2), module('DO2', 'out-16', 6, 1), module('DI1', 'in-16', 4, 3)],
  cableNodes: [buildNode()],
  lanes: [
    buildLane('P-03', { nodeId: 'box' }, { product: '-M3', statedUl: 12_345 }),
    buildLane('P-10', { doseUl: null, controllerId: null }, { statedUl: null }),
    buildLane('P-02', {}, { statedPer: '100h', statedUl: 6500 }),
    buildLane('P-01', { typeId: 'type-2', wiring: 'two-core' }),
  ],
  assignments: [control('P-03', 'DO10', 0), control('P-02', 'DO2', 5), control('P-01', 'DO2', 3),
    { id: 's', dispenserId: 'P-03', moduleId: 'DI1', channel: 0, purpose: 'status' }],
});
const list = ioList(design, assess(design), '2026-05-04');

/** Cells of a row by the key of their column. */
const cellsOf = (tag: string): Record<string, IoCell> => {
  const row = list.rows.find(([first]) => first === tag)!;
  return Object.fromEntries(IO_COLUMNS.map(({ key }, i) => [key, row[i]]));
};

describe('ioList', () => {
  it('follows cabinet, controller, module and channel; points without a channel come last', () => {
    expect(list.rows.map(([tag]) => tag)).toEqual(['P-01', 'P-02', 'P-03', 'P-10']);
  });

  it('has one row a point with output and status beside each other', () => {
    expect(cellsOf('P-03')).toMatchObject({
      controller: 'PLC1', outputModule: 'DO10', outputChannel: 0, outputAddress: '%QX8.0', statusModule: 'DI1', statusChannel: 0, statusAddress: '%IX4.0',
      junctionBox: '+JB1', product: '-M3',
    });
  });

  it('states a demand in the column of its own unit only', () => {
    expect(cellsOf('P-03')).toMatchObject({ demandCm3Per100h: null, demandCm3Per1000h: 12.345 });
    expect(cellsOf('P-02')).toMatchObject({ demandCm3Per100h: 6.5, demandCm3Per1000h: null });
  });

  it('rounds derived figures as the screens do: voltages down, loads up', () => {
    const figures = assess(design).lanes.get('P-01')!;
    const { worstVoltage, channelLoad, margin } = cellsOf('P-01');
    expect(worstVoltage).toBe(Math.floor(figures.worst!.volts * 10 + 1e-6) / 10);
    expect(margin).toBeCloseTo(Math.floor((figures.worst!.volts - 18) * 10 + 1e-6) / 10, 9);
    expect(channelLoad).toBe(280);
    expect(cellsOf('P-02')).toMatchObject({ demand: 65, interval: '7 h 41', findings: 'MP-02, MP-04' });
  });

  it('keeps what has no controller on a sheet of its own', () => {
    expect(list.sheets.map(({ cabinet, rows }) => [cabinet, rows.length])).toEqual([['+K1', 3], [null, 1]]);
  });

  it('says its state, the free channels of each module and the cautions', () => {
    expect(list).toMatchObject({ state: 'Draft, not for construction', date: '2026-05-04', project: 'Test project' });
    expect(list.summary.modules.map(({ module: name, used, free, freeChannels }) => [name, used, free, freeChannels])).toEqual([
      ['DO2', 2, 14, '0–2, 4, 6–15'], ['DO10', 1, 15, '1–15'], ['DI1', 1, 15, '1–15'],
    ]);
    expect(list.summary.counts.map(({ value }) => value)).toEqual([4, 4, 3, 1, 1]);
    expect(list.cautions.length).toBeGreaterThan(4);
  });

  it('names each heading once', () => {
    expect(new Set(IO_COLUMNS.map(({ heading }) => heading)).size).toBe(IO_COLUMNS.length);
  });
});

describe('naturalCompare', () => {
  it('counts numbers inside names', () => {
    expect(['DO10', 'DO2', 'do1', 'DI1'].sort(naturalCompare)).toEqual(['DI1', 'do1', 'DO2', 'DO10']);
  });
});

describe('rangesOf', () => {
  it.each([[[], ''], [[3], '3'], [[0, 1, 2, 5, 7, 8], '0–2, 5, 7–8']] as const)('%j is “%s”', (numbers, text) => {
    expect(rangesOf(numbers)).toBe(text);
  });
});
