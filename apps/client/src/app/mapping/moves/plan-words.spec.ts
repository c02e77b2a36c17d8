import { assess, type Design, THIN_SPACE } from '#calc';
import { buildAssignment, buildDesign, buildInputType, buildLane, buildModule, buildOutputType } from '#support/design-builder';
import { describe, expect, it } from 'vitest';
import { type Board, boardOf } from '../board';
import { type Doable, type DropPlan, planDrop } from './drop-plan';
import { type Cargo, type DropTarget, UNMAPPED } from './drop-target';
import { loadsAfter } from './load-after';
import { cargoWords, doneWords, ghostsOf, planWords, stopWords } from './plan-words';

const DO1 = buildModule({ id: 'DO1', name: 'DO1', baseByte: 4 });
const DI1 = buildModule({ id: 'DI1', name: 'DI1', typeId: 'in-16', slot: 2, baseByte: 4 });
const twoCore = (name: string) => buildLane(name, { typeId: 'type-2', wiring: 'two-core' });
const design = (assignments: Design['assignments'] = []): Design => buildDesign({
  lanes: ['P-01', 'P-02', 'P-03'].map(twoCore), moduleTypes: [buildOutputType(), buildInputType()], modules: [DO1, DI1], assignments,
});
const at = (channel: number): DropTarget => ({ kind: 'channel', moduleId: 'DO1', channel });
const spoken = (board: Board, cargo: Cargo, target: DropTarget, withStatus = false): string => {
  const plan = planDrop(board, cargo, target, withStatus);
  return stopWords(board, cargo, target, plan, plan.kind === 'refused' ? null : loadsAfter(board, assess(board.design), plan)).replaceAll(THIN_SPACE, ' ');
};
const one: Cargo = { dispenserIds: ['P-01'], purpose: null };

describe('words of a move', () => {
  it('say where it is, that it is free, what Enter does and the load after it', () => {
    const board = boardOf(design());
    const plc = board.modules[0].controller.name;
    expect(spoken(board, one, at(4))).toBe(`P-01 over ${plc} DO1 channel 4, %QX4.4, free. Enter places it. Group load 0.28 A of 2.00 A.`);
  });

  it('say with whom it would be swapped', () => {
    const board = boardOf(design([buildAssignment('P-01', 'DO1', 0), buildAssignment('P-02', 'DO1', 1)]));
    expect(spoken(board, { dispenserIds: ['P-01'], purpose: 'control' }, at(1))).toContain('Enter swaps with P-02.');
  });

  it('say why it is not possible', () => {
    const board = boardOf(design([buildAssignment('P-02', 'DO1', 0)]));
    expect(spoken(board, one, at(0))).toContain('Not possible: Channel taken: %QX4.0 holds P-02.');
  });

  it('count many, and name the first and last channel', () => {
    const board = boardOf(design());
    const cargo: Cargo = { dispenserIds: ['P-01', 'P-02', 'P-03'], purpose: null };
    expect(cargoWords(board, cargo)).toBe('P-01 and 2 more');
    expect(planWords(board, planDrop(board, cargo, at(2), false), at(2))).toBe('Fills 3 channels, %QX4.2 to %QX4.4.');
  });

  it('tell what was done', () => {
    const board = boardOf(design([buildAssignment('P-02', 'DO1', 1)]));
    const said = (cargo: Cargo, target: DropTarget): string => doneWords(board, planDrop(board, cargo, target, false) as Doable, target, null);
    expect(said(one, at(0))).toBe('P-01 placed on %QX4.0.');
    expect(said({ dispenserIds: ['P-02'], purpose: 'control' }, at(0))).toBe('P-02 moved to %QX4.0.');
    expect(said({ dispenserIds: ['P-02'], purpose: 'control' }, UNMAPPED)).toBe('P-02 unmapped.');
  });

  it('show ghosts on the channels that would be given', () => {
    const board = boardOf(design());
    expect([...ghostsOf(board, planDrop(board, one, at(5), false))]).toEqual([['DO1:5', 'P-01']]);
    expect(ghostsOf(board, { kind: 'refused', reason: '' } satisfies DropPlan).size).toBe(0);
  });
});
