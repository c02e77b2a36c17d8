import { createHash } from 'node:crypto';
import type { ImportPreview, ImportResult, ImportSettings } from '#contract';
import { v7 as newId } from 'uuid';
import { type Context, withOrg } from '../platform/context.ts';
import { NotFound, ProblemError, TooLarge } from '../platform/problems.ts';
import { applyChangeSetIn } from '../projects/change-sets/apply-change-set.ts';
import { loadDesignIn } from '../projects/load-design.ts';
import { rowChangesOf } from './import-changes.ts';
import { interpret, previewOf } from './import-preview.ts';
import { findImport, findImportForUpdate, type ImportRow, insertImport, markCommitted } from './import-queries.ts';
import { ImportRefusal, type RefusalCode } from './reading/index.ts';

const KEPT_DAYS = 30;
const TOO_LARGE: ReadonlySet<RefusalCode> = new Set(['too-large', 'too-many-rows', 'too-many-columns', 'cell-too-long']);

/** A file that was uploaded, with the name that it has at the person's computer. */
export interface UploadedFile {
  readonly name: string;
  readonly bytes: Buffer;
}

/** Keeps the file and says what importing it would do, with every setting detected. Nothing is changed. */
export async function uploadImport(context: Context, projectId: string, file: UploadedFile): Promise<ImportPreview> {
  return withOrg(context, async (tx) => {
    const design = await loadDesignIn(tx, projectId);
    const interpretation = readable(() => interpret(file.bytes, {}, design));
    const id = newId();
    await insertImport(tx, {
      id, orgId: context.orgId, projectId, personId: context.personId, fileName: file.name, bytes: file.bytes,
      sha256: createHash('sha256').update(file.bytes).digest('hex'),
      expiresAt: new Date(Date.now() + KEPT_DAYS * 86_400_000),
    });
    return previewOf(id, file.name, interpretation, design);
  });
}

/** The same with other settings. @throws {NotFound} */
export async function previewImport(context: Context, projectId: string, id: string, settings: ImportSettings): Promise<ImportPreview> {
  return withOrg(context, async (tx) => {
    const kept = await findImport(tx, projectId, id);
    if (!kept) throw new NotFound('import');
    const design = await loadDesignIn(tx, projectId);
    return previewOf(id, kept.fileName, readable(() => interpret(kept.bytes, settings, design)), design);
  });
}

/**
 * Reads the kept file again and imports it: all rows that are not held back, or nothing, in one transaction. The same
 * commit again changes nothing and answers what the first one created and updated; rows that it left alone are not kept.
 * @throws {NotFound}, {StaleWrite} where somebody changed a row that it updates between reading and writing
 */
export async function commitImport(context: Context, projectId: string, id: string, settings: ImportSettings): Promise<ImportResult> {
  return withOrg(context, async (tx) => {
    const kept = await findImportForUpdate(tx, projectId, id);
    if (!kept) throw new NotFound('import');
    if (kept.committedAt) return resultOf(kept);
    const design = await loadDesignIn(tx, projectId);
    const { plan } = readable(() => interpret(kept.bytes, settings, design));
    const changes = rowChangesOf(plan, design);
    const { toCreate: created, toUpdate: updated, same, heldBack } = plan.counts;
    await markCommitted(tx, id, { settings, created, updated, changeSetId: changes.length > 0 ? id : null });
    if (changes.length === 0) return { id, created, updated, same, heldBack, sequence: null };
    const notice = await applyChangeSetIn(tx, context, projectId, { id, summary: `Import of ${kept.fileName}`.slice(0, 300), changes });
    return { id, created, updated, same, heldBack, sequence: notice.sequence };
  });
}

const resultOf = ({ id, created, updated }: ImportRow): ImportResult => ({ id, created, updated, same: 0, heldBack: 0, sequence: null });

/** A refusal in the words of the reader, as a problem document. */
function readable<T>(work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof ImportRefusal)) throw error;
    const detail = `${error.detail} ${error.remedy}`;
    throw TOO_LARGE.has(error.code) ? new TooLarge(error.title, detail) : new ProblemError(422, 'unreadable-file', error.title, { detail });
  }
}
