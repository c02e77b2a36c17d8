import type { Assignment, Design, Dispenser, Point, Uuid } from '#calc';
import { DesignIndex } from './design-index.ts';
import type { ImportPlan, ImportValues, PlannedRow } from './plan.ts';
import { SIGNAL_KEYS } from './row-reading.ts';

export interface RowUpdate<T> {
  readonly id: Uuid;
  readonly fields: Partial<Omit<T, 'id'>>;
}

/**
 * Rows to write. Execute in this order, for the constraints' sake: remove assignments, points, dispensers,
 * create assignments.
 */
export interface ImportChanges {
  readonly points: { readonly create: readonly Point[]; readonly update: readonly RowUpdate<Point>[] };
  readonly dispensers: { readonly create: readonly Dispenser[]; readonly update: readonly RowUpdate<Dispenser>[] };
  readonly assignments: { readonly create: readonly Assignment[]; readonly remove: readonly Uuid[] };
}

type Draft<T> = { -readonly [K in keyof T]: T[K] };

interface Collected {
  points: { create: Point[]; update: RowUpdate<Point>[] };
  dispensers: { create: Dispenser[]; update: RowUpdate<Dispenser>[] };
  assignments: { create: Assignment[]; remove: Uuid[] };
}

/**
 * Turns a plan into the rows that carry it out. Held, skipped and unchanged rows give none; a blank cell
 * never erases what the project has.
 *
 * @param plan made from this very design
 * @param newId gives the ids of new rows
 */
export function changesOf(plan: ImportPlan, design: Design, newId: () => Uuid): ImportChanges {
  const index = DesignIndex.of(design);
  const changes: Collected = {
    points: { create: [], update: [] },
    dispensers: { create: [], update: [] },
    assignments: { create: [], remove: [] },
  };
  for (const row of plan.rows) {
    if (row.action === 'create') createPoint(row, index, newId, changes);
    if (row.action === 'update') updatePoint(row, index, newId, changes);
  }
  return changes;
}

function createPoint({ values }: PlannedRow, index: DesignIndex, newId: () => Uuid, changes: Collected): void {
  const point: Point = Object.assign(newPoint(newId(), values.tag!), pointFields(values, index));
  const dispenser: Dispenser = Object.assign(newDispenser(newId(), point.id), dispenserFields(values, index));
  changes.points.create.push(point);
  changes.dispensers.create.push(dispenser);
  assign(values, dispenser, values.controller, index, newId, changes);
}

function updatePoint(row: PlannedRow, index: DesignIndex, newId: () => Uuid, changes: Collected): void {
  const point = index.pointByTag.get(row.values.tag!)!;
  const changed = changedValues(row);
  const forPoint = pointFields(changed, index, point);
  if (Object.keys(forPoint).length > 0) changes.points.update.push({ id: point.id, fields: forPoint });
  const forDispenser = dispenserFields(changed, index);
  const existing = index.dispenserByPoint.get(point.id);
  const controller = row.values.controller ?? index.valuesOf(point).controller;
  if (existing) {
    if (Object.keys(forDispenser).length > 0) changes.dispensers.update.push({ id: existing.id, fields: forDispenser });
    assign(changed, { ...existing, ...forDispenser }, controller, index, newId, changes);
  } else if (saysOfDispenser(changed, forDispenser)) {
    const dispenser = { ...newDispenser(newId(), point.id), ...forDispenser };
    changes.dispensers.create.push(dispenser);
    assign(changed, dispenser, controller, index, newId, changes);
  }
}

function saysOfDispenser(values: Partial<ImportValues>, fields: Partial<Dispenser>): boolean {
  return Object.keys(fields).length > 0 || values.outputAddress !== undefined || values.statusAddress !== undefined;
}

/** Of the row's values those that differ; a channel is taken whole, since each part needs the others. */
function changedValues({ values, changes }: PlannedRow): Partial<ImportValues> {
  const fields = new Set<keyof ImportValues>(changes.map((each) => each.field));
  for (const { module, channel, address } of Object.values(SIGNAL_KEYS)) {
    if ([module, channel, address].some((key) => fields.has(key)))
      [module, channel, address].forEach((key) => fields.add(key));
  }
  return Object.fromEntries([...fields].map((field) => [field, values[field]]));
}

