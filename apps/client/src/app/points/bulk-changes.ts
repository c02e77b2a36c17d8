import type { BearingFactors, DispenserType } from '#calc';
import { positive, type Typed } from '../shared/fields/typed';
import type { RowEdit } from './cell-values';
import { cartridgeOf, doseOf } from './cell-values';
import type { CellEdits } from './grid-changes';
import type { PointRow } from './point-rows';

/** What is put on all chosen points; a blank text or null leaves the field as it is. */
export interface BulkValues {
  readonly dose: string;
  readonly cartridge: string;
  readonly type: DispenserType | null;
  readonly hours: string;
  readonly greaseId: string | null;
  readonly factors: Partial<BearingFactors>;
}

export const NO_BULK_VALUES: BulkValues = { dose: '', cartridge: '', type: null, hours: '', greaseId: null, factors: {} };

/** The edits for every row; dose and cartridge are read against the type that the row will have. */
export function bulkEdits(rows: readonly PointRow[], values: BulkValues): CellEdits {
  const edits: RowEdit[] = [];
  const refusals: { tag: string; column: string; reason: string }[] = [];
  for (const row of rows) {
    const read = <T>(column: string, typed: Typed<T>): T | null => {
      if (typed.ok) return typed.value;
      refusals.push({ tag: row.point.tag, column, reason: typed.reason });
      return null;
    };
    const point = pointValues(row, values, read);
    if (Object.keys(point).length > 0) edits.push({ collection: 'points', id: row.point.id, values: point });
    const dispenser = dispenserValues(row, values, read);
    if (Object.keys(dispenser).length === 0) continue;
    if (row.dispenser) edits.push({ collection: 'dispensers', id: row.dispenser.id, values: dispenser });
    else refusals.push({ tag: row.point.tag, column: 'dispenser', reason: 'No dispenser stands at this point.' });
  }
  return { edits, refusals };
}

type Read = <T>(column: string, typed: Typed<T>) => T | null;

function pointValues({ point }: PointRow, { hours, greaseId, factors }: BulkValues, read: Read): Record<string, unknown> {
  const changed = { ...point.factors, ...factors };
  return {
    ...(hours.trim() !== '' && { hoursPerDay: read('hours', positive(hours, 24, 'h')) }),
    ...(greaseId !== null && { greaseId }),
    ...(Object.keys(factors).length > 0 && { factors: changed }),
  };
}

function dispenserValues(row: PointRow, { dose, cartridge, type }: BulkValues, read: Read): Record<string, unknown> {
  const becomes = { type: type ?? row.type };
  return {
    ...(type && { typeId: type.id, wiring: type.wiring }),
    ...(dose.trim() !== '' && { doseUl: read('dose', doseOf(dose, becomes)) }),
    ...(cartridge.trim() !== '' && { cartridgeUl: read('cartridge', cartridgeOf(cartridge, becomes)) }),
  };
}
