import type * as calc from '#calc';
import { type Static, Type } from 'typebox';
import { Catalogue } from './catalogue.ts';
import { Name, NotNegative, nullable, oneOf, Text, Uuid, Whole } from './common.ts';
import { cabinets, controllers, moduleGroups, modules } from './hardware.ts';
import { assignments } from './mapping.ts';
import { dispensers, points } from './points.ts';
import { type Fits, fits, resource, type RowOf } from './resource.ts';
import { cableNodes, circuits, supplies } from './wiring.ts';

export const projects = resource('projects', 'projects', {
  name: Name(),
  description: Text(2000),
  timeZone: Name(64),
  voltageTempC: Type.Number({ minimum: -40, maximum: 120 }),
  tripTempC: Type.Number({ minimum: -40, maximum: 120 }),
  sparePercent: Type.Number({ minimum: 0, maximum: 100 }),
  supplyMarginPercent: Type.Number({ minimum: 0, maximum: 400 }),
  maxCartridgeDays: Whole(1, 3650),
  minCartridgeDays: Whole(0, 3650),
  maxOverGreasingPercent: NotNegative(100),
  relayLifeYears: Type.Number({ exclusiveMinimum: 0, maximum: 100 }),
  slotMs: nullable(Whole(1, 86_400_000)),
  breakerDcFactor: Type.Number({ minimum: 1, maximum: 3 }),
  rankBy: oneOf(['fewest-changes', 'smallest-dose', 'least-over']),
  demandPer: oneOf(['1000h', '100h', 'running-day', 'week']),
}, ['name']);
fits<Fits<RowOf<typeof projects>, calc.Versioned<calc.Project>>>();
export type ProjectRow = RowOf<typeof projects>;

/** A new project; with `copyHardwareFrom` it starts with that project's policies, cabinets, controllers, modules, supplies, circuits and boxes. */
export const NewProject = Type.Object({
  id: Uuid, name: Name(), description: Type.Optional(Text(2000)), timeZone: Type.Optional(Name(64)),
  copyHardwareFrom: Type.Optional(Uuid),
}, { additionalProperties: false });
export type NewProject = Static<typeof NewProject>;

/** One line of the list of projects. */
export const ProjectSummary = Type.Object({
  id: Uuid, name: Type.String(), description: Type.String(), version: Type.Integer(),
  points: Type.Integer(), dispensers: Type.Integer(), mapped: Type.Integer(),
  changedAt: nullable(Type.String()), changedBy: nullable(Type.String()),
});
export type ProjectSummary = Static<typeof ProjectSummary>;

/** The collections of a project that people edit, by their name in the design. */
export const projectResources = {
  points, dispensers, cabinets, controllers, modules, moduleGroups, supplies, circuits, cableNodes, assignments,
} as const;
export type EditableCollection = keyof typeof projectResources;
export const editableCollections = Object.keys(projectResources) as EditableCollection[];

/** The whole project at one sequence number: what the calculation library takes, with versions. */
export const DesignDocument = Type.Object({
  sequence: Type.Integer(),
  project: projects.Row,
  catalogue: Catalogue,
  points: Type.Array(points.Row),
  dispensers: Type.Array(dispensers.Row),
  cabinets: Type.Array(cabinets.Row),
  controllers: Type.Array(controllers.Row),
  modules: Type.Array(modules.Row),
  moduleGroups: Type.Array(moduleGroups.Row),
  supplies: Type.Array(supplies.Row),
  circuits: Type.Array(circuits.Row),
  cableNodes: Type.Array(cableNodes.Row),
  assignments: Type.Array(assignments.Row),
});
export type DesignDocument = Static<typeof DesignDocument>;

/** One row's part in a change set; `version` is the one that was read, for updates and deletions. */
export const RowChange = Type.Object({
  collection: oneOf([...editableCollections, 'projects'] as const),
  op: oneOf(['create', 'update', 'delete']),
  id: Uuid,
  version: Type.Optional(Type.Integer()),
  values: Type.Optional(Type.Record(Type.String(), Type.Unknown())),
}, { additionalProperties: false });
export type RowChange = Static<typeof RowChange>;

/** Several edits in one transaction: all or none. */
export const NewChangeSet = Type.Object({
  id: Uuid,
  summary: Text(300),
  changes: Type.Array(RowChange, { minItems: 1, maxItems: 50_000 }),
}, { additionalProperties: false });
export type NewChangeSet = Static<typeof NewChangeSet>;

/** Takes a change set back by a new one with this identifier: the same request again is the same undo. */
export const NewUndo = Type.Object({ id: Uuid }, { additionalProperties: false });
export type NewUndo = Static<typeof NewUndo>;

/** What happened to rows: the answer to an edit, and what others learn of it. A null row was deleted. */
export const ChangeNotice = Type.Object({
  sequence: Type.Integer(),
  items: Type.Array(Type.Object({
    collection: oneOf([...editableCollections, 'projects'] as const),
    id: Uuid,
    row: nullable(Type.Record(Type.String(), Type.Unknown())),
  })),
});
export type ChangeNotice = Static<typeof ChangeNotice>;

/** One line of a project's history. */
export const HistoryEntry = Type.Object({
  id: Uuid, sequence: Type.Integer(), at: Type.String(), by: Type.String(), summary: Type.String(), rows: Type.Integer(),
  /** The entry that this one took back. */
  undoes: nullable(Uuid),
  /** The entry that took this one back and stands. */
  undoneBy: nullable(Type.Object({ id: Uuid, at: Type.String(), by: Type.String() })),
});
export type HistoryEntry = Static<typeof HistoryEntry>;