const POINT_TEXTS = ['description', 'function', 'location', 'product', 'machine', 'remarks'] as const;
const POINT_NUMBERS = ['boreMm', 'outsideMm', 'widthMm', 'speedRpm', 'hoursPerDay', 'daysPerWeek'] as const;
const DISPENSER_VALUES = ['wiring', 'cartridgeUl', 'doseUl', 'cableTag', 'cableLengthM', 'crossSectionMm2'] as const;

/** Columns of the point that these values fill; blank ones are left out. */
function pointFields(values: Partial<ImportValues>, index: DesignIndex, old?: Point): Partial<Draft<Point>> {
  const fields: Partial<Draft<Point>> = {};
  give(fields, values, POINT_TEXTS);
  give(fields, values, POINT_NUMBERS);
  addDemand(fields, values, old);
  if (values.grease) fields.greaseId = index.greaseNamed(values.grease)!.id;
  return fields;
}

/** A stated demand counts before a bearing; a bearing alone decides only where nobody has decided yet. */
function addDemand(fields: Partial<Draft<Point>>, values: Partial<ImportValues>, old?: Point): void {
  const { demandUlPer100h, demandUlPer1000h } = values;
  const stated = demandUlPer100h ?? demandUlPer1000h;
  if (stated != null) {
    fields.demandWay = 'stated';
    fields.statedUl = stated;
    fields.statedPer = demandUlPer100h != null ? '100h' : '1000h';
  } else if ((values.boreMm ?? values.outsideMm ?? values.widthMm) != null && (old?.demandWay ?? null) === null) {
    fields.demandWay = 'bearing';
  }
}

/** Columns of the dispenser that these values fill; blank ones are left out. */
function dispenserFields(values: Partial<ImportValues>, index: DesignIndex): Partial<Draft<Dispenser>> {
  const { dispenserType, controller, circuit, junctionBox } = values;
  const fields: Partial<Draft<Dispenser>> = {};
  give(fields, values, DISPENSER_VALUES);
  if (dispenserType) fields.typeId = index.typeNamed(dispenserType)!.id;
  if (controller) fields.controllerId = index.controllerNamed(controller)!.id;
  if (circuit) fields.circuitId = index.circuitNamed(circuit)!.id;
  if (junctionBox) fields.nodeId = index.boxNamed(junctionBox)!.id;
  return fields;
}

/** Columns that are named and typed as the values are. */
function give<K extends keyof ImportValues>(fields: Partial<Record<K, ImportValues[K]>>, values: Partial<ImportValues>, keys: readonly K[]): void {
  for (const key of keys) if (values[key] != null) fields[key] = values[key];
}

/** @param controller the name of the controller whose channels the row means */
function assign(
  values: Partial<ImportValues>,
  dispenser: Dispenser,
  controller: string | null,
  index: DesignIndex,
  newId: () => Uuid,
  changes: Collected,
): void {
  for (const purpose of ['control', 'status'] as const) {
    const keys = SIGNAL_KEYS[purpose];
    const channel = values[keys.channel];
    if (channel == null) continue;
    const name = values[keys.module]!;
    const owner = controller === null ? undefined : index.controllerNamed(controller);
    const module = owner && index.moduleNamed(owner.id, name);
    if (!module) throw new Error(`The plan names a ${purpose} module ${name} that its design does not have.`);
    const old = index.assignmentOf(dispenser, purpose);
    if (old) changes.assignments.remove.push(old.id);
    changes.assignments.create.push({ id: newId(), dispenserId: dispenser.id, moduleId: module.id, channel, purpose });
  }
}

function newPoint(id: Uuid, tag: string): Point {
  return {
    id,
    tag,
    description: null,
    function: null,
    location: null,
    product: null,
    machine: null,
    remarks: null,
    hoursPerDay: null,
    daysPerWeek: 7,
    demandWay: null,
    boreMm: null,
    outsideMm: null,
    widthMm: null,
    speedRpm: null,
    factors: { temperature: 1, contamination: 1, moisture: 1, vibration: 1, position: 1, design: 1 },
    statedUl: null,
    statedPer: '1000h',
    practiceStrokes: null,
    practiceGramsPerStroke: null,
    practiceEveryDays: null,
    greaseId: null,
    zone: null,
  };
}

function newDispenser(id: Uuid, pointId: Uuid): Dispenser {
  return {
    id,
    pointId,
    typeId: null,
    wiring: null,
    method: 'pulse',
    cartridgeUl: null,
    doseUl: null,
    periodMonths: null,
    controllerId: null,
    circuitId: null,
    nodeId: null,
    cableTag: null,
    cableLengthM: null,
    crossSectionMm2: null,
    conductorClass: 5,
  };
}
