import { computed, inject, Injectable, signal } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { problemText } from '../api/problem';
import { ProjectStore } from './project-store';
import type { TakenBack } from './project-writes';
import type { Direction, OwnSet } from './undo-stack';

const SHOWN_MS = 8000;
const WORDS = {
  undo: { done: 'Undone', refused: 'Not undone', back: 'Redo', other: 'redo' },
  redo: { done: 'Redone', refused: 'Not redone', back: 'Undo', other: 'undo' },
} as const;

/** Why the latest undo or redo did not happen. */
export interface UndoRefusal {
  readonly head: string;
  readonly text: string;
}

/** Undo or redo as it would be now. */
export interface UndoAct {
  readonly direction: Direction;
  readonly label: string;
  /** Null: there is nothing to take back. */
  readonly set: OwnSet | null;
}

const act = (direction: Direction, verb: string, set: OwnSet | null): UndoAct => ({ direction, set, label: set ? `${verb}: ${set.summary}` : verb });

/** Undo and redo as keys, buttons and menus ask for them; says quietly what happened, with the way back. */
@Injectable({ providedIn: 'root' })
export class UndoCommands {
  private readonly store = inject(ProjectStore);
  private readonly snack = inject(MatSnackBar);
  private readonly refused = signal<UndoRefusal | null>(null);
  readonly refusal = this.refused.asReadonly();
  /** Both, with what each would take: "Undo: Dose of GC1-L01". */
  readonly acts = computed<readonly UndoAct[]>(() => [
    act('undo', 'Undo', this.store.nextUndo()),
    act('redo', 'Redo', this.store.nextRedo()),
  ]);

  /** The latest of one's own sets; a refusal shows above the page. */
  async run(direction: Direction, given?: OwnSet): Promise<void> {
    const taken = await this.take(direction, given);
    if (taken?.problem) this.refused.set({ head: WORDS[direction].refused, text: `${taken.set.summary}: ${problemText(taken.problem)}` });
  }

  /** A set of the history; the caller shows a refusal where the set stands. */
  async take(direction: Direction, given?: OwnSet): Promise<TakenBack | null> {
    this.dismiss();
    const taken = await this.store.takeBack(direction, given);
    if (taken && !taken.problem) this.tell(direction, taken.by);
    return taken;
  }

  dismiss(): void {
    this.refused.set(null);
  }

  private tell(direction: Direction, by: OwnSet): void {
    const { done, back, other } = WORDS[direction];
    this.snack.open(`${done}: ${by.summary}`, back, { duration: SHOWN_MS, politeness: 'polite', panelClass: 'lw-snack' })
      .onAction().subscribe(() => void this.run(other, by));
  }
}
