import { sql } from 'drizzle-orm';
import { check, doublePrecision, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { dispenserTypes, greases } from './catalogue.ts';
import { projectColumns, wholeNumber } from './columns.ts';
import { controllers } from './hardware.ts';
import { cableNodes, circuits } from './wiring.ts';
import { withinOrg } from './org-keys.ts';
import { projectKey, withinProject } from './project-keys.ts';

export interface BearingFactorsColumn {
  temperature: number;
  contamination: number;
  moisture: number;
  vibration: number;
  position: number;
  design: number;
}

export const points = pgTable('points', {
  ...projectColumns(),
  tag: text().notNull(),
  description: text(),
  function: text(),
  location: text(),
  product: text(),
  machine: text(),
  remarks: text(),
  hoursPerDay: doublePrecision('hours_per_day'),
  daysPerWeek: doublePrecision('days_per_week').notNull().default(7),
  demandWay: text('demand_way', { enum: ['bearing', 'stated', 'practice'] }),
  boreMm: doublePrecision('bore_mm'),
  outsideMm: doublePrecision('outside_mm'),
  widthMm: doublePrecision('width_mm'),
  speedRpm: doublePrecision('speed_rpm'),
  factors: jsonb().$type<BearingFactorsColumn>().notNull()
    .default({ temperature: 1, contamination: 1, moisture: 1, vibration: 1, position: 1, design: 1 }),
  statedUl: wholeNumber('stated_ul'),
  statedPer: text('stated_per', { enum: ['1000h', '100h', 'running-day', 'week', 'month'] }).notNull().default('1000h'),
  practiceStrokes: doublePrecision('practice_strokes'),
  practiceGramsPerStroke: doublePrecision('practice_grams_per_stroke'),
  practiceEveryDays: doublePrecision('practice_every_days'),
  greaseId: uuid('grease_id'),
  zone: text({ enum: ['0', '1', '2', '20', '21', '22', 'none'] }),
}, (t) => [
  ...projectKey('points', t),
  withinOrg('points_grease_fk', t, t.greaseId, greases),
  unique('points_tag_uq').on(t.projectId, t.tag),
  check('points_tag_ck', sql`length(${t.tag}) between 1 and 200 and ${t.tag} = btrim(${t.tag})`),
  check('points_hours_ck', sql`(${t.hoursPerDay} is null or (${t.hoursPerDay} > 0 and ${t.hoursPerDay} <= 24)) and ${t.daysPerWeek} > 0 and ${t.daysPerWeek} <= 7`),
  check('points_bearing_ck', sql`${t.boreMm} > 0 and ${t.outsideMm} > 0 and ${t.widthMm} > 0 and ${t.speedRpm} > 0 and ${t.outsideMm} > ${t.boreMm}`),
  check('points_demand_ck', sql`${t.statedUl} > 0 and ${t.practiceStrokes} > 0 and ${t.practiceGramsPerStroke} > 0 and ${t.practiceEveryDays} > 0`),
]).enableRLS();

export const dispensers = pgTable('dispensers', {
  ...projectColumns(),
  pointId: uuid('point_id').notNull(),
  typeId: uuid('type_id'),
  wiring: text({ enum: ['two-core', 'four-core'] }),
  method: text({ enum: ['pulse', 'timed'] }).notNull().default('pulse'),
  cartridgeUl: integer('cartridge_ul'),
  doseUl: integer('dose_ul'),
  periodMonths: integer('period_months'),
  controllerId: uuid('controller_id'),
  circuitId: uuid('circuit_id'),
  nodeId: uuid('node_id'),
  cableTag: text('cable_tag'),
  cableLengthM: doublePrecision('cable_length_m'),
  crossSectionMm2: doublePrecision('cross_section_mm2'),
  conductorClass: integer('conductor_class').$type<2 | 5>().notNull().default(5),
}, (t) => [
  ...projectKey('dispensers', t),
  withinProject('dispensers_point_fk', t, t.pointId, points),
  withinOrg('dispensers_type_fk', t, t.typeId, dispenserTypes),
  withinProject('dispensers_controller_fk', t, t.controllerId, controllers),
  withinProject('dispensers_circuit_fk', t, t.circuitId, circuits),
  withinProject('dispensers_node_fk', t, t.nodeId, cableNodes),
  unique('dispensers_point_uq').on(t.pointId),
  check('dispensers_dose_ck', sql`${t.cartridgeUl} > 0 and ${t.doseUl} > 0 and ${t.doseUl} % 100 = 0 and ${t.periodMonths} > 0`),
  check('dispensers_cable_ck', sql`${t.cableLengthM} > 0 and ${t.crossSectionMm2} > 0 and ${t.conductorClass} in (2, 5)`),
]).enableRLS();
