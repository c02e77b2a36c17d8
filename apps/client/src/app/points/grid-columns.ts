/** The grid's columns, left to right; the tick box stands before them. */
export type ColumnId =
  | 'tag' | 'description' | 'way' | 'hoursPerDay' | 'demand' | 'doseUl' | 'cartridgeUl'
  | 'interval' | 'pulses' | 'life' | 'over' | 'findings';

export interface Column {
  readonly id: ColumnId;
  readonly head: string;
  readonly unit: string;
  readonly number: boolean;
  readonly editable: boolean;
}

const column = (id: ColumnId, head: string, unit = '', number = false, editable = false): Column => ({ id, head, unit, number, editable });

export const COLUMNS: readonly Column[] = [
  column('tag', 'Tag', '', false, true),
  column('description', 'Point', '', false, true),
  column('way', 'From'),
  column('hoursPerDay', 'Hours', 'a day', true, true),
  column('demand', 'Demand', 'cm³', true, true),
  column('doseUl', 'Dose', 'cm³', true, true),
  column('cartridgeUl', 'Cartridge', 'cm³', true, true),
  column('interval', 'Interval', '', true),
  column('pulses', 'Pulses', '', true),
  column('life', 'Life', 'd', true),
  column('over', 'Over', '%', true),
  column('findings', 'Findings'),
];

export const columnAt = (id: ColumnId): number => COLUMNS.findIndex((each) => each.id === id);

/** The column so many places to the right (below 0: left), at most the last one. */
export const stepColumn = (from: ColumnId, by: number): ColumnId =>
  COLUMNS[Math.min(COLUMNS.length - 1, Math.max(0, columnAt(from) + by))].id;

/** The next column to the right (or left) that takes typing; the same one where there is none. */
export function stepEditable(from: ColumnId, by: 1 | -1): ColumnId {
  const beyond = COLUMNS.filter((each) => each.editable && Math.sign(columnAt(each.id) - columnAt(from)) === by);
  return (by === 1 ? beyond[0] : beyond.at(-1))?.id ?? from;
}
