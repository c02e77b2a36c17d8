import type { ChangeNotice } from '#contract';
import { isDeepStrictEqual } from 'node:util';
import type { Collection, CollectionName, Row, Scope } from '../../platform/editing/collection.ts';
import type { Plan, Planned } from '../../platform/editing/plan.ts';
import { defaultsOf, lockRows } from '../../platform/editing/rows.ts';
import { NotFound, StaleWrite } from '../../platform/problems.ts';
import { collections } from '../collections.ts';

/** A row before and after a set; null before its creation, and after its deletion. */
export interface ChangedRow {
  readonly collection: CollectionName;
  readonly rowId: string;
  readonly before: Row | null;
  readonly after: Row | null;
}

export interface Outcome {
  /** What changes. */
  readonly items: ChangedRow[];
  /** What the answer tells: also rows that turned out to be as wanted already. */
  readonly answer: ChangeNotice['items'];
}

/** Locks the rows of a plan, compares versions and works out each row as it will be. */
export async function outcomeOf(scope: Scope, plan: Plan): Promise<Outcome> {
  const outcome: Outcome = { items: [], answer: [] };
  for (const collection of collections) {
    const changes = plan.all(collection.name);
    if (changes.length === 0) continue;
    const present = await lockRows(scope, collection, changes.map((change) => change.id));
    const defaults = { ...defaultsOf(collection.table, collection.resource.Row), version: 1 };
    for (const change of changes) add(outcome, collection, change, present.get(change.id), defaults);
  }
  return outcome;
}

function add(outcome: Outcome, collection: Collection, change: Planned, before: Row | undefined, defaults: object): void {
  const after = afterOf(collection, change, before, defaults);
  outcome.answer.push({ collection: collection.name, id: change.id, row: after });
  if (after !== before) outcome.items.push({ collection: collection.name, rowId: change.id, before: before ?? null, after });
}

/** @returns the very row `before` where nothing changes */
function afterOf(collection: Collection, change: Planned, before: Row | undefined, defaults: object): Row | null {
  const { op, id, version, values } = change;
  // The same creation a second time: the row is there.
  if (op === 'create') return before ?? ({ ...defaults, ...values, id } as unknown as Row);
  if (!before) throw new NotFound(collection.noun);
  if (!change.derived && before.version !== version) throw new StaleWrite(before);
  if (op === 'delete') return null;
  const wanted = { ...before, ...values };
  return isDeepStrictEqual(wanted, before) ? before : { ...wanted, version: before.version + 1 };
}
