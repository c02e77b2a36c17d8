import { sql } from 'drizzle-orm';
import { boolean, check, doublePrecision, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { supplyTypes } from './catalogue.ts';
import { projectColumns } from './columns.ts';
import { cabinets, modules } from './hardware.ts';
import { withinOrg } from './org-keys.ts';
import { projectKey, withinProject } from './project-keys.ts';

export const supplies = pgTable('supplies', {
  ...projectColumns(),
  cabinetId: uuid('cabinet_id').notNull(),
  typeId: uuid('type_id').notNull(),
  name: text().notNull(),
  setV: doublePrecision('set_v').notNull(),
  internalOhm: doublePrecision('internal_ohm').notNull().default(0),
  otherLoadA: doublePrecision('other_load_a').notNull().default(0),
  redundant: boolean().notNull().default(false),
}, (t) => [
  ...projectKey('supplies', t),
  withinProject('supplies_cabinet_fk', t, t.cabinetId, cabinets),
  withinOrg('supplies_type_fk', t, t.typeId, supplyTypes),
  unique('supplies_name_uq').on(t.projectId, t.cabinetId, t.name),
  check('supplies_ck', sql`${t.setV} between 18 and 30 and ${t.internalOhm} >= 0 and ${t.otherLoadA} >= 0`),
]).enableRLS();

export const circuits = pgTable('circuits', {
  ...projectColumns(),
  supplyId: uuid('supply_id').notNull(),
  name: text().notNull(),
  protection: text({ enum: ['breaker-B', 'breaker-C', 'electronic', 'fuse'] }).notNull(),
  protectionA: doublePrecision('protection_a').notNull(),
  protectionOhm: doublePrecision('protection_ohm').notNull().default(0),
  concurrencyLimit: integer('concurrency_limit'),
}, (t) => [
  ...projectKey('circuits', t),
  withinProject('circuits_supply_fk', t, t.supplyId, supplies),
  unique('circuits_name_uq').on(t.projectId, t.name),
  check('circuits_ck', sql`${t.protectionA} > 0 and ${t.protectionOhm} >= 0 and (${t.concurrencyLimit} is null or ${t.concurrencyLimit} > 0)`),
]).enableRLS();

/** A junction box with the trunk that leads to it. */
export const cableNodes = pgTable('cable_nodes', {
  ...projectColumns(),
  circuitId: uuid('circuit_id').notNull(),
  parentId: uuid('parent_id'),
  location: text().notNull(),
  cableTag: text('cable_tag').notNull(),
  lengthM: doublePrecision('length_m').notNull(),
  powerMm2: doublePrecision('power_mm2').notNull(),
  signalMm2: doublePrecision('signal_mm2').notNull(),
  conductorClass: integer('conductor_class').$type<2 | 5>().notNull().default(5),
}, (t) => [
  ...projectKey('cable_nodes', t),
  withinProject('cable_nodes_circuit_fk', t, t.circuitId, circuits),
  withinProject('cable_nodes_parent_fk', t, t.parentId, t),
  unique('cable_nodes_location_uq').on(t.circuitId, t.location),
  check('cable_nodes_ck', sql`${t.lengthM} > 0 and ${t.powerMm2} > 0 and ${t.signalMm2} > 0 and ${t.conductorClass} in (2, 5) and ${t.parentId} is distinct from ${t.id}`),
]).enableRLS();

/** A group of an output module with the circuit that feeds it. */
export const moduleGroups = pgTable('module_groups', {
  ...projectColumns(),
  moduleId: uuid('module_id').notNull(),
  groupIndex: integer('group_index').notNull(),
  circuitId: uuid('circuit_id'),
}, (t) => [
  ...projectKey('module_groups', t),
  withinProject('module_groups_module_fk', t, t.moduleId, modules),
  withinProject('module_groups_circuit_fk', t, t.circuitId, circuits),
  unique('module_groups_index_uq').on(t.moduleId, t.groupIndex),
  check('module_groups_ck', sql`${t.groupIndex} >= 0`),
]).enableRLS();
