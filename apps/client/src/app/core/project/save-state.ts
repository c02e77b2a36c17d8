import type { Problem } from '#contract';

/** What the header says about the work on this project. */
export type SaveState =
  | { readonly kind: 'saved' }
  | { readonly kind: 'saving'; readonly count: number }
  | { readonly kind: 'refused'; readonly problem: Problem };

/** Two people changed the same field: both values, until somebody chooses. */
export interface Conflict {
  readonly label: string;
  readonly fields: readonly { readonly field: string; readonly mine: unknown; readonly theirs: unknown }[];
  readonly keepMine: () => void;
  readonly takeTheirs: () => void;
}
