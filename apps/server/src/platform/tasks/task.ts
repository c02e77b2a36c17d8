import type { Database } from '../database.ts';
import type { FieldError } from '../problems.ts';
import type { ProblemType } from '#contract';

/** How far a task is: rows done of `total`, null while that cannot be known. */
export interface Progress {
  readonly stage: string;
  readonly done: number;
  readonly total: number | null;
}

/**
 * Long work that would keep an instance from answering others: it runs in a thread, with a database of its own.
 * Its input and output are copied between the threads, so they hold plain values only.
 */
export type Task<Input, Output> = (database: Database, input: Input, report: (progress: Progress) => void) => Promise<Output>;

export interface TaskRequest {
  readonly name: string;
  readonly input: unknown;
}

/** What the thread tells of the one task that it is at. */
export type TaskMessage =
  | { readonly kind: 'progress'; readonly progress: Progress }
  | { readonly kind: 'done'; readonly output: unknown }
  | { readonly kind: 'problem'; readonly problem: SentProblem }
  | { readonly kind: 'failed'; readonly message: string; readonly stack: string | undefined };

/** A ProblemError as it travels between threads. */
export interface SentProblem {
  readonly status: number;
  readonly type: ProblemType;
  readonly title: string;
  readonly more: { readonly detail?: string | undefined; readonly errors?: readonly FieldError[] | undefined; readonly current?: unknown };
}
