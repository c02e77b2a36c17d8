/** What a key press asks of the grid. */
export type GridCommand =
  | { readonly kind: 'move'; readonly rows: number; readonly columns: number; readonly extend: boolean }
  | { readonly kind: 'edge'; readonly rows: -1 | 0 | 1; readonly columns: -1 | 0 | 1; readonly extend: boolean }
  /** `text`: what was typed replaces the cell; null: the cell as it stands is edited. */
  | { readonly kind: 'edit'; readonly text: string | null }
  | { readonly kind: 'clear' | 'fill-down' | 'tick' | 'tick-all' | 'alternatives' | 'next-finding' | 'lane' | 'leave' };

export type Key = Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'altKey' | 'shiftKey'>;

const ARROWS: Readonly<Record<string, readonly [number, number]>> = {
  ArrowDown: [1, 0], ArrowUp: [-1, 0], ArrowRight: [0, 1], ArrowLeft: [0, -1],
};
const PLAIN: Readonly<Record<string, GridCommand>> = {
  Enter: { kind: 'edit', text: null }, F2: { kind: 'edit', text: null }, Delete: { kind: 'clear' }, Backspace: { kind: 'clear' },
  ' ': { kind: 'tick' }, Escape: { kind: 'leave' },
};
const CTRL: Readonly<Record<string, GridCommand>> = {
  d: { kind: 'fill-down' }, a: { kind: 'tick-all' }, Enter: { kind: 'lane' },
};

/**
 * The command of a key press on a cell that is not being edited; null: the browser's own. Typing edits,
 * so commands take Alt, Ctrl or a function key.
 *
 * @param page rows that Page Up and Page Down move
 */
export function gridCommand(key: Key, page: number): GridCommand | null {
  const ctrl = key.ctrlKey || key.metaKey;
  if (key.altKey && !ctrl) return altCommand(key);
  const arrow = ARROWS[key.key];
  if (arrow) {
    const [rows, columns] = arrow;
    return ctrl
      ? { kind: 'edge', rows: rows as -1 | 0 | 1, columns: columns as -1 | 0 | 1, extend: key.shiftKey }
      : { kind: 'move', rows, columns, extend: key.shiftKey };
  }
  if (key.key === 'PageDown' || key.key === 'PageUp') return { kind: 'move', rows: key.key === 'PageDown' ? page : -page, columns: 0, extend: key.shiftKey };
  if (key.key === 'Home' || key.key === 'End') {
    const to = key.key === 'Home' ? -1 : 1;
    return { kind: 'edge', rows: ctrl ? to : 0, columns: to, extend: key.shiftKey };
  }
  if (ctrl) return CTRL[key.key.length === 1 ? key.key.toLowerCase() : key.key] ?? null;
  return PLAIN[key.key] ?? (key.key.length === 1 ? { kind: 'edit', text: key.key } : null);
}

function altCommand(key: Key): GridCommand | null {
  if (key.key === 'ArrowDown') return { kind: 'alternatives' };
  return key.key.toLowerCase() === 'n' ? { kind: 'next-finding' } : null;
}

/** Where the cell goes after what was typed is committed; `cancel` keeps the old value. */
export type EditorAct = 'down' | 'up' | 'right' | 'left' | 'cancel';

/** What a key press asks of the cell that is being edited; null: the field's own. */
export function editorAct(key: Key): EditorAct | null {
  if (key.altKey || key.ctrlKey || key.metaKey) return null;
  if (key.key === 'Enter') return key.shiftKey ? 'up' : 'down';
  if (key.key === 'Tab') return key.shiftKey ? 'left' : 'right';
  return key.key === 'Escape' ? 'cancel' : null;
}

/** A block copied from a spreadsheet: rows of cells. A cell in quotes may hold tabs, line ends and doubled quotes. */
export function pastedBlock(text: string): readonly (readonly string[])[] {
  const rows: string[][] = [[]];
  for (const [, quoted, bare, end] of text.replace(/\r?\n$/, '').matchAll(/(?:"((?:[^"]|"")*)"|([^\t\r\n]*))(\t|\r?\n|$)/g)) {
    rows.at(-1)!.push((quoted?.replaceAll('""', '"') ?? bare ?? '').trim());
    if (end === '') break;
    if (end !== '\t') rows.push([]);
  }
  return rows;
}
