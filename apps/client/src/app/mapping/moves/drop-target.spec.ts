import { describe, expect, it } from 'vitest';
import type { GroupSection } from '../mapping-rows';
import { carryAct } from './carry-keys';
import { edgeSpeed, farEnough } from './drag-rules';
import { type DropTarget, nextGroup, stepped, stopsOf, targetKey, targetOf, UNMAPPED } from './drop-target';

const section = (key: string, rows: readonly string[]) => ({ key, channels: rows.map((row) => ({ key: row })) }) as unknown as GroupSection;
const sections = [section('m/0', ['m:0', 'm:1']), section('m/1', ['m:8'])];

describe('targets', () => {
  it.each<DropTarget>([
    { kind: 'channel', moduleId: '01-a', channel: 12 }, { kind: 'group', moduleId: '01-a', groupIndex: 1 }, { kind: 'module', moduleId: '01-a' }, UNMAPPED,
  ])('are read back from their key: $kind', (target) => {
    expect(targetOf(targetKey(target))).toEqual(target);
  });

  it('are stepped through in order, heads and channels, and not beyond the ends', () => {
    const stops = stopsOf(sections);
    expect(stops).toEqual(['m/0', 'm:0', 'm:1', 'm/1', 'm:8']);
    expect([stepped(stops, 'm:1', 1), stepped(stops, 'm/0', -1), stepped(stops, 'm:8', 1)]).toEqual(['m/1', 'm/0', 'm:8']);
  });

  it('are stepped through by group: back goes to the own head first', () => {
    expect([nextGroup(sections, 'm:1', 1), nextGroup(sections, 'm:8', -1), nextGroup(sections, 'm/1', -1), nextGroup(sections, 'm/1', 1)]).toEqual(['m/1', 'm/1', 'm/0', 'm/1']);
  });

  it('are reached by keys that mean nothing else while something is carried', () => {
    expect(['ArrowUp', 'PageDown', 'Enter', 'Escape', 'Delete', 'x'].map((key) => carryAct({ key })?.kind)).toEqual(['step', 'group', 'drop', 'cancel', 'unmap', undefined]);
  });
});

describe('dragging', () => {
  it('begins after a few pixels, a trembling finger allowed more', () => {
    expect(farEnough({ x: 0, y: 0 }, { x: 0, y: 6 }, false)).toBe(true);
    expect(farEnough({ x: 0, y: 0 }, { x: 0, y: 6 }, true)).toBe(false);
  });

  it('scrolls at the edges, faster the nearer, and not between', () => {
    expect(edgeSpeed(300, 0, 600)).toBe(0);
    expect(edgeSpeed(2, 0, 600)).toBeLessThan(edgeSpeed(30, 0, 600));
    expect(edgeSpeed(599, 0, 600)).toBeGreaterThan(edgeSpeed(570, 0, 600));
  });
});
