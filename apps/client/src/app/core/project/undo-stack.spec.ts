import { describe, expect, it } from 'vitest';
import { UndoStack } from './undo-stack';

const set = (id: string) => ({ id, summary: `Set ${id}` });

describe('UndoStack', () => {
  it('gives the latest first, and what was undone back in turn', () => {
    const stack = new UndoStack();
    for (const id of ['a', 'b', 'c']) stack.push(set(id));
    stack.moved('undo', set('c'), set('c undone'));
    stack.moved('undo', set('b'), set('b undone'));
    expect([stack.undo()?.id, stack.redo()?.id]).toEqual(['a', 'b undone']);
    stack.moved('redo', set('b undone'), set('b again'));
    expect([stack.undo()?.id, stack.redo()?.id]).toEqual(['b again', 'c undone']);
  });

  it('forgets what was undone with the next edit', () => {
    const stack = new UndoStack();
    stack.push(set('a'));
    stack.moved('undo', set('a'), set('a undone'));
    stack.push(set('b'));
    expect([stack.next('undo')?.id, stack.next('redo')]).toEqual(['b', null]);
  });

  it('drops what cannot be taken back, wherever it stands', () => {
    const stack = new UndoStack();
    for (const id of ['a', 'b']) stack.push(set(id));
    stack.drop(set('a'));
    stack.moved('undo', set('b'), set('b undone'));
    stack.drop(set('b undone'));
    expect([stack.undo(), stack.redo()]).toEqual([null, null]);
  });

  it('takes an undo of a set that is not its own: redo is the way back', () => {
    const stack = new UndoStack();
    stack.push(set('a'));
    stack.moved('undo', set('of somebody else'), set('undone'));
    expect([stack.undo()?.id, stack.redo()?.id]).toEqual(['a', 'undone']);
  });
});
