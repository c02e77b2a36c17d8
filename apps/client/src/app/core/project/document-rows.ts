import type { ChangeNotice, DesignDocument, EditableCollection } from '#contract';
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
