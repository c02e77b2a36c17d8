import type { Design } from '#calc';
import { buildAssignment, buildDesign, buildInputType, buildLane, buildModule, buildOutputType } from '#support/design-builder';
import { describe, expect, it } from 'vitest';
import { type Board, boardOf } from '../board';
import { changesOf, type Doable, type DropPlan, planDrop, planFreeing, planSwap } from './drop-plan';
import { type Cargo, type DropTarget, UNMAPPED } from './drop-target';

const DO1 = buildModule();
const DO2 = buildModule({ id: 'DO2', name: 'DO2', slot: 2, baseByte: 6 });
const DI1 = buildModule({ id: 'DI1', name: 'DI1', typeId: 'in-16', slot: 3, baseByte: 4 });
const OTHER = buildModule({ id: 'far', name: 'DO9', controllerId: 'PLC9', slot: 1, baseByte: 8 });
const names = ['P-01', 'P-02', 'P-03', 'P-04', 'P-05'];

function boardWith(assignments: Design['assignments'] = [], lanes = names.map((name) => buildLane(name))): Board {
  const design = buildDesign({ lanes, moduleTypes: [buildOutputType(), buildInputType()], modules: [DO1, DO2, DI1, OTHER], assignments });
  const [controller] = design.controllers;
  return boardOf({ ...design, controllers: [controller, { ...controller, id: 'PLC9', name: 'PLC9' }] });
}
const channel = (at: number, moduleId = DO1.id): DropTarget => ({ kind: 'channel', moduleId, channel: at });
const open = (...dispenserIds: string[]): Cargo => ({ dispenserIds, purpose: null });
const mapped = (...dispenserIds: string[]): Cargo => ({ dispenserIds, purpose: 'control' });
const reason = (plan: DropPlan): string => (plan.kind === 'refused' ? plan.reason : `not refused: ${plan.kind}`);
const places = (plan: DropPlan): readonly string[] => (plan as Doable).placements.map((p) => `${p.dispenserId} ${p.moduleId}:${p.channel} ${p.purpose}`);

describe('dropping those that are not mapped', () => {
  it('puts one on the channel under it', () => {
    const plan = planDrop(boardWith(), open('P-01'), channel(3), false);
    expect(places(plan)).toEqual([`P-01 ${DO1.id}:3 control`]);
    expect((plan as Doable).summary).toBe('Mapping of P-01');
  });

  it('puts the others on the next free channels, over the end of the module', () => {
    const board = boardWith([buildAssignment('P-05', DO1.id, 15)]);
    expect(places(planDrop(board, open('P-01', 'P-02', 'P-03'), channel(14), false))).toEqual([
      `P-01 ${DO1.id}:14 control`, 'P-02 DO2:0 control', 'P-03 DO2:1 control',
    ]);
  });

  it('fills a group in order, and refuses where it has too few free channels', () => {
    const board = boardWith([buildAssignment('P-05', DO1.id, 9)]);
    const group: DropTarget = { kind: 'group', moduleId: DO1.id, groupIndex: 1 };
    expect(places(planDrop(board, open('P-01', 'P-02'), group, false))).toEqual([`P-01 ${DO1.id}:8 control`, `P-02 ${DO1.id}:10 control`]);
    const full = boardWith([2, 3, 4, 5, 6, 7].map((at, i) => buildAssignment(`X-${i}`, DO1.id, at)), [...names, 'X-0', 'X-1', 'X-2', 'X-3', 'X-4', 'X-5'].map((n) => buildLane(n)));
    expect(reason(planDrop(full, open(...names), { kind: 'group', moduleId: DO1.id, groupIndex: 0 }, false))).toBe('Not enough free channels: 2 of 5.');
  });

  it('says who holds a taken channel', () => {
    expect(reason(planDrop(boardWith([buildAssignment('P-05', DO1.id, 0)]), open('P-01'), channel(0), false))).toMatch(/^Channel taken: %QX\d+\.0 holds P-05\.$/);
  });

  it('refuses a module of another controller and names both', () => {
    expect(reason(planDrop(boardWith(), open('P-01'), channel(0, 'far'), false))).toMatch(/^P-01 belongs to .+; this is a module of PLC9\.$/);
  });

  it('leaves out those that do not lack the signal and says why', () => {
    const board = boardWith([buildAssignment('P-02', DO1.id, 8)]);
    const plan = planDrop(board, open('P-01', 'P-02'), channel(0), false);
    expect(places(plan)).toEqual([`P-01 ${DO1.id}:0 control`]);
    expect((plan as Doable).leftOut).toEqual([expect.stringMatching(/^P-02 has its output already, on %QX\d+\.0\.$/)]);
    const timed = boardWith([], [buildLane('T-1', { method: 'timed' })]);
    expect(reason(planDrop(timed, open('T-1'), channel(0), false))).toBe('T-1 runs on its own clock and takes no output.');
  });

  it('gives status inputs in the same order where they follow', () => {
    const board = boardWith([buildAssignment('P-05', 'DI1', 0, 'status')]);
    expect(places(planDrop(board, open('P-01', 'P-02'), channel(0), true))).toEqual([
      `P-01 ${DO1.id}:0 control`, `P-02 ${DO1.id}:1 control`, 'P-01 DI1:1 status', 'P-02 DI1:2 status',
    ]);
  });

  it('has nothing to unmap', () => {
    expect(reason(planDrop(boardWith(), open('P-01'), UNMAPPED, false))).toBe('These are not mapped.');
  });
});

