import type { ImportPreview, ImportResult, ImportSettings } from '#contract';
import { type Context, withOrg } from '../platform/context.ts';
import type { Database } from '../platform/database.ts';
import { Invalid, NotFound, ProblemError, TooLarge } from '../platform/problems.ts';
import type { Progress, Task } from '../platform/tasks/task.ts';
import { applyChangeSetIn } from '../projects/change-sets/apply-change-set.ts';
import { loadDesignIn } from '../projects/load-design.ts';
import { rowChangesOf } from './import-changes.ts';
import { previewOf } from './import-preview.ts';
import { findImport, findImportForUpdate, type ImportRow, keepSettings, markCommitted } from './import-queries.ts';
import { type PackedRows, packRows } from './packed-rows.ts';
import {
  type ChosenSettings, type FileReading, type ImportPlan, ImportRefusal, interpretFile, isFieldKey, readFile, type RefusalCode,
  type Remembered, toRemember,
} from './reading/index.ts';
import { findRemembered, remember } from './remembered.ts';
import type { Design } from '#calc';

/** Whose import is read or written, and how. */
export interface ImportInput {
  readonly orgId: string;
  readonly personId: string;
  readonly projectId: string;
  readonly importId: string;
  readonly settings: ImportSettings;
}

export interface PreviewOutput {
  readonly preview: ImportPreview;
  readonly rows: PackedRows;
}

type Report = (progress: Progress) => void;

const MENDED_IN_COLUMNS: ReadonlySet<RefusalCode> = new Set(['tag-unmapped', 'signal-type-unmapped']);
const TOO_LARGE: ReadonlySet<RefusalCode> = new Set(['too-large', 'too-many-rows', 'too-many-columns', 'cell-too-long', 'workbook-too-large']);

/** Says what importing the kept file would do. @throws {NotFound}, {Invalid}, a problem of type unreadable-file or too-large */
export const previewTask: Task<ImportInput, PreviewOutput> = async (database, input, report) => {
  const context = contextOf(database, input);
  const { kept, design, remembered } = await withOrg(context, async (tx) => ({
    kept: await findImport(tx, input.projectId, input.importId),
    design: await loadDesignIn(tx, input.projectId),
    remembered: await findRemembered(tx),
  }));
  if (!kept) throw new NotFound('import');
  const reading = await read(kept.bytes, input.settings, design, remembered, report);
  const plan = planOrRefusal(reading, design, report);
  await withOrg(context, (tx) => keepSettings(tx, kept.id, input.settings));
  return { preview: previewOf(kept, reading, plan, design), rows: packRows(plan instanceof ImportRefusal ? [] : plan.rows) };
};

/**
 * Reads the kept file again and imports it: all rows that are not held back, or nothing, in one transaction. The same
 * commit again changes nothing and answers what the first one created and updated; rows that it left alone are not kept.
 * @throws {NotFound}, {StaleWrite} where somebody changed a row that it updates between reading and writing
 */
export const commitTask: Task<ImportInput, ImportResult> = (database, input, report) => {
  const context = contextOf(database, input);
  return withOrg(context, async (tx) => {
    const { importId: id, projectId, settings } = input;
    const kept = await findImportForUpdate(tx, projectId, id);
    if (!kept) throw new NotFound('import');
    if (kept.committedAt) return resultOf(kept);
    const design = await loadDesignIn(tx, projectId);
    const reading = await read(kept.bytes, settings, design, await findRemembered(tx), report);
    const plan = planOrRefusal(reading, design, report);
    if (plan instanceof ImportRefusal) throw problemOf(plan);
    const changes = rowChangesOf(plan, design);
    await remember(tx, context.orgId, toRemember(reading));
    const { toCreate: created, toUpdate: updated, same, heldBack } = plan.counts;
    await markCommitted(tx, id, { settings, created, updated, changeSetId: changes.length > 0 ? id : null });
    if (changes.length === 0) return { id, created, updated, same, heldBack, sequence: null };
    const notice = await applyChangeSetIn(tx, context, projectId, { id, summary: `Import of ${kept.fileName}`.slice(0, 300), changes }, writingTold(changes.length, report));
    return { id, created, updated, same, heldBack, sequence: notice.sequence };
  });
};

/** @throws {Invalid} for a field that does not exist, or a problem of type unreadable-file or too-large */
async function read(bytes: Uint8Array, settings: ImportSettings, design: Design, remembered: Remembered, report: Report): Promise<FileReading> {
  const unknown = Object.entries(settings.mapping ?? {}).filter(([, field]) => !isFieldKey(field));
  if (unknown.length > 0) throw new Invalid(unknown.map(([column, field]) => ({ field: `mapping.${column}`, message: `There is no field ${field}.` })));
  try {
    report({ stage: 'reading', done: 0, total: null });
    return await readFile(bytes, settings as ChosenSettings, design, remembered, (done) => report({ stage: 'reading', done, total: null }));
  } catch (error) {
    throw error instanceof ImportRefusal ? problemOf(error) : error;
  }
}

/** What importing would do, or what the columns still lack for it: a person mends that with the preview in view. */
function planOrRefusal(reading: FileReading, design: Design, report: Report): ImportPlan | ImportRefusal {
  try {
    return interpretFile(reading, design, (done, total) => report({ stage: 'checking', done, total }));
  } catch (error) {
    if (!(error instanceof ImportRefusal)) throw error;
    if (MENDED_IN_COLUMNS.has(error.code)) return error;
    throw problemOf(error);
  }
}

/** Each row is written twice: to its table and to the history. */
function writingTold(changes: number, report: Report): (rows: number) => void {
  let written = 0;
  report({ stage: 'writing', done: 0, total: changes });
  return (rows) => {
    written += rows;
    report({ stage: 'writing', done: Math.min(changes, Math.floor(written / 2)), total: changes });
  };
}

/** A refusal in the words of the reader, as a problem document. */
function problemOf({ code, title, detail, remedy }: ImportRefusal): ProblemError {
  const text = `${detail} ${remedy}`;
  return TOO_LARGE.has(code) ? new TooLarge(title, text) : new ProblemError(422, 'unreadable-file', title, { detail: text });
}

const resultOf = ({ id, created, updated }: ImportRow): ImportResult => ({ id, created, updated, same: 0, heldBack: 0, sequence: null });

const contextOf = (database: Database, { orgId, personId }: ImportInput): Context => ({ orgId, personId, sessionId: '', roles: [], database });
