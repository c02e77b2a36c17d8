import type { RowChange } from '#contract';

type Values = Readonly<Record<string, unknown>>;

/** What a set does to one row, as a person thinks of it. */
export interface ModelChange {
  readonly id: string;
  readonly collection: 'points' | 'dispensers';
  readonly op: RowChange['op'];
  readonly values: Values;
}

interface ModelSet {
  readonly id: string;
  readonly changes: readonly ModelChange[];
}

/** A set of the history: an edit, or the undo of another set. */
interface Entry extends ModelSet {
  readonly root: ModelSet;
}

/**
 * The history as a list of edits, each of which stands or is taken back. The design is what the standing edits make of
 * an empty project, one after another, field by field: nothing of versions, befores and afters.
 */
export class UndoModel {
  private readonly edits: ModelSet[] = [];
  private readonly takenBack = new Set<ModelSet>();
  /** Every set, the latest last. */
  readonly entries: Entry[] = [];

  edit(id: string, changes: readonly ModelChange[]): void {
    const set = { id, changes };
    this.edits.push(set);
    this.entries.push({ ...set, root: set });
  }

  /** The undo of an entry, or of the undo of it: the edit below stands no longer, or again. */
  toggle(id: string, entry: Entry): void {
    if (!this.takenBack.delete(entry.root)) this.takenBack.add(entry.root);
    this.entries.push({ id, changes: entry.changes, root: entry.root });
  }

  /** Whether an undo of this entry is possible at all: the edit is as the entry left it. */
  stands(entry: Entry): boolean {
    const after = this.entries.slice(this.entries.indexOf(entry) + 1).filter(({ root }) => root === entry.root);
    return after.length % 2 === 0;
  }

  /** Whether a set after the latest one about the same edit touched what that one touched: the only reason for refusing. */
  touchedLater(entry: Entry): boolean {
    const latest = this.entries.findLastIndex(({ root }) => root === entry.root);
    return this.entries.slice(latest + 1).some((later) => later.changes.some((theirs) => entry.changes.some((own) => overlap(own, theirs))));
  }

  /** The rows that the standing edits make, by identifier. */
  rows(edits: readonly ModelSet[] = this.edits.filter((edit) => !this.takenBack.has(edit))): ReadonlyMap<string, Values> {
    const rows = new Map<string, Values>();
    for (const { id, op, values } of edits.flatMap(({ changes }) => changes)) {
      if (op === 'delete') rows.delete(id);
      else if (op === 'create' || rows.has(id)) rows.set(id, { ...rows.get(id), ...values });
    }
    return rows;
  }

  /** The rows as they would be with this entry's edit the other way round. */
  rowsWithout({ root }: Entry): ReadonlyMap<string, Values> {
    return this.rows(this.edits.filter((edit) => this.takenBack.has(edit) === (edit === root)));
  }
}

/** Two changes meet in a row where one makes or deletes it, else in a field. */
function overlap(a: ModelChange, b: ModelChange): boolean {
  if (a.id !== b.id) return false;
  return a.op !== 'update' || b.op !== 'update' || Object.keys(a.values).some((field) => field in b.values);
}
