import { bigint, foreignKey, index, jsonb, pgTable, text, timestamp, unique, uuid } from 'drizzle-orm/pg-core';
import { belowProject, withinProject } from './project-keys.ts';

/** One edit: who, when, what. Undo, audit view and live events are readings of these two tables. */
export const changeSets = pgTable('change_sets', {
  id: uuid().primaryKey(),
  orgId: uuid('org_id').notNull(),
  projectId: uuid('project_id').notNull(),
  sequence: bigint({ mode: 'number' }).notNull(),
  personId: uuid('person_id').notNull(),
  at: timestamp({ withTimezone: true }).notNull().defaultNow(),
  summary: text().notNull(),
  /** The set that this one took back; null for an ordinary edit. Redo is a set that undoes an undo. */
  undoes: uuid(),
}, (t) => [
  unique('change_sets_sequence_uq').on(t.projectId, t.sequence),
  unique('change_sets_key').on(t.orgId, t.projectId, t.id),
  belowProject('change_sets', t),
  foreignKey({ name: 'change_sets_undoes_fk', columns: [t.orgId, t.projectId, t.undoes], foreignColumns: [t.orgId, t.projectId, t.id] }),
  index('change_sets_undoes_ix').on(t.undoes),
]).enableRLS();

/** A row that a change set touched. `before` is null for a creation, `after` for a deletion. */
export const changeItems = pgTable('change_items', {
  id: uuid().primaryKey(),
  orgId: uuid('org_id').notNull(),
  projectId: uuid('project_id').notNull(),
  changeSetId: uuid('change_set_id').notNull(),
  collection: text().notNull(),
  rowId: uuid('row_id').notNull(),
  before: jsonb(),
  after: jsonb(),
}, (t) => [
  withinProject('change_items_set_fk', t, t.changeSetId, changeSets),
  index('change_items_set_ix').on(t.changeSetId),
  index('change_items_row_ix').on(t.projectId, t.rowId),
]).enableRLS();
