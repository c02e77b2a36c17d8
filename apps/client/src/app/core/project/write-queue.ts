import { Injectable, signal } from '@angular/core';
import type { Problem } from '#contract';
import { problemOf } from '../api/problem';

/** Writes on their way: one after another, so that each names the version that the one before it made. */
@Injectable({ providedIn: 'root' })
export class WriteQueue {
  private readonly count = signal(0);
  private readonly refusedWith = signal<Problem | null>(null);
  private readonly rows = new Map<string, number>();
  private last: Promise<unknown> = Promise.resolve();
  /** Writes that the server has not answered. */
  readonly waiting = this.count.asReadonly();
  /** Why the latest write was refused, until the next one begins. */
  readonly refused = this.refusedWith.asReadonly();

  /**
   * @param ids of the rows that it writes
   * @returns whether the server took it; `refused` says why not
   */
  run(ids: readonly string[], work: () => Promise<void>): Promise<boolean> {
    this.count.update((n) => n + 1);
    this.refusedWith.set(null);
    for (const id of ids) this.rows.set(id, this.writesOf(id) + 1);
    const done = this.last.then(work).then(() => true, (error: unknown) => {
      this.refusedWith.set(problemOf(error));
      return false;
    }).finally(() => this.leave(ids));
    this.last = done;
    return done;
  }

  /** Writes of a row that are not answered yet. */
  writesOf(id: string): number {
    return this.rows.get(id) ?? 0;
  }

  dismiss(): void {
    this.refusedWith.set(null);
  }

  private leave(ids: readonly string[]): void {
    this.count.update((n) => n - 1);
    for (const id of ids) {
      const left = this.writesOf(id) - 1;
      if (left > 0) this.rows.set(id, left);
      else this.rows.delete(id);
    }
  }
}
