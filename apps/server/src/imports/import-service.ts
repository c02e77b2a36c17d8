import { createHash } from 'node:crypto';
import type { ImportPreview, ImportResult, ImportSettings, ImportWork, RowFilter } from '#contract';
import { type Context, withOrg } from '../platform/context.ts';
import { Conflict, NotFound } from '../platform/problems.ts';
import type { Services } from '../platform/services.ts';
import { deleteImport, findImportState, insertImport } from './import-queries.ts';
import type { ImportInput, PreviewOutput } from './import-tasks.ts';
import { findWork, type ImportKey, runTracked, wishToStop } from './import-work.ts';
import { type PackedRows, pageText } from './packed-rows.ts';

const KEPT_DAYS = 30;

/** A file that was uploaded, with the name that it has at the person's computer. */
export interface UploadedFile {
  readonly name: string;
  readonly bytes: Buffer;
}

type Asking = Pick<Services, 'tasks' | 'cache'>;

/** The rows of the last preview, and the settings that they were read with. */
interface KeptPreview {
  readonly settings: string;
  readonly rows: PackedRows;
}

/**
 * Keeps the file and says what importing it would do, with every setting detected. Nothing is changed; a file that
 * cannot be read is not kept. The same upload again is the same import.
 */
export async function uploadImport(asking: Asking, context: Context, key: ImportKey, file: UploadedFile): Promise<ImportPreview> {
  await withOrg(context, async (tx) => {
    const sha256 = createHash('sha256').update(file.bytes).digest('hex');
    const kept = await insertImport(tx, {
      id: key.importId, orgId: context.orgId, projectId: key.projectId, personId: context.personId, fileName: file.name, bytes: file.bytes, sha256,
      expiresAt: new Date(Date.now() + KEPT_DAYS * 86_400_000),
    });
    if (!kept) throw new Conflict('Another file has this identifier. Upload it again.');
  });
  try {
    return await look(asking, context, key, {});
  } catch (error) {
    await withOrg(context, (tx) => deleteImport(tx, key.importId));
    throw error;
  }
}

/** The same with other settings. @throws {NotFound} */
export async function previewImport(asking: Asking, context: Context, key: ImportKey, settings: ImportSettings): Promise<ImportPreview> {
  await requireImport(context, key);
  return look(asking, context, key, settings);
}

/** JSON of some rows of the last preview. @throws {NotFound} */
export async function readRows(asking: Asking, context: Context, key: ImportKey, page: { readonly show: RowFilter; readonly offset: number; readonly limit: number }): Promise<string> {
  const settings = await requireImport(context, key);
  const keptRows = () => {
    const kept = asking.cache.get<KeptPreview>(key.importId);
    return kept?.settings === canonical(settings) ? kept : undefined;
  };
  if (!keptRows()) await look(asking, context, key, settings);
  const kept = keptRows();
  if (!kept) throw new NotFound('import');
  return pageText(kept.rows, page.show, page.offset, page.limit);
}

/** Imports the kept file, see `commitTask`. @throws {NotFound}, {StaleWrite} */
export async function commitImport({ tasks, cache }: Asking, context: Context, key: ImportKey, settings: ImportSettings): Promise<ImportResult> {
  await requireImport(context, key);
  const result = await runTracked<ImportResult>(tasks, context, key, 'imports.commit', inputOf(context, key, settings));
  cache.drop(key.importId);
  return result;
}

/** How far the import is that is being read or written; undefined where nothing is under way. */
export const readWork = (context: Context, key: ImportKey): Promise<ImportWork | undefined> => withOrg(context, (tx) => findWork(tx, key));

/** Stops reading or writing, in whichever instance it is under way; nothing is changed then. */
export async function stopWork({ tasks }: Asking, context: Context, key: ImportKey): Promise<void> {
  await requireImport(context, key);
  await withOrg(context, (tx) => wishToStop(tx, key.importId));
  tasks.cancel(key.importId);
}

async function look({ tasks, cache }: Asking, context: Context, key: ImportKey, settings: ImportSettings): Promise<ImportPreview> {
  const { preview, rows } = await runTracked<PreviewOutput>(tasks, context, key, 'imports.preview', inputOf(context, key, settings));
  const kept: KeptPreview = { settings: canonical(settings), rows };
  cache.put(key.importId, kept, rows.json.byteLength + rows.ends.byteLength + rows.kinds.byteLength);
  return preview;
}

/** The settings with which it was last read. @throws {NotFound} */
async function requireImport(context: Context, { projectId, importId }: ImportKey): Promise<ImportSettings> {
  const kept = await withOrg(context, (tx) => findImportState(tx, projectId, importId));
  if (!kept) throw new NotFound('import');
  return kept.settings ?? {};
}

const inputOf = ({ orgId, personId }: Context, { projectId, importId }: ImportKey, settings: ImportSettings): ImportInput =>
  ({ orgId, personId, projectId, importId, settings });

/** The same text for the same settings, in whatever order the database gives them back. */
const canonical = (settings: ImportSettings): string => JSON.stringify(settings, (_key, value: unknown) =>
  value !== null && typeof value === 'object' && !Array.isArray(value)
    ? Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1))) : value);
