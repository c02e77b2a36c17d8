import type { Problem } from '#contract';
import { fieldsOf, type KindView } from './field';

export interface ServerErrors {
  /** The server's words by field. */
  readonly fields: ReadonlyMap<string, string>;
  /** What no field stands for, in a line; null: nothing. */
  readonly rest: string | null;
}

/** A refusal shared out to the fields of a form; `/status/maxA` and `cartridgesUl.0` find their field as well. */
export function serverErrors(view: KindView, problem: Problem | null): ServerErrors {
  if (!problem) return { fields: new Map(), rest: null };
  const keys = ['name', ...fieldsOf(view).map((field) => field.key)];
  const fields = new Map<string, string>();
  const others: string[] = [];
  for (const { field, message } of problem.errors ?? []) {
    const path = field.replace(/^[/.]+/, '').replaceAll('/', '.');
    const key = keys.find((one) => path === one || path.startsWith(`${one}.`) || path.startsWith(`${one}[`));
    if (key) fields.set(key, message);
    else others.push(field ? `${field}: ${message}` : message);
  }
  return { fields, rest: [problem.title, problem.detail, ...others].filter(Boolean).join('. ').replaceAll('..', '.') };
}
