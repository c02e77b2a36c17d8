import type { RowChange } from '#contract';
import type { CollectionName } from './collection-name.ts';

/** A change of the set, or one that follows from it (without a version to check). */
export interface Planned extends RowChange {
  readonly derived: boolean;
}

/** The changes of one set, one a row, while features add what follows from them. */
export class Plan {
  private readonly byRow = new Map<string, Planned>();

  /** @returns whether it was added; false where the set has a change of this row already */
  add(change: RowChange, derived = true): boolean {
    const key = `${change.collection} ${change.id}`;
    if (this.byRow.has(key)) return false;
    this.byRow.set(key, { ...change, derived });
    return true;
  }

  all(collection: CollectionName): Planned[] {
    return [...this.byRow.values()].filter((change) => change.collection === collection);
  }

  of(collection: CollectionName, op: RowChange['op']): Planned[] {
    return this.all(collection).filter((change) => change.op === op);
  }
}
