import { sql } from 'drizzle-orm';
import { check, doublePrecision, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { moduleTypes } from './catalogue.ts';
import { projectColumns } from './columns.ts';
import { withinOrg } from './org-keys.ts';
import { projectKey, withinProject } from './project-keys.ts';

export const cabinets = pgTable('cabinets', {
  ...projectColumns(),
  location: text().notNull(),
  description: text().notNull().default(''),
  temperatureC: doublePrecision('temperature_c').notNull().default(40),
}, (t) => [...projectKey('cabinets', t), unique('cabinets_location_uq').on(t.projectId, t.location)]).enableRLS();

export const controllers = pgTable('controllers', {
  ...projectColumns(),
  cabinetId: uuid('cabinet_id').notNull(),
  name: text().notNull(),
}, (t) => [
  ...projectKey('controllers', t),
  withinProject('controllers_cabinet_fk', t, t.cabinetId, cabinets),
  unique('controllers_name_uq').on(t.projectId, t.name),
]).enableRLS();

export const modules = pgTable('modules', {
  ...projectColumns(),
  controllerId: uuid('controller_id').notNull(),
  typeId: uuid('type_id').notNull(),
  name: text().notNull(),
  baseByte: integer('base_byte').notNull(),
  slot: integer().notNull(),
}, (t) => [
  ...projectKey('modules', t),
  withinProject('modules_controller_fk', t, t.controllerId, controllers),
  withinOrg('modules_type_fk', t, t.typeId, moduleTypes),
  unique('modules_name_uq').on(t.controllerId, t.name),
  check('modules_ck', sql`${t.baseByte} between 0 and 65535 and ${t.slot} >= 0`),
]).enableRLS();
