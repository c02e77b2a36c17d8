import type { HistoryEntry } from '#contract';
import type { Direction, OwnSet } from '../core/project/undo-stack';
import { dayAndTime } from '../shared/words/day-and-time';

/** What can be done about an entry: a set to be taken back, which undoes the edit or makes it again. */
export interface EntryAct {
  readonly direction: Direction;
  readonly label: 'Undo' | 'Redo';
  readonly set: OwnSet;
}

export interface EntryView {
  readonly entry: HistoryEntry;
  readonly when: string;
  /** Its act, or null where the entry that it is about has it. */
  readonly act: EntryAct | null;
  /** "Undone by Ada Brandt, 1 Dec 2026, 14:03"; empty where it stands. */
  readonly undone: string;
}

/** An entry of the history, with the undo or redo that fits how it stands. */
export function entryView(entry: HistoryEntry): EntryView {
  const { undoneBy } = entry;
  const again = isUndo(entry) ? 'Redone' : 'Undone';
  return { entry, when: dayAndTime(entry.at), act: actOf(entry), undone: undoneBy ? `${again} by ${undoneBy.by}, ${dayAndTime(undoneBy.at)}` : '' };
}

function actOf(entry: HistoryEntry): EntryAct | null {
  const summary = entry.summary.replace(/^(Undone|Redone): /, entry.undoes ? '' : '$&');
  // An undo that was redone: the edit stands again and has the button.
  if (entry.undoneBy && entry.undoes) return null;
  if (entry.undoneBy) return { direction: 'redo', label: 'Redo', set: { id: entry.undoneBy.id, summary } };
  const set = { id: entry.id, summary };
  return isUndo(entry) ? { direction: 'redo', label: 'Redo', set } : { direction: 'undo', label: 'Undo', set };
}

/** The server names undos and redos so. */
const isUndo = ({ undoes, summary }: HistoryEntry): boolean => undoes !== null && summary.startsWith('Undone: ');
