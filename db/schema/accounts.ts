import { sql } from 'drizzle-orm';
import { check, foreignKey, index, pgTable, primaryKey, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { createdAt } from './columns.ts';

export const organisations = pgTable('organisations', {
  id: uuid().primaryKey(),
  name: text().notNull(),
  createdAt: createdAt(),
});

/** A person signs in once and may belong to several organisations. */
export const people = pgTable('people', {
  id: uuid().primaryKey(),
  email: text().notNull(),
  name: text().notNull(),
  passwordHash: text('password_hash').notNull(),
  createdAt: createdAt(),
}, (t) => [uniqueIndex('people_email_uq').on(sql`lower(${t.email})`)]);

export const memberships = pgTable('memberships', {
  orgId: uuid('org_id').notNull().references(() => organisations.id),
  personId: uuid('person_id').notNull().references(() => people.id),
  roles: text().array().notNull(),
  createdAt: createdAt(),
}, (t) => [
  primaryKey({ name: 'memberships_pk', columns: [t.orgId, t.personId] }),
  check('memberships_roles_ck', sql`${t.roles} <@ array['engineer','electrician','commissioning','technician','administrator','viewer']::text[] and cardinality(${t.roles}) > 0`),
]);

/** A sign-in on one device. The refresh token is kept hashed and changes at every use. */
export const sessions = pgTable('sessions', {
  id: uuid().primaryKey(),
  orgId: uuid('org_id').notNull(),
  personId: uuid('person_id').notNull(),
  refreshHash: text('refresh_hash').notNull(),
  /** The token before, accepted for a few seconds: two tabs may refresh at once. */
  previousHash: text('previous_hash'),
  rotatedAt: timestamp('rotated_at', { withTimezone: true }).notNull().defaultNow(),
  expiresAt: timestamp('expires_at', { withTimezone: true }).notNull(),
  revokedAt: timestamp('revoked_at', { withTimezone: true }),
  userAgent: text('user_agent').notNull().default(''),
  createdAt: createdAt(),
}, (t) => [
  foreignKey({ name: 'sessions_membership_fk', columns: [t.orgId, t.personId], foreignColumns: [memberships.orgId, memberships.personId] }).onDelete('cascade'),
  index('sessions_refresh_ix').on(t.refreshHash),
  index('sessions_previous_ix').on(t.previousHash),
]);
