import { sql } from 'drizzle-orm';
import { bigint, check, doublePrecision, integer, pgTable, text, unique } from 'drizzle-orm/pg-core';
import { createdAt, orgColumns, wholeNumber } from './columns.ts';
import { orgKey } from './org-keys.ts';

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
