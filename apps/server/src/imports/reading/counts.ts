import type { ImportCounts, PlannedRow } from './plan.ts';

type Draft = { -readonly [K in keyof ImportCounts]: number };

/** Counts the rows of a plan. `pointsBefore` is the number of points that the project has. */
export function countRows(rows: readonly PlannedRow[], pointsBefore: number): ImportCounts {
  const counts = zeros();
  for (const row of rows) {
    countAction(row, counts);
    if (row.action !== 'hold' && row.action !== 'skip') countValues(row, counts);
  }
  return { ...counts, createdWithProblems: counts.toCreate - counts.created, pointsAfter: pointsBefore + counts.toCreate };
}

function zeros(): Draft {
  return {
    ...{ rows: 0, toCreate: 0, toUpdate: 0, same: 0, heldBack: 0, skipped: 0, created: 0, createdWithProblems: 0 },
    ...{ withProblems: 0, problems: 0, rowsWithNotes: 0, notes: 0, pointsAfter: 0 },
    ...{ outputsAssigned: 0, statusInputsAssigned: 0, twoCore: 0, fourCore: 0, withoutDose: 0 },
  };
}

const BY_ACTION = { create: 'toCreate', update: 'toUpdate', same: 'same', hold: 'heldBack', skip: 'skipped' } as const;

function countAction({ action, rows, problems, notes }: PlannedRow, counts: Draft): void {
  counts[BY_ACTION[action]] += 1;
  if (action !== 'skip') counts.rows += rows.length;
  if (action === 'create' && problems.length === 0) counts.created += 1;
  if (problems.length > 0) counts.withProblems += 1;
  if (notes.length > 0) counts.rowsWithNotes += 1;
  counts.problems += problems.length;
  counts.notes += notes.length;
}

function countValues({ values }: PlannedRow, counts: Draft): void {
  if (values.outputAddress !== null) counts.outputsAssigned += 1;
  if (values.statusAddress !== null) counts.statusInputsAssigned += 1;
  if (values.wiring === 'two-core') counts.twoCore += 1;
  if (values.wiring === 'four-core') counts.fourCore += 1;
  if (values.doseUl === null) counts.withoutDose += 1;
}
