/** Rows chosen in a list, and the one from which Shift extends. */
export interface Selection {
  readonly ids: ReadonlySet<string>;
  readonly anchor: string | null;
}

export interface PickKeys {
  readonly shift: boolean;
  /** Ctrl, or the command key. */
  readonly ctrl: boolean;
}

export const NONE: Selection = { ids: new Set(), anchor: null };

/** A click on a row: alone, or with Ctrl added or taken out, or with Shift all from the anchor to it. */
export function picked(before: Selection, order: readonly string[], id: string, keys: PickKeys): Selection {
  if (keys.shift) return extended(before, order, id);
  return keys.ctrl ? toggled(before, id) : { ids: new Set([id]), anchor: id };
}

/** Adds a row or takes it out. */
export function toggled(before: Selection, id: string): Selection {
  const ids = new Set(before.ids);
  if (!ids.delete(id)) ids.add(id);
  return { ids, anchor: id };
}

/** All rows from the anchor to this one; without an anchor in the list only this one. */
export function extended(before: Selection, order: readonly string[], id: string): Selection {
  const to = order.indexOf(id);
  const from = before.anchor === null ? -1 : order.indexOf(before.anchor);
  if (to < 0) return before;
  if (from < 0) return { ids: new Set([id]), anchor: id };
  return { ids: new Set(order.slice(Math.min(from, to), Math.max(from, to) + 1)), anchor: before.anchor };
}

export const all = (order: readonly string[]): Selection => ({ ids: new Set(order), anchor: order[0] ?? null });

/** Without what has left the list; the same object where all is still there. */
export function kept(before: Selection, there: (id: string) => boolean): Selection {
  const ids = [...before.ids].filter(there);
  return ids.length === before.ids.size ? before : { ids: new Set(ids), anchor: before.anchor !== null && there(before.anchor) ? before.anchor : null };
}
