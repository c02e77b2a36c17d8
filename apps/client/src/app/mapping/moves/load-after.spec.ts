import { assess } from '#calc';
import { largeDesign } from '#support/large-design';
import { describe, expect, it } from 'vitest';
import { boardOf } from '../board';
import { type Doable, planDrop } from './drop-plan';
import { isOver, loadsAfter, neededDesign } from './load-after';

const design = largeDesign(300);
const before = assess(design);
const board = boardOf(design);
const plan = planDrop(board, { dispenserIds: ['L0-0001', 'L0-0003'], purpose: 'control' }, { kind: 'channel', moduleId: 'DO1.5', channel: 4 }, false) as Doable;
const gone = new Set(plan.freed.map((row) => row.id));
const whole = assess({ ...design, assignments: [...design.assignments.filter((a) => !gone.has(a.id)), ...plan.placements.map((p, i) => ({ ...p, id: `new-${i}` }))] });

describe('loads after a plan', () => {
  it('are those of the whole design after it, for every place that it touches', () => {
    const loads = loadsAfter(board, before, plan);
    expect(loads.groups.map((g) => g.key).sort()).toEqual(['DO0.0/0', 'DO1.5/0']);
    for (const { key, beforeA, afterA } of loads.groups) {
      expect(afterA).toBe(whole.groups.get(key)?.worstA);
      expect(beforeA).toBe(before.groups.get(key)?.worstA);
    }
    for (const { key, afterA } of loads.circuits) expect(afterA).toBe(whole.circuits.get(key)?.worstA);
  });

  it('come from a copy with only the supplies that are touched', () => {
    expect(neededDesign(design, plan).dispensers).toHaveLength(128);
  });

  it('say where a rating is passed', () => {
    expect(isOver({ key: '', label: '', beforeA: 1, afterA: 2.1, ratingA: 2 })).toBe(true);
    expect(isOver({ key: '', label: '', beforeA: 1, afterA: 9, ratingA: null })).toBe(false);
  });
});
