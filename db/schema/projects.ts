import { sql } from 'drizzle-orm';
import { bigint, check, doublePrecision, index, integer, jsonb, pgTable, text, timestamp, unique, uuid } from 'drizzle-orm/pg-core';
import { createdAt, orgColumns, wholeNumber } from './columns.ts';
import { belowProject, orgKey, withinProject } from './keys.ts';

export const projects = pgTable('projects', {
  ...orgColumns(),
  version: integer().notNull().default(1),
  /** Number of the latest change set: the ETag of the whole project. */
  sequence: bigint({ mode: 'number' }).notNull().default(0),
  name: text().notNull(),
  description: text().notNull().default(''),
  timeZone: text('time_zone').notNull().default('UTC'),
  voltageTempC: doublePrecision('voltage_temp_c').notNull().default(40),
  tripTempC: doublePrecision('trip_temp_c').notNull().default(70),
  sparePercent: doublePrecision('spare_percent').notNull().default(20),
  supplyMarginPercent: doublePrecision('supply_margin_percent').notNull().default(25),
  maxCartridgeDays: integer('max_cartridge_days').notNull().default(365),
  minCartridgeDays: integer('min_cartridge_days').notNull().default(30),
  maxOverGreasingPercent: doublePrecision('max_over_greasing_percent').notNull().default(5),
  relayLifeYears: doublePrecision('relay_life_years').notNull().default(10),
  slotMs: wholeNumber('slot_ms'),
  breakerDcFactor: doublePrecision('breaker_dc_factor').notNull().default(1.5),
  rankBy: text('rank_by', { enum: ['fewest-changes', 'smallest-dose', 'least-over'] }).notNull().default('fewest-changes'),
  demandPer: text('demand_per', { enum: ['1000h', '100h', 'running-day', 'week'] }).notNull().default('1000h'),
  createdAt: createdAt(),
}, (t) => [
  ...orgKey('projects', t),
  unique('projects_name_uq').on(t.orgId, t.name),
  check('projects_ranges_ck', sql`${t.sparePercent} between 0 and 100 and ${t.supplyMarginPercent} between 0 and 400 and ${t.maxCartridgeDays} > 0 and ${t.minCartridgeDays} >= 0 and ${t.maxOverGreasingPercent} >= 0 and ${t.relayLifeYears} > 0 and ${t.breakerDcFactor} >= 1 and (${t.slotMs} is null or ${t.slotMs} > 0)`),
]).enableRLS();

/** One edit: who, when, what. Undo, audit view and live events are readings of these two tables. */
export const changeSets = pgTable('change_sets', {
  id: uuid().primaryKey(),
  orgId: uuid('org_id').notNull(),
  projectId: uuid('project_id').notNull(),
  sequence: bigint({ mode: 'number' }).notNull(),
  personId: uuid('person_id').notNull(),
  at: timestamp({ withTimezone: true }).notNull().defaultNow(),
  summary: text().notNull(),
}, (t) => [
  unique('change_sets_sequence_uq').on(t.projectId, t.sequence),
  unique('change_sets_key').on(t.orgId, t.projectId, t.id),
  belowProject('change_sets', t),
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
