import { signal } from '@angular/core';
import type { AnyRow } from './project-api';
import type { Conflict } from './save-state';

type Values = Readonly<Record<string, unknown>>;

/** Fields that somebody else changed since `base` was read, to another value than one's own. */
export const clashingFields = (base: AnyRow, values: Values, current: AnyRow): readonly string[] =>
  Object.keys(values).filter((field) => !same(current[field], base[field]) && !same(current[field], values[field]));

/** Shows both values of a field that two people changed, and waits for the choice. */
export class Conflicts {
  private readonly asking = signal<Conflict | null>(null);
  readonly open = this.asking.asReadonly();

  /** @returns whether one's own values stand */
  ask(current: AnyRow, values: Values, fields: readonly string[]): Promise<boolean> {
    return new Promise((resolve) => {
      const answer = (mine: boolean) => () => {
        this.asking.set(null);
        resolve(mine);
      };
      this.asking.set({
        label: labelOf(current),
        fields: fields.map((field) => ({ field, mine: values[field], theirs: current[field] })),
        keepMine: answer(true),
        takeTheirs: answer(false),
      });
    });
  }

  close(): void {
    this.asking.set(null);
  }
}

/** What people call a row. */
export const labelOf = (row: AnyRow): string => [row['tag'], row['name'], row['location'], 'This row'].find((v) => typeof v === 'string') as string;

const same = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b);
