import { projects as projectResource, projectResources } from '#contract';
import { projects } from '#schema';
import { eq, sql } from 'drizzle-orm';
import { catalogueJson, catalogueSize } from '../catalogue/catalogue-service.ts';
import type { Tx } from '../platform/database.ts';
import { jsonObject, jsonRows } from '../platform/editing/json-rows.ts';
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

/** The whole design as JSON text, from one statement and so from one instant. */
export async function findDesign(tx: Tx, projectId: string): Promise<(DesignStamp & { readonly text: string }) | undefined> {
  const names = Object.keys(projectResources) as (keyof typeof projectResources)[];
  const rows = names.map((name) => {
    const { table, resource } = collectionNamed(name);
    return [name, jsonRows(table, resource.Row, sql`project_id = ${projectId}`)] as const;
  });
  const document = jsonObject({
    sequence: sql`p.sequence`,
    project: sql`${jsonRows(projects, projectResource.Row, sql`id = ${projectId}`)} -> 0`,
    catalogue: catalogueJson(),
    ...Object.fromEntries(rows),
  });
  const [design] = await tx.execute<DesignStamp & { text: string }>(sql`
    select p.sequence, ${catalogueSize()} as entries, ${document}::text as text from ${projects} p where p.id = ${projectId}`);
  return design;
}
