import { sql } from 'drizzle-orm';
import { check, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { projectColumns } from './columns.ts';
import { modules } from './hardware.ts';
import { dispensers } from './points.ts';
import { projectKey, withinProject } from './project-keys.ts';

/** One dispenser a channel, and one channel a dispenser and purpose. */
export const assignments = pgTable('assignments', {
  ...projectColumns(),
  dispenserId: uuid('dispenser_id').notNull(),
  moduleId: uuid('module_id').notNull(),
  channel: integer().notNull(),
  purpose: text({ enum: ['control', 'status'] }).notNull(),
}, (t) => [
  ...projectKey('assignments', t),
  withinProject('assignments_dispenser_fk', t, t.dispenserId, dispensers),
  withinProject('assignments_module_fk', t, t.moduleId, modules),
  unique('assignments_channel_uq').on(t.moduleId, t.channel),
  unique('assignments_purpose_uq').on(t.dispenserId, t.purpose),
  check('assignments_channel_ck', sql`${t.channel} >= 0`),
]).enableRLS();
