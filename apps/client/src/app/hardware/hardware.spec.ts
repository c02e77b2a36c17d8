import { describe, expect, it } from 'vitest';
import type { CableNode, Design } from '#calc';
import { treeRows } from './cable-tree';
import { nextFreeByte, nextName, nextSlot } from './rack';

const design = {
  moduleTypes: [
    { id: 'q16', kind: 'output', channels: 16 }, { id: 'q4', kind: 'output', channels: 4 }, { id: 'i16', kind: 'input', channels: 16 },
  ],
  modules: [
    { id: 'a', controllerId: 'c1', typeId: 'q16', baseByte: 4, slot: 0 }, { id: 'b', controllerId: 'c1', typeId: 'q4', baseByte: 8, slot: 1 },
    { id: 'c', controllerId: 'c1', typeId: 'i16', baseByte: 20, slot: 2 }, { id: 'd', controllerId: 'c2', typeId: 'q16', baseByte: 40, slot: 7 },
  ],
} as unknown as Design;

describe('the next place on a rack', () => {
  it('is the byte behind the last module of the kind on the controller', () => {
    expect(nextFreeByte(design, 'c1', 'output')).toBe(9);
    expect(nextFreeByte(design, 'c1', 'input')).toBe(22);
    expect(nextFreeByte(design, 'c2', 'input')).toBe(0);
  });

  it('is the slot behind the last module of any kind', () => {
    expect(nextSlot(design.modules, 'c1')).toBe(3);
    expect(nextSlot(design.modules, 'new')).toBe(0);
  });

  it('counts on from the commonest stem', () => {
    expect(nextName(['-KF4', '-KF12', '-A1'], '-KF1')).toBe('-KF13');
    expect(nextName([], '-KF1')).toBe('-KF1');
    expect(nextName(['spare'], '+K1')).toBe('+K1');
  });
});

const box = (location: string, parentId: string | null, lengthM = 10): CableNode =>
  ({ id: location, circuitId: 'c', parentId, location, cableTag: `-W${location}`, lengthM, powerMm2: 1.5, signalMm2: 0.75, conductorClass: 5 });

describe('the cable tree', () => {
  it('puts what hangs behind a box under it, brothers by location, with the metres summed', () => {
    const rows = treeRows([box('+JB10', null), box('+JB2', null, 5), box('+JB3', '+JB2', 7)]);
    expect(rows.map((r) => [r.node.location, r.guides, r.metres, r.feeds])).toEqual([
      ['+JB2', ['branch'], 5, true], ['+JB3', ['through', 'last'], 12, false], ['+JB10', ['last'], 10, false],
    ]);
  });

  it('shows every box once, also those in a loop or behind a box of another circuit', () => {
    const rows = treeRows([box('+A', '+B'), box('+B', '+A'), box('+C', 'elsewhere')]);
    expect(rows.map((r) => r.node.location).sort()).toEqual(['+A', '+B', '+C']);
  });
});
