import { bigint, customType, integer, timestamp, uuid } from 'drizzle-orm/pg-core';

/** What every table below an organisation starts with. */
export const orgColumns = () => ({
  id: uuid().primaryKey(),
  orgId: uuid('org_id').notNull(),
});

/** What every table below a project starts with; rows that people edit carry a version. */
export const projectColumns = () => ({
  ...orgColumns(),
  projectId: uuid('project_id').notNull(),
  version: integer().notNull().default(1),
});

export const createdAt = () => timestamp('created_at', { withTimezone: true }).notNull().defaultNow();

/** Whole microlitres or milliseconds: beyond 32 bits, yet exact in a JavaScript number. */
export const wholeNumber = (name: string) => bigint(name, { mode: 'number' });

export const bytea = customType<{ data: Buffer }>({ dataType: () => 'bytea' });
