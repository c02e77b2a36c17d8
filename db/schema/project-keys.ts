import type { AnyPgColumn, PgTableExtraConfigValue } from 'drizzle-orm/pg-core';
import { foreignKey, index, unique } from 'drizzle-orm/pg-core';
import type { OrgKeyed } from './org-keys.ts';
import { projects } from './projects.ts';

interface ProjectKeyed extends OrgKeyed {
  readonly projectId: AnyPgColumn;
}

/** The composite key that children refer to, so that no row can point across organisations or projects. */
export const projectKey = (table: string, t: ProjectKeyed): PgTableExtraConfigValue[] => [
  unique(`${table}_key`).on(t.orgId, t.projectId, t.id),
  index(`${table}_project_ix`).on(t.projectId, t.id),
  belowProject(table, t),
];

/** A row belongs to a project of its own organisation. */
export const belowProject = (table: string, t: Omit<ProjectKeyed, 'id'>): PgTableExtraConfigValue =>
  foreignKey({ name: `${table}_project_fk`, columns: [t.orgId, t.projectId], foreignColumns: [projects.orgId, projects.id] });

/** A reference inside the same project. A null column refers to nothing. */
export const withinProject = (name: string, t: ProjectKeyed, column: AnyPgColumn, target: ProjectKeyed): PgTableExtraConfigValue =>
  foreignKey({ name, columns: [t.orgId, t.projectId, column], foreignColumns: [target.orgId, target.projectId, target.id] });
