import type { NewChangeSet, RowChange } from '#contract';
import type { Scope } from '../../platform/editing/collection.ts';
import { Plan } from '../../platform/editing/plan.ts';
import { BadRequest, type FieldError, Invalid, VersionMissing } from '../../platform/problems.ts';
import { faultsOf } from '../../platform/validated.ts';
import { collectionNamed, collections } from '../collections.ts';

const MOST_ERRORS = 50;

/** Checks the values of a set and adds what follows from its changes. */
export async function makePlan(scope: Scope, { changes }: NewChangeSet): Promise<Plan> {
  const faults: FieldError[] = [];
  const plan = new Plan();
  for (const [index, change] of changes.entries()) {
    requireForm(change, scope.projectId);
    if (!plan.add({ ...change, id: change.id.toLowerCase() }, false)) throw new BadRequest('One row is named twice', 'A change set names each row once.');
    if (faults.length < MOST_ERRORS) faults.push(...faultsOfChange(change, changes.length > 1 ? `changes.${index}.` : ''));
  }
  if (faults.length > 0) throw new Invalid(faults);
  // In the order of `collections` points come before dispensers: the deletion of a point adds that of its dispenser.
  for (const collection of collections) await collection.expand?.(scope, plan);
  return plan;
}

function requireForm(change: RowChange, projectId: string): void {
  const { collection, op, id, version, values } = change;
  if (collection === 'projects' && (op !== 'update' || id !== projectId)) throw new BadRequest('A change set changes its own project only');
  if (op !== 'create' && version === undefined) throw new VersionMissing();
  if (op !== 'delete' && values === undefined) throw new BadRequest('A creation or change names its values');
}

function faultsOfChange({ collection, op, id, values }: RowChange, prefix: string): FieldError[] {
  if (op === 'delete') return [];
  const { New, Change } = collectionNamed(collection).resource;
  const faults = op === 'create' ? faultsOf(New, { ...values, id }) : faultsOf(Change, values);
  return faults.map(({ field, message }) => ({ field: `${prefix}${field}`, message }));
}
