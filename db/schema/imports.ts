import { index, integer, jsonb, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import { bytea, createdAt } from './columns.ts';
import { belowProject } from './project-keys.ts';

/** An uploaded file, kept with its hash until the import is undone or expires. */
export const imports = pgTable('imports', {
  id: uuid().primaryKey(),
  orgId: uuid('org_id').notNull(),
  projectId: uuid('project_id').notNull(),
  personId: uuid('person_id').notNull(),
  fileName: text('file_name').notNull(),
  bytes: bytea().notNull(),
  sha256: text().notNull(),
  /** The settings of the commit: encoding, delimiter, mapping. Null until committed. */
  settings: jsonb(),
  /** Null until committed, or where the file changed nothing. */
  changeSetId: uuid('change_set_id'),
  created: integer().notNull().default(0),
  updated: integer().notNull().default(0),
  committedAt: timestamp('committed_at', { withTimezone: true }),
  expiresAt: timestamp('expires_at', { withTimezone: true }).notNull(),
  createdAt: createdAt(),
}, (t) => [belowProject('imports', t), index('imports_project_ix').on(t.projectId, t.createdAt)]).enableRLS();
