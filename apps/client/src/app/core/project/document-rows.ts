import type { ChangeNotice, DesignDocument, EditableCollection, RowChange } from '#contract';
import type { AnyRow } from './project-api';

type Collection = EditableCollection | 'projects';

/** A row put in its place (or added), or taken out where it is null. */
export interface PlacedRow {
  readonly collection: Collection;
  readonly id: string;
  readonly row: AnyRow | null;
}

/** The document with these rows placed: one pass for each collection. Untouched rows and collections stay the same objects. */
export function withRows(document: DesignDocument, placed: readonly PlacedRow[]): DesignDocument {
  const changed: Record<string, unknown> = {};
  for (const [collection, rows] of byCollection(placed)) {
    if (collection === 'projects') {
      const [project] = [...rows.values()];
      if (project) changed['project'] = project;
      continue;
    }
    const before = rowsOf(document, collection);
    const after = placedIn(before, rows);
    if (after !== before) changed[collection] = after;
  }
  return Object.keys(changed).length > 0 ? { ...document, ...changed } : document;
}

function byCollection(placed: readonly PlacedRow[]): Map<Collection, Map<string, AnyRow | null>> {
  const groups = new Map<Collection, Map<string, AnyRow | null>>();
  for (const { collection, id, row } of placed) {
    const group = groups.get(collection) ?? new Map<string, AnyRow | null>();
    groups.set(collection, group.set(id, row));
  }
  return groups;
}

function placedIn(before: readonly AnyRow[], rows: Map<string, AnyRow | null>): readonly AnyRow[] {
  const known = indexOf(before);
  const next = before.flatMap((row) => {
    const to = rows.get(row.id);
    return to === undefined ? [row] : to === null ? [] : [to];
  });
  for (const [id, row] of rows) if (row && !known.has(id)) next.push(row);
  return next.length === before.length && next.every((row, at) => row === before[at]) ? before : next;
}

/**
 * The document after what the server said.
 * @param keep how a row is placed, or null where it stays as it is; rows have edits of their own on the way
 */
export function withNotice(document: DesignDocument, notice: ChangeNotice, keep: (placed: PlacedRow) => PlacedRow | null = (placed) => placed): DesignDocument {
  const placed = notice.items.flatMap(({ collection, id, row }) => keep({ collection, id, row: row as AnyRow | null }) ?? []);
  return { ...withRows(document, placed), sequence: Math.max(document.sequence, notice.sequence) };
}

/** The answer to one's own write. Where it skips numbers others wrote meanwhile: the document waits for those. */
export const withAnswer = (document: DesignDocument, answer: ChangeNotice, keep: (placed: PlacedRow) => PlacedRow): DesignDocument =>
  withNotice(document, answer.sequence > document.sequence + 1 ? { ...answer, sequence: document.sequence } : answer, keep);

/** Whether an answer tells of a change: a set that changes nothing is not kept in the history. */
export function alters(answer: ChangeNotice, changes: readonly RowChange[]): boolean {
  const sent = new Map(changes.map(({ id, op, version }) => [id, op === 'update' ? version : undefined]));
  return answer.items.some(({ id, row }) => row === null || sent.get(id) === undefined || row['version'] !== sent.get(id));
}

/** The document as it will be once these changes are written; new rows have no version yet. */
export const withChanges = (document: DesignDocument, changes: readonly RowChange[]): DesignDocument =>
  withRows(document, changes.map((change) => ({ collection: change.collection, id: change.id, row: changedRow(document, change) })));

function changedRow(document: DesignDocument, { collection, op, id, values }: RowChange): AnyRow | null {
  if (op === 'delete') return null;
  if (op === 'create') return { id, version: 0, ...NEW_ROWS[collection], ...values };
  const before = rowOf(document, collection, id);
  return before ? { ...before, ...values } : null;
}

export function rowOf(document: DesignDocument, collection: Collection, id: string): AnyRow | undefined {
  if (collection === 'projects') return document.project.id === id ? (document.project) : undefined;
  return indexOf(rowsOf(document, collection)).get(id);
}

const rowsOf = (document: DesignDocument, collection: EditableCollection) => document[collection] as readonly unknown[] as readonly AnyRow[];

const indexes = new WeakMap<readonly AnyRow[], ReadonlyMap<string, AnyRow>>();

/** The rows by identifier; made once for each state of a collection. */
function indexOf(rows: readonly AnyRow[]): ReadonlyMap<string, AnyRow> {
  const known = indexes.get(rows) ?? new Map(rows.map((row) => [row.id, row]));
  indexes.set(rows, known);
  return known;
}

/** What the database gives a new row where the change leaves a field out. */
const NEW_ROWS: Readonly<Partial<Record<RowChange['collection'], object>>> = {
  points: {
    description: null, function: null, location: null, product: null, machine: null, remarks: null, hoursPerDay: null, daysPerWeek: 7,
    demandWay: null, boreMm: null, outsideMm: null, widthMm: null, speedRpm: null,
    factors: { temperature: 1, contamination: 1, moisture: 1, vibration: 1, position: 1, design: 1 }, statedUl: null, statedPer: '1000h',
    practiceStrokes: null, practiceGramsPerStroke: null, practiceEveryDays: null, greaseId: null, zone: null,
  },
  dispensers: {
    typeId: null, wiring: null, method: 'pulse', cartridgeUl: null, doseUl: null, periodMonths: null, controllerId: null, circuitId: null,
    nodeId: null, cableTag: null, cableLengthM: null, crossSectionMm2: null, conductorClass: 5,
  },
  cabinets: { description: '', temperatureC: 40 },
  supplies: { internalOhm: 0, otherLoadA: 0, redundant: false },
  circuits: { protectionOhm: 0, concurrencyLimit: null },
  cableNodes: { parentId: null, conductorClass: 5 },
  moduleGroups: { circuitId: null },
};
