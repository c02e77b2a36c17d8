import { demandFigure, type DemandUnit, formatCount, formatInterval, formatNumber, formatVolume, NOTHING, volumeFigure } from '#calc';
import { accepted, numberText, positive, refused, type Typed, volumeText, volumeUl, words } from '../shared/fields/typed';
import type { ColumnId } from './grid-columns';
import type { PointRow } from './point-rows';

/** New values of one row of the design. */
export interface RowEdit {
  readonly collection: 'points' | 'dispensers';
  readonly id: string;
  readonly values: Readonly<Record<string, unknown>>;
}

/** What reading a cell needs to know beside its row. */
export interface CellContext {
  readonly demandPer: DemandUnit;
  /** Tags of all points, by tag the point that has it. */
  readonly tags: ReadonlyMap<string, string>;
}

const WAYS = { bearing: 'bearing', stated: 'stated', practice: 'practice' } as const;

/** A cell's text; the figures are those of the calculation, written by its formatters. */
export function cellText(column: ColumnId, row: PointRow, demandPer: DemandUnit): string {
  const { point, dispenser, plan, timed } = row;
  switch (column) {
    case 'tag': return point.tag;
    case 'description': return point.description ?? '';
    case 'way': return point.demandWay ? WAYS[point.demandWay] : NOTHING;
    case 'hoursPerDay': return formatNumber(point.hoursPerDay);
    case 'demand': return demandFigure(row.demandUlPer1000h, demandPer, point.hoursPerDay, point.daysPerWeek);
    case 'doseUl': return dispenser?.method === 'timed' ? 'timed' : volumeFigure(dispenser?.doseUl);
    case 'cartridgeUl': return formatNumber(dispenser?.cartridgeUl == null ? null : dispenser.cartridgeUl / 1000);
    case 'interval': return timed ? `${formatCount(dispenser?.periodMonths)}\u2009mo` : formatInterval(plan?.intervalMs);
    case 'pulses': return formatCount(plan?.pulsesPerCartridge);
    case 'life': return formatNumber((plan ?? timed)?.lifeDays, 0, 'down');
    case 'over': return formatNumber((plan ?? timed)?.overGreasingPercent, 1, 'up');
    case 'findings': return row.findings.map((f) => `${f.severity}, ${f.title}, ${f.code}`).join('; ');
  }
}

/** What stands in a cell when it is opened for editing. */
export function cellInput(column: ColumnId, row: PointRow, demandPer: DemandUnit): string {
  const { point, dispenser } = row;
  switch (column) {
    case 'tag': return point.tag;
    case 'description': return point.description ?? '';
    case 'hoursPerDay': return numberText(point.hoursPerDay);
    case 'doseUl': return volumeText(dispenser?.doseUl ?? null);
    case 'cartridgeUl': return volumeText(dispenser?.cartridgeUl ?? null);
    case 'demand': return point.demandWay === 'stated' && point.statedPer === demandPer ? volumeText(point.statedUl) : shownDemand(row, demandPer);
    default: return '';
  }
}

/** The values that a cell offers: the cartridges of the dispenser's type. */
export function cellChoices(column: ColumnId, row: PointRow): readonly string[] {
  return column === 'cartridgeUl' ? (row.type?.cartridgesUl ?? []).map(volumeText) : [];
}

/** Reads what was typed into a cell: the edit that it asks for, or the reason why it cannot be. */
export function typedCell(column: ColumnId, text: string, row: PointRow, context: CellContext): Typed<RowEdit> {
  switch (column) {
    case 'tag': return ofPoint(row, 'tag', tagOf(text, row, context));
    case 'description': return ofPoint(row, 'description', words(text, 500));
    case 'hoursPerDay': return ofPoint(row, 'hoursPerDay', positive(text, 24, 'h'));
    case 'demand': return demandOf(text, row, context.demandPer);
    case 'doseUl': return ofDispenser(row, 'doseUl', (edited) => doseOf(text, edited));
    case 'cartridgeUl': return ofDispenser(row, 'cartridgeUl', (edited) => cartridgeOf(text, edited));
    default: return refused('This column is computed; change what it comes from.');
  }
}

/** A dose that the dispenser's type can give, µL. */
export function doseOf(text: string, { type }: Pick<PointRow, 'type'>): Typed<number | null> {
  const typed = volumeUl(text, 1_000_000);
  if (!typed.ok || typed.value === null) return typed;
  const { doseMinUl: min, doseMaxUl: max, doseStepUl: step } = type ?? { doseMinUl: 100, doseMaxUl: 1_000_000, doseStepUl: 100 };
  if (typed.value < min || typed.value > max) return refused(`${type ? 'The type gives' : 'A dose is'} ${volumeFigure(min)} to ${formatVolume(max)}.`);
  return typed.value % step === 0 && typed.value % 100 === 0 ? typed : refused(`A dose is a whole number of ${formatVolume(step)} steps.`);
}

/** A cartridge that fits the dispenser's type, µL. */
export function cartridgeOf(text: string, { type }: Pick<PointRow, 'type'>): Typed<number | null> {
  const typed = volumeUl(text, 10_000_000);
  if (!typed.ok || typed.value === null) return typed;
  if (!type) return refused('Choose the dispenser type first; it says which cartridges fit.');
  const fitting = type.cartridgesUl.map((ul) => formatNumber(ul / 1000)).join(', ');
  return type.cartridgesUl.includes(typed.value) ? typed : refused(`Cartridges of this type: ${fitting} cm³.`);
}

function tagOf(text: string, row: PointRow, { tags }: CellContext): Typed<string> {
  const typed = words(text, 200);
  if (!typed.ok) return typed;
  if (typed.value === null) return refused('A point needs a tag.');
  const owner = tags.get(typed.value);
  return owner === undefined || owner === row.point.id ? accepted(typed.value) : refused(`${typed.value} is the tag of another point.`);
}

/** A demand typed in the grid is a stated one, in the unit that the column shows. */
function demandOf(text: string, row: PointRow, demandPer: DemandUnit): Typed<RowEdit> {
  const { id, demandWay } = row.point;
  if (demandWay === 'bearing') return refused('The demand comes from the bearing. Change it beside the table, under Demand.');
  if (demandWay === 'practice') return refused('The demand comes from practice. Change it beside the table, under Demand.');
  const typed = volumeUl(text, 1e10);
  if (!typed.ok) return typed;
  const values = typed.value === null ? { statedUl: null } : { demandWay: 'stated', statedUl: typed.value, statedPer: demandPer };
  return accepted({ collection: 'points', id, values });
}

const shownDemand = (row: PointRow, per: DemandUnit): string => {
  const text = demandFigure(row.demandUlPer1000h, per, row.point.hoursPerDay, row.point.daysPerWeek);
  return text === NOTHING ? '' : text.replaceAll(',', '');
};

function ofPoint(row: PointRow, field: string, typed: Typed<unknown>): Typed<RowEdit> {
  return typed.ok ? accepted({ collection: 'points', id: row.point.id, values: { [field]: typed.value } }) : typed;
}

function ofDispenser(row: PointRow, field: string, read: (row: PointRow) => Typed<unknown>): Typed<RowEdit> {
  if (!row.dispenser) return refused('No dispenser stands at this point. Put one there under Dispenser, beside the table.');
  const typed = read(row);
  return typed.ok ? accepted({ collection: 'dispensers', id: row.dispenser.id, values: { [field]: typed.value } }) : typed;
}
