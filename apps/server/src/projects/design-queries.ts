import { projects as projectResource, projectResources } from '#contract';
import { projects } from '#schema';
import { eq, sql } from 'drizzle-orm';
import { catalogueJson, catalogueSize } from '../catalogue/catalogue-service.ts';
import type { Tx } from '../platform/database.ts';
import { jsonRows, jsonRowTexts } from '../platform/editing/json-rows.ts';
import { collectionNamed } from './collections.ts';

/** Number of the project's last change and size of the catalogue: together they tell whether a design is the same. */
export interface DesignStamp extends Record<string, unknown> {
  readonly sequence: string;
  readonly entries: number;
}

export async function findDesignStamp(tx: Tx, projectId: string): Promise<DesignStamp | undefined> {
  const [stamp] = await tx.execute<DesignStamp>(sql`
    select ${projects.sequence}, ${catalogueSize()} as entries from ${projects} where ${eq(projects.id, projectId)}`);
  return stamp;
}

/**
 * The whole design as JSON text, from one statement and so from one instant. Each collection comes as a text of
 * its own, joined here: inside the database every further step would copy megabytes once more.
 */
export async function findDesign(tx: Tx, projectId: string): Promise<(DesignStamp & { readonly text: string }) | undefined> {
  const names = Object.keys(projectResources) as (keyof typeof projectResources)[];
  const texts = names.map((name) => {
    const { table, resource } = collectionNamed(name);
    return sql`${jsonRowTexts(table, resource.Row, sql`project_id = ${projectId}`)} as ${sql.identifier(name)}`;
  });
  const [found] = await tx.execute<DesignStamp & Record<string, string>>(sql`
    select p.sequence, ${catalogueSize()} as entries,
      (${jsonRows(projects, projectResource.Row, sql`id = ${projectId}`)} -> 0)::text as project, ${catalogueJson()}::text as catalogue,
      ${sql.join(texts, sql`, `)}
    from ${projects} p where p.id = ${projectId}`);
  if (!found) return undefined;
  const collections = names.map((name) => `${JSON.stringify(name)}:[${found[name]}]`).join(',');
  const { sequence, entries, project, catalogue } = found;
  return { sequence, entries, text: `{"sequence":${sequence},"project":${project},"catalogue":${catalogue},${collections}}` };
}
