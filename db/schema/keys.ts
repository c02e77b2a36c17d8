import type { AnyPgColumn, PgTableExtraConfigValue } from 'drizzle-orm/pg-core';
import { foreignKey, index, unique } from 'drizzle-orm/pg-core';
import { organisations } from './accounts.ts';
import { projects } from './projects.ts';

interface OrgKeyed {
  readonly id: AnyPgColumn;
  readonly orgId: AnyPgColumn;
}

interface ProjectKeyed extends OrgKeyed {
  readonly projectId: AnyPgColumn;
}

/** The composite key that children refer to, so that no row can point across organisations. */
export const orgKey = (table: string, t: OrgKeyed): PgTableExtraConfigValue[] => [
  unique(`${table}_key`).on(t.orgId, t.id),
  foreignKey({ name: `${table}_org_fk`, columns: [t.orgId], foreignColumns: [organisations.id] }),
];

/** The same below a project: no row can point across projects either. */
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

/** A reference inside the same organisation, to its catalogue for instance. */
export const withinOrg = (name: string, t: { readonly orgId: AnyPgColumn }, column: AnyPgColumn, target: OrgKeyed): PgTableExtraConfigValue =>
  foreignKey({ name, columns: [t.orgId, column], foreignColumns: [target.orgId, target.id] });
