import { assess } from '#calc';
import { buildAssignment, buildDesign, buildLane, buildModule, buildOutputType } from '#support/design-builder';
import { describe, expect, it } from 'vitest';
import { boardOf } from '../board';
import type { Doable } from './drop-plan';
import { inOrder, planFill } from './fill-order';
import { firstTarget } from './first-target';

const DO1 = buildModule({ id: 'DO1', name: 'DO1', baseByte: 4 });
const lanes = [
  buildLane('B-10', { cableLengthM: 5 }, { machine: 'Elevator', location: '+Q2' }), buildLane('B-2', { cableLengthM: 40 }, { machine: 'Conveyor', location: null }),
  buildLane('A-1', { cableLengthM: null }, { machine: 'Elevator', location: '+Q1' }),
];
const design = buildDesign({ lanes, moduleTypes: [buildOutputType()], modules: [DO1], assignments: [] });
const board = boardOf(design);
const ids = lanes.map((lane) => lane.dispenser.id);

describe('filling in order', () => {
  it.each([
    ['tag', ['A-1', 'B-2', 'B-10']],
    ['machine', ['B-2', 'A-1', 'B-10']],
    ['location', ['A-1', 'B-10', 'B-2']],
    ['run-length', ['B-10', 'B-2', 'A-1']],
  ] as const)('orders by %s, tags by value, what is not known last', (order, wanted) => {
    expect(inOrder(board, assess(design), ids, order)).toEqual(wanted);
  });

  it('places as many as fit and says who stays', () => {
    const taken = Array.from({ length: 7 }, (_, i) => buildAssignment(`X-${i}`, 'DO1', i));
    const full = boardOf({ ...design, assignments: taken });
    const fill = planFill(full, ids, { kind: 'group', moduleId: 'DO1', groupIndex: 0 }, false);
    expect((fill.plan as Doable).placements.map((p) => [p.dispenserId, p.channel])).toEqual([['B-10', 7]]);
    expect(fill.staying).toEqual(['B-2', 'A-1']);
  });

  it('begins where it is mapped, else on the first free channel', () => {
    expect(firstTarget(board, { dispenserIds: ['B-2'], purpose: null }, 'output')?.key).toBe('DO1:0');
    const held = boardOf({ ...design, assignments: [buildAssignment('B-2', 'DO1', 6)] });
    expect(firstTarget(held, { dispenserIds: ['B-2'], purpose: 'control' }, 'output')?.key).toBe('DO1:6');
  });
});
