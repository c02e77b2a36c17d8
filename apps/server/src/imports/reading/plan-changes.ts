import type { Assignment, Design, Dispenser, Point, Purpose, Uuid } from '#calc';
import { DesignIndex, nameKey } from './design-index.ts';
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
  const index = new DesignIndex(design);
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
  const point: Point = { ...newPoint(newId(), values.tag!), ...pointFields(values, index) };
  const dispenser: Dispenser = { ...newDispenser(newId(), point.id), ...dispenserFields(values, index) };
  changes.points.create.push(point);
  changes.dispensers.create.push(dispenser);
  assign(values, dispenser, index, newId, changes);
}

function updatePoint(row: PlannedRow, index: DesignIndex, newId: () => Uuid, changes: Collected): void {
  const point = index.pointByTag.get(row.values.tag!)!;
  const changed = changedValues(row);
  const forPoint = pointFields(changed, index, point);
  if (Object.keys(forPoint).length > 0) changes.points.update.push({ id: point.id, fields: forPoint });
  const forDispenser = dispenserFields(changed, index);
  const existing = index.dispenserByPoint.get(point.id);
  if (existing) {
    if (Object.keys(forDispenser).length > 0) changes.dispensers.update.push({ id: existing.id, fields: forDispenser });
    assign(changed, { ...existing, ...forDispenser }, index, newId, changes);
  } else if (saysOfDispenser(changed, forDispenser)) {
    const dispenser = { ...newDispenser(newId(), point.id), ...forDispenser };
    changes.dispensers.create.push(dispenser);
    assign(changed, dispenser, index, newId, changes);
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
  const greaseId = values.grease ? index.greaseNamed(values.grease)!.id : undefined;
  return {
    ...given(values, POINT_TEXTS),
    ...given(values, POINT_NUMBERS),
    ...demandFields(values, old),
    ...(greaseId && { greaseId }),
  } as Partial<Draft<Point>>;
}

/** A stated demand counts before a bearing; a bearing alone decides only where nobody has decided yet. */
function demandFields(values: Partial<ImportValues>, old?: Point): Partial<Draft<Point>> {
  const { demandUlPer100h, demandUlPer1000h } = values;
  if (demandUlPer100h != null) return { demandWay: 'stated', statedUl: demandUlPer100h, statedPer: '100h' };
  if (demandUlPer1000h != null) return { demandWay: 'stated', statedUl: demandUlPer1000h, statedPer: '1000h' };
  const bearing = [values.boreMm, values.outsideMm, values.widthMm].some((each) => each != null);
  return bearing && (old?.demandWay ?? null) === null ? { demandWay: 'bearing' } : {};
}

/** Columns of the dispenser that these values fill; blank ones are left out. */
function dispenserFields(values: Partial<ImportValues>, index: DesignIndex): Partial<Draft<Dispenser>> {
  const { dispenserType, controller, circuit, junctionBox } = values;
  return {
    ...given(values, DISPENSER_VALUES),
    ...(dispenserType && { typeId: index.typeNamed(dispenserType)!.id }),
    ...(controller && { controllerId: index.controllerNamed(controller)!.id }),
    ...(circuit && { circuitId: index.circuitNamed(circuit)!.id }),
    ...(junctionBox && { nodeId: index.boxNamed(junctionBox)!.id }),
  };
}

function given(values: Partial<ImportValues>, keys: readonly (keyof ImportValues)[]): Partial<ImportValues> {
  return Object.fromEntries(keys.filter((key) => values[key] != null).map((key) => [key, values[key]]));
}

function assign(
  values: Partial<ImportValues>,
  dispenser: Dispenser,
  index: DesignIndex,
  newId: () => Uuid,
  changes: Collected,
): void {
  for (const purpose of ['control', 'status'] as const) {
    const keys = SIGNAL_KEYS[purpose];
    const channel = values[keys.channel];
    if (channel == null) continue;
    const module = moduleNamed(values[keys.module]!, dispenser.controllerId, purpose, index);
    const old = index.assignmentOf(dispenser, purpose);
    if (old) changes.assignments.remove.push(old.id);
    changes.assignments.create.push({ id: newId(), dispenserId: dispenser.id, moduleId: module, channel, purpose });
  }
}

function moduleNamed(name: string, controllerId: Uuid | null, purpose: Purpose, index: DesignIndex): Uuid {
  const found = [...index.moduleById.values()].find(
    (each) => each.controllerId === controllerId && nameKey(each.name) === nameKey(name),
  );
  if (!found) throw new Error(`The plan names a ${purpose} module ${name} that its design does not have.`);
  return found.id;
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
