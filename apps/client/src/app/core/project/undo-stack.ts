import { computed, signal } from '@angular/core';

/** A change set of one's own. */
export interface OwnSet {
  readonly id: string;
  readonly summary: string;
}

export type Direction = 'undo' | 'redo';

/** The change sets that this person made in this project in this tab: those that can be undone, and undone ones to be redone. */
export class UndoStack {
  private readonly done = signal<readonly OwnSet[]>([]);
  private readonly undone = signal<readonly OwnSet[]>([]);
  /** What an undo would take back. */
  readonly undo = computed(() => this.done().at(-1) ?? null);
  /** What a redo would make again; its set is the undo that it takes back. */
  readonly redo = computed(() => this.undone().at(-1) ?? null);

  /** A new edit: what was undone before it is not redone after it. */
  push(set: OwnSet): void {
    this.done.update((sets) => [...sets, set]);
    this.undone.set([]);
  }

  next(direction: Direction): OwnSet | null {
    return direction === 'undo' ? this.undo() : this.redo();
  }

  /** `set` was undone or redone by the set `by`, whose own undo is the way back. */
  moved(direction: Direction, set: OwnSet, by: OwnSet): void {
    this.drop(set);
    (direction === 'undo' ? this.undone : this.done).update((sets) => [...sets, by]);
  }

  /** It can be neither undone nor redone from here any more. */
  drop({ id }: OwnSet): void {
    for (const sets of [this.done, this.undone]) sets.update((all) => all.filter((each) => each.id !== id));
  }

  clear(): void {
    this.done.set([]);
    this.undone.set([]);
  }
}
