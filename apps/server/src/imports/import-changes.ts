import type { Design } from '#calc';
import type { RowChange } from '#contract';
import { v7 as newId } from 'uuid';
import { versionOf } from '../projects/load-design.ts';
import { changesOf, type ImportPlan, type RowUpdate } from './reading/index.ts';

/** The plan as one change set: channels are freed first, points come before their dispensers. */
export function rowChangesOf(plan: ImportPlan, design: Design): RowChange[] {
  const { points, dispensers, assignments } = changesOf(plan, design, newId);
  return [
    ...assignments.remove.map((id): RowChange => ({ collection: 'assignments', op: 'delete', id, version: versionIn(design.assignments, id) })),
    ...points.create.map((row) => creation('points', row)),
    ...points.update.map((update) => revision('points', design.points, update)),
    ...dispensers.create.map((row) => creation('dispensers', row)),
    ...dispensers.update.map((update) => revision('dispensers', design.dispensers, update)),
    ...assignments.create.map((row) => creation('assignments', row)),
  ];
}

const creation = (collection: RowChange['collection'], { id, ...values }: { readonly id: string }): RowChange =>
  ({ collection, op: 'create', id, values });

const revision = (collection: RowChange['collection'], rows: readonly { readonly id: string }[], { id, fields }: RowUpdate<object>): RowChange =>
  ({ collection, op: 'update', id, version: versionIn(rows, id), values: { ...fields } });

const versionIn = (rows: readonly { readonly id: string }[], id: string): number => {
  const row = rows.find((r) => r.id === id);
  return row ? versionOf(row) : 0;
};
