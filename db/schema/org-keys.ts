import type { AnyPgColumn, PgTableExtraConfigValue } from 'drizzle-orm/pg-core';
import { foreignKey, unique } from 'drizzle-orm/pg-core';
import { organisations } from './accounts.ts';

export interface OrgKeyed {
  readonly id: AnyPgColumn;
  readonly orgId: AnyPgColumn;
}

/** The composite key that children refer to, so that no row can point across organisations. */
export const orgKey = (table: string, t: OrgKeyed): PgTableExtraConfigValue[] => [
  unique(`${table}_key`).on(t.orgId, t.id),
  foreignKey({ name: `${table}_org_fk`, columns: [t.orgId], foreignColumns: [organisations.id] }),
];

/** A reference inside the same organisation, to its catalogue for instance. */
export const withinOrg = (name: string, t: { readonly orgId: AnyPgColumn }, column: AnyPgColumn, target: OrgKeyed): PgTableExtraConfigValue =>
  foreignKey({ name, columns: [t.orgId, column], foreignColumns: [target.orgId, target.id] });
