import { projects } from '#schema';
import type { NewProject } from '#contract';
import { sql } from 'drizzle-orm';
import { v7 as newId } from 'uuid';
import { type Context, withOrg } from '../platform/context.ts';
import type { Tx } from '../platform/database.ts';
import { brokenUnique } from '../platform/database-problems.ts';
import type { Row } from '../platform/editing/collection.ts';
import { NotFound } from '../platform/problems.ts';
import { recordChangeSet } from './change-sets/record.ts';
import type { ChangedRow } from './change-sets/outcome.ts';
import { write } from './change-sets/write.ts';
import { requireTimeZone } from './collections.ts';
import { copyHardware } from './copy-hardware.ts';
import { findProject, findProjectSummaries } from './project-queries.ts';

export const listProjects = (context: Context) => withOrg(context, findProjectSummaries);

/** @throws {NotFound} */
export async function readProject(context: Context, id: string): Promise<Row> {
  const project = await withOrg(context, (tx) => findProject(tx, id));
  if (!project) throw new NotFound('project');
  return project;
}

/** Makes a project, with another one's hardware if that is wanted. The same request again gives the same project. */
export async function createProject(context: Context, wanted: NewProject): Promise<Row> {
  requireTimeZone(wanted.timeZone ?? 'UTC');
  try {
    return await withOrg(context, async (tx) => (await findProject(tx, wanted.id)) ?? insertProject(tx, context, wanted));
  } catch (error) {
    if (brokenUnique(error) === 'projects_pkey') return readProject(context, wanted.id);
    throw error;
  }
}

async function insertProject(tx: Tx, context: Context, { id, copyHardwareFrom, ...values }: NewProject): Promise<Row> {
  const policies = copyHardwareFrom ? await policiesOf(tx, copyHardwareFrom) : {};
  await tx.insert(projects).values({ ...policies, ...values, id, orgId: context.orgId });
  const scope = { tx, orgId: context.orgId, projectId: id };
  const project = await findProject(tx, id);
  if (!project) throw new NotFound('project');
  const made: ChangedRow = { collection: 'projects', rowId: id, before: null, after: project };
  const copied = copyHardwareFrom ? await copyHardware(scope, copyHardwareFrom) : [];
  // Groups name circuits, which are written after them.
  await tx.execute(sql`set constraints all deferred`);
  await write(scope, { items: copied, answer: [] });
  await tx.execute(sql`set constraints all immediate`);
  const summary = copyHardwareFrom ? 'Project created with the hardware of another' : 'Project created';
  await recordChangeSet(scope, context.personId, { id: newId(), summary }, [made, ...copied]);
  return project;
}

/** The rules by which another project is checked: its hardware was laid out by them. @throws {NotFound} */
async function policiesOf(tx: Tx, projectId: string): Promise<Partial<typeof projects.$inferInsert>> {
  const source = await findProject(tx, projectId);
  if (!source) throw new NotFound('project to copy from');
  const { id: _id, version: _version, name: _name, description: _description, ...policies } = source;
  return policies;
}
