import type { Design, Uuid } from '#calc';
import type { ImportChanges, RowUpdate } from '../plan-changes.ts';

/** The design as the database would hold it after the changes. */
export function withChanges(design: Design, { points, dispensers, assignments }: ImportChanges): Design {
  return {
    ...design,
    points: [...updated(design.points, points.update), ...points.create],
    dispensers: [...updated(design.dispensers, dispensers.update), ...dispensers.create],
    assignments: [...design.assignments.filter(({ id }) => !assignments.remove.includes(id)), ...assignments.create],
  };
}

function updated<T extends { readonly id: Uuid }>(rows: readonly T[], updates: readonly RowUpdate<T>[]): T[] {
  return rows.map((row) => ({ ...row, ...updates.find(({ id }) => id === row.id)?.fields }));
}
