import type { ChangeNotice, DesignDocument, EditableCollection, RowChange } from '#contract';
import type { AnyRow } from './project-api';

/** The document with one row put in its place (or added), or taken out where `row` is null. */
export function withRow(document: DesignDocument, collection: EditableCollection | 'projects', id: string, row: AnyRow | null): DesignDocument {
  if (collection === 'projects') return row ? { ...document, project: row as unknown as DesignDocument['project'] } : document;
  const rows = document[collection] as readonly unknown[] as readonly AnyRow[];
  const at = rows.findIndex((r) => r.id === id);
  const next = row === null ? rows.filter((r) => r.id !== id) : at < 0 ? [...rows, row] : rows.with(at, row);
  return { ...document, [collection]: next };
}

/** The document after what the server announced, save the rows that `keep` names (their own edit is under way). */
export function withNotice(document: DesignDocument, notice: ChangeNotice, keep: ReadonlySet<string> = new Set()): DesignDocument {
  const merged = notice.items
    .filter((item) => !keep.has(item.id))
    .reduce((d, item) => withRow(d, item.collection, item.id, item.row as AnyRow | null), document);
  return { ...merged, sequence: Math.max(document.sequence, notice.sequence) };
}

/** The document as it will be once these changes are written; new rows have no version yet. */
export function withChanges(document: DesignDocument, changes: readonly RowChange[]): DesignDocument {
  return changes.reduce((d, change) => withRow(d, change.collection, change.id, changedRow(d, change)), document);
}

function changedRow(document: DesignDocument, { collection, op, id, values }: RowChange): AnyRow | null {
  if (op === 'delete') return null;
  if (op === 'create') return { id, version: 0, ...NEW_ROWS[collection], ...values };
  const rows = (collection === 'projects' ? [document.project] : document[collection]) as readonly unknown[] as readonly AnyRow[];
  const before = rows.find((row) => row.id === id);
  return before ? { ...before, ...values } : null;
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
