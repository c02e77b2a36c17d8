import type { ImportCounts, PlannedRow } from './plan.ts';

/** Counts the rows of a plan. `pointsBefore` is the number of points that the project has. */
export function countRows(rows: readonly PlannedRow[], pointsBefore: number): ImportCounts {
  const having = (test: (row: PlannedRow) => boolean): number => rows.filter(test).length;
  const doing = (action: PlannedRow['action']): number => having((row) => row.action === action);
  const imported = rows.filter(({ action }) => action !== 'hold' && action !== 'skip');
  const saying = (test: (row: PlannedRow) => boolean): number => imported.filter(test).length;
  const toCreate = doing('create');
  const created = having((row) => row.action === 'create' && row.problems.length === 0);
  const skipped = doing('skip');
  return {
    rows: rows.length - skipped,
    toCreate,
    toUpdate: doing('update'),
    same: doing('same'),
    heldBack: doing('hold'),
    skipped,
    created,
    createdWithProblems: toCreate - created,
    withProblems: having((row) => row.problems.length > 0),
    problems: rows.reduce((sum, row) => sum + row.problems.length, 0),
    rowsWithNotes: having((row) => row.notes.length > 0),
    notes: rows.reduce((sum, row) => sum + row.notes.length, 0),
    pointsAfter: pointsBefore + toCreate,
    outputsAssigned: saying(({ values }) => values.outputAddress !== null),
    statusInputsAssigned: saying(({ values }) => values.statusAddress !== null),
    twoCore: saying(({ values }) => values.wiring === 'two-core'),
    fourCore: saying(({ values }) => values.wiring === 'four-core'),
    withoutDose: saying(({ values }) => values.doseUl === null),
  };
}
