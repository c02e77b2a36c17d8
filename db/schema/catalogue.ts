import { sql } from 'drizzle-orm';
import type { AnyPgColumn } from 'drizzle-orm/pg-core';
import { bigint, check, doublePrecision, integer, jsonb, pgTable, text, unique } from 'drizzle-orm/pg-core';
import { createdAt, orgColumns } from './columns.ts';
import { orgKey } from './org-keys.ts';

/** A version never changes: an edit adds a row with the same name and the next version. */
const typeColumns = () => ({
  ...orgColumns(),
  name: text().notNull(),
  typeVersion: integer('type_version').notNull().default(1),
  createdAt: createdAt(),
});
const typeKey = (table: string, t: { orgId: AnyPgColumn; id: AnyPgColumn; name: AnyPgColumn; typeVersion: AnyPgColumn }) => [
  ...orgKey(table, t),
  unique(`${table}_version_uq`).on(t.orgId, t.name, t.typeVersion),
];
const polarity = { enum: ['sourcing', 'sinking'] } as const;

export const dispenserTypes = pgTable('dispenser_types', {
  ...typeColumns(),
  wiring: text({ enum: ['two-core', 'four-core'] }).notNull(),
  cartridgesUl: integer('cartridges_ul').array().notNull(),
  residualUl: integer('residual_ul').notNull(),
  doseMinUl: integer('dose_min_ul').notNull(),
  doseMaxUl: integer('dose_max_ul').notNull(),
  doseStepUl: integer('dose_step_ul').notNull(),
  runMsPerStep: integer('run_ms_per_step').notNull(),
  recoveryMs: integer('recovery_ms').notNull(),
  triggerMs: integer('trigger_ms'),
  timedMonths: integer('timed_months').array().notNull(),
  load: text({ enum: ['constant-current', 'constant-power'] }).notNull(),
  runA: doublePrecision('run_a').notNull(),
  peakA: doublePrecision('peak_a').notNull(),
  idleA: doublePrecision('idle_a').notNull(),
  minV: doublePrecision('min_v').notNull(),
  controlInputA: doublePrecision('control_input_a'),
  controlOnV: doublePrecision('control_on_v'),
  offStateA: doublePrecision('off_state_a').notNull(),
  controlPolarity: text('control_polarity', polarity).notNull(),
  status: jsonb().$type<{ polarity: 'sourcing' | 'sinking'; maxA: number; dropV: number; leakageA: number }>(),
  pins: jsonb().$type<Partial<Record<'supply' | 'pulse' | 'zero' | 'status', string>>>().notNull(),
  protectionLevels: text('protection_levels', { enum: ['Ga', 'Gb', 'Gc', 'Da', 'Db', 'Dc'] }).array().notNull(),
  maxSurfaceC: doublePrecision('max_surface_c'),
}, (t) => [
  ...typeKey('dispenser_types', t),
  check('dispenser_types_dose_ck', sql`${t.doseStepUl} > 0 and ${t.doseMinUl} >= ${t.doseStepUl} and ${t.doseMaxUl} >= ${t.doseMinUl} and ${t.residualUl} >= 0`),
  check('dispenser_types_electric_ck', sql`${t.runA} > 0 and ${t.peakA} >= ${t.runA} and ${t.idleA} >= 0 and ${t.minV} > 0 and ${t.runMsPerStep} > 0 and ${t.recoveryMs} >= 0`),
]).enableRLS();

export const moduleTypes = pgTable('module_types', {
  ...typeColumns(),
  kind: text({ enum: ['output', 'input'] }).notNull(),
  technology: text({ enum: ['transistor', 'relay', 'input'] }).notNull(),
  polarity: text(polarity).notNull(),
  channels: integer().notNull(),
  channelsPerGroup: integer('channels_per_group').notNull(),
  channelA: doublePrecision('channel_a'),
  groupA: doublePrecision('group_a'),
  moduleA: doublePrecision('module_a'),
  channelPeakA: doublePrecision('channel_peak_a'),
  dropV: doublePrecision('drop_v').notNull(),
  leakageA: doublePrecision('leakage_a').notNull(),
  shortCircuitA: doublePrecision('short_circuit_a'),
  minLoadA: doublePrecision('min_load_a'),
  ratedOperations: bigint('rated_operations', { mode: 'number' }),
  inputType: integer('input_type').$type<1 | 2 | 3>(),
  inputA: doublePrecision('input_a'),
}, (t) => [
  ...typeKey('module_types', t),
  check('module_types_channels_ck', sql`${t.channels} between 1 and 128 and ${t.channelsPerGroup} between 1 and ${t.channels}`),
  check('module_types_input_ck', sql`(${t.kind} = 'input') = (${t.inputType} is not null) and (${t.inputType} is null or ${t.inputType} between 1 and 3)`),
]).enableRLS();

export const cableTypes = pgTable('cable_types', {
  ...typeColumns(),
  crossSectionMm2: doublePrecision('cross_section_mm2').notNull(),
  conductorClass: integer('conductor_class').$type<2 | 5>().notNull(),
  cores: integer().notNull(),
  coreMarking: text('core_marking', { enum: ['numbered', 'coloured'] }).notNull(),
  coreColours: text('core_colours').array().notNull(),
}, (t) => [
  ...typeKey('cable_types', t),
  check('cable_types_ck', sql`${t.crossSectionMm2} > 0 and ${t.conductorClass} in (2, 5) and ${t.cores} > 0`),
]).enableRLS();

export const supplyTypes = pgTable('supply_types', {
  ...typeColumns(),
  ratedA: doublePrecision('rated_a').notNull(),
  deratingFromC: doublePrecision('derating_from_c').notNull(),
  deratingPercentPerK: doublePrecision('derating_percent_per_k').notNull(),
  tolerancePercent: doublePrecision('tolerance_percent'),
  shortCircuitA: doublePrecision('short_circuit_a').notNull(),
  extraLowVoltage: text('extra_low_voltage', { enum: ['SELV', 'PELV'] }).notNull(),
}, (t) => [
  ...typeKey('supply_types', t),
  check('supply_types_ck', sql`${t.ratedA} > 0 and ${t.deratingPercentPerK} >= 0 and ${t.shortCircuitA} > 0`),
]).enableRLS();

export const greases = pgTable('greases', {
  ...orgColumns(),
  name: text().notNull(),
  nlgi: text().notNull(),
  thickener: text().notNull(),
  densityGPerCm3: doublePrecision('density_g_per_cm3').notNull(),
  createdAt: createdAt(),
}, (t) => [
  ...orgKey('greases', t),
  unique('greases_name_uq').on(t.orgId, t.name),
  check('greases_density_ck', sql`${t.densityGPerCm3} between 0.5 and 2`),
]).enableRLS();