describe('dropping those that are mapped', () => {
  const held = [buildAssignment('P-01', DO1.id, 0), buildAssignment('P-02', DO1.id, 1), buildAssignment('P-03', DO1.id, 2)];

  it('moves one: the old row goes before the new one comes', () => {
    const plan = planDrop(boardWith(held), mapped('P-01'), channel(9), false) as Doable;
    expect(plan.kind).toBe('move');
    expect(changesOf(plan).map((c) => c.op)).toEqual(['delete', 'create']);
    expect(plan.summary).toBe('Move of P-01');
  });

  it('moves several by one channel: those that they leave count as free', () => {
    expect(places(planDrop(boardWith(held), mapped('P-01', 'P-02', 'P-03'), channel(1), false))).toEqual([
      `P-01 ${DO1.id}:1 control`, `P-02 ${DO1.id}:2 control`, `P-03 ${DO1.id}:3 control`,
    ]);
  });

  it('swaps with the one that holds the channel: both rows go, then both come', () => {
    const plan = planDrop(boardWith(held), mapped('P-01'), channel(2), false) as Doable;
    expect(plan.kind).toBe('swap');
    expect(plan.summary).toBe('Swap of P-01 and P-03');
    expect(places(plan)).toEqual([`P-01 ${DO1.id}:2 control`, `P-03 ${DO1.id}:0 control`]);
    expect(changesOf(plan).map((c) => c.op)).toEqual(['delete', 'delete', 'create', 'create']);
  });

  it('swaps status inputs too where they follow and both have one', () => {
    const both = [...held, buildAssignment('P-01', 'DI1', 4, 'status'), buildAssignment('P-03', 'DI1', 7, 'status')];
    expect(places(planSwap(boardWith(both), 'P-01', 'P-03', 'control', true)).slice(2)).toEqual(['P-01 DI1:7 status', 'P-03 DI1:4 status']);
    expect(places(planSwap(boardWith(both), 'P-01', 'P-02', 'control', true))).toHaveLength(2);
  });

  it('does nothing on its own channel, and refuses the wrong kind of module', () => {
    expect(reason(planDrop(boardWith(held), mapped('P-01'), channel(0), false))).toBe('It is there already.');
    expect(reason(planDrop(boardWith(held), mapped('P-01'), channel(0, 'DI1'), false))).toMatch(/^A control pulse needs an output; .+ DI1 is an input module\.$/);
  });

  it('unmaps, the status inputs too where they follow', () => {
    const board = boardWith([...held, buildAssignment('P-01', 'DI1', 4, 'status')]);
    expect((planDrop(board, mapped('P-01'), UNMAPPED, false) as Doable).freed).toHaveLength(1);
    const plan = planFreeing(board, held.slice(0, 2), true) as Doable;
    expect(plan.freed.map((row) => `${row.dispenserId} ${row.purpose}`)).toEqual(['P-01 control', 'P-02 control', 'P-01 status']);
    expect(plan.summary).toBe('Unmapping of 2 dispensers');
  });
});
