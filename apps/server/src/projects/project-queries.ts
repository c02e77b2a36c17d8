import { type ProjectSummary, projects as projectResource } from '#contract';
import { projects } from '#schema';
import { eq, sql } from 'drizzle-orm';
import type { Tx } from '../platform/database.ts';
import type { Row } from '../platform/editing/collection.ts';
import { columnsOf } from '../platform/editing/rows.ts';

export async function findProjectSummaries(tx: Tx): Promise<ProjectSummary[]> {
  const rows = await tx.execute<{ summary: ProjectSummary }>(sql`
    select json_build_object('id', p.id, 'name', p.name, 'description', p.description, 'version', p.version,
      'points', (select count(*) from points x where x.project_id = p.id),
      'dispensers', (select count(*) from dispensers x where x.project_id = p.id),
      'mapped', (select count(*) from assignments x where x.project_id = p.id and x.purpose = 'control'),
      'changedAt', to_char(l.at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"'), 'changedBy', who.name) as summary
    from projects p
    left join change_sets l on l.project_id = p.id and l.sequence = p.sequence
    left join people who on who.id = l.person_id
    order by lower(p.name), p.id`);
  return rows.map((row) => row.summary);
}

export async function findProject(tx: Tx, id: string): Promise<Row | undefined> {
  const [project] = await tx.select(columnsOf(projects, projectResource.Row)).from(projects).where(eq(projects.id, id));
  return project as unknown as Row | undefined;
}
