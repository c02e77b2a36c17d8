import { boolean, foreignKey, index, integer, jsonb, pgTable, primaryKey, text, timestamp, unique, uuid } from 'drizzle-orm/pg-core';
import { organisations } from './accounts.ts';
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
  /** How the file was last read: sheets, encoding, delimiter, mapping. Null: everything as detected. */
  settings: jsonb(),
  /** Null until committed, or where the file changed nothing. */
  changeSetId: uuid('change_set_id'),
  created: integer().notNull().default(0),
  updated: integer().notNull().default(0),
  committedAt: timestamp('committed_at', { withTimezone: true }),
  expiresAt: timestamp('expires_at', { withTimezone: true }).notNull(),
  createdAt: createdAt(),
}, (t) => [
  belowProject('imports', t),
  unique('imports_key').on(t.orgId, t.projectId, t.id),
  index('imports_project_ix').on(t.projectId, t.createdAt),
]).enableRLS();

/** An import that is being read or written now: how far it is, and whether somebody wants it to stop. */
export const importWork = pgTable('import_work', {
  importId: uuid('import_id').primaryKey(),
  orgId: uuid('org_id').notNull(),
  projectId: uuid('project_id').notNull(),
  stage: text().notNull(),
  /** Rows done of `total`; total is null while nobody can know it. */
  done: integer().notNull().default(0),
  total: integer(),
  cancelled: boolean().notNull().default(false),
  startedAt: timestamp('started_at', { withTimezone: true }).notNull().defaultNow(),
}, (t) => [
  foreignKey({ name: 'import_work_import_fk', columns: [t.orgId, t.projectId, t.importId], foreignColumns: [imports.orgId, imports.projectId, imports.id] })
    .onDelete('cascade'),
]).enableRLS();

/** Which field the organisation last gave to a column with this heading; null: left out. */
export const importHeadings = pgTable('import_headings', {
  orgId: uuid('org_id').notNull().references(() => organisations.id),
  heading: text().notNull(),
  field: text(),
  usedAt: timestamp('used_at', { withTimezone: true }).notNull().defaultNow(),
}, (t) => [primaryKey({ columns: [t.orgId, t.heading] })]).enableRLS();

/** Which value of a project the organisation last took a text in a file for; null: read as blank. */
export const importTexts = pgTable('import_texts', {
  orgId: uuid('org_id').notNull().references(() => organisations.id),
  field: text().notNull(),
  text: text().notNull(),
  value: text(),
  usedAt: timestamp('used_at', { withTimezone: true }).notNull().defaultNow(),
}, (t) => [primaryKey({ columns: [t.orgId, t.field, t.text] })]).enableRLS();
