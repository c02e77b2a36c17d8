import type { HistoryEntry } from '#contract';
import { describe, expect, it } from 'vitest';
import { entryView } from './entry-view';

const entry = (part: Partial<HistoryEntry>): HistoryEntry => ({
  id: 'own', sequence: 3, at: '2026-12-01T14:03:00.000Z', by: 'Ada Brandt', summary: 'Dose of GC1-L01', rows: 1, undoes: null, undoneBy: null, ...part,
});
const by = { id: 'later', at: '2026-12-01T15:00:00.000Z', by: 'Ben Osei' };

describe('an entry of the history', () => {
  it('that stands can be undone', () => {
    expect(entryView(entry({}))).toMatchObject({ act: { label: 'Undo', set: { id: 'own', summary: 'Dose of GC1-L01' } }, undone: '' });
  });

  it('that is undone says by whom, and its undo is what a redo takes back', () => {
    const view = entryView(entry({ undoneBy: by }));
    expect(view.undone).toMatch(/^Undone by Ben Osei, 1 Dec 2026/);
    expect(view.act).toEqual({ direction: 'redo', label: 'Redo', set: { id: 'later', summary: 'Dose of GC1-L01' } });
  });

  it('that is an undo offers the redo, without its own prefix', () => {
    expect(entryView(entry({ undoes: 'first', summary: 'Undone: Dose of GC1-L01' })).act).toEqual({ direction: 'redo', label: 'Redo', set: { id: 'own', summary: 'Dose of GC1-L01' } });
  });

  it('that is a redo offers the undo', () => {
    expect(entryView(entry({ undoes: 'second', summary: 'Redone: Dose of GC1-L01' })).act).toMatchObject({ label: 'Undo', set: { id: 'own', summary: 'Dose of GC1-L01' } });
  });

  it('that is an undo which was redone leaves the button to the edit', () => {
    const view = entryView(entry({ undoes: 'first', summary: 'Undone: Dose of GC1-L01', undoneBy: by }));
    expect(view.act).toBeNull();
    expect(view.undone).toMatch(/^Redone by Ben Osei/);
  });

  it('whose own words begin like an undo keeps them', () => {
    expect(entryView(entry({ summary: 'Undone: bolts at GC1' })).act?.set.summary).toBe('Undone: bolts at GC1');
  });
});
