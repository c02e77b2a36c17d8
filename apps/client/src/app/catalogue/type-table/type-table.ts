import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { NOTHING } from '#calc';
import { type Entry, type Field, fieldsOf, type KindView } from '../fields/field';
import { fieldText, formValueOf, isAsked, valueAt, words } from '../fields/field-values';

/** The latest version of each type with its main data; a click or Enter opens it. */
@Component({
  selector: 'lw-type-table',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './type-table.html',
  styleUrl: './type-table.css',
})
export class TypeTable {
  readonly view = input.required<KindView>();
  readonly entries = input.required<readonly Entry[]>();
  /** Name of the type that is open. */
  readonly openName = input<string | null>(null);
  readonly picked = output<string>();

  protected readonly columns = computed(() => this.view().columns.flatMap(({ key, head }) => {
    const field = fieldsOf(this.view()).find((one) => one.key === key);
    return field ? [{ key, head, field, num: field.kind === 'number', unit: field.kind === 'number' ? (field.unit ?? '') : '' }] : [];
  }));
  protected readonly rows = computed(() => this.entries().map((entry) => {
    const values = formValueOf(this.view(), entry);
    const cells = this.columns().map((column) => ({ ...column, ...cellText(column.field, entry, isAsked(this.view(), column.field, values)) }));
    const parts = cells.filter((cell) => cell.text !== NOTHING).map((cell) => (cell.num ? `${cell.head.toLowerCase()} ${cell.full}` : cell.text));
    return { entry, cells, summary: parts.join('; ') };
  }));
}

/** A cell's text, the unit being in the head, and the same with its unit, which no line break parts from the figure. */
function cellText(field: Field, entry: Entry, asked: boolean): { readonly text: string; readonly full: string } {
  const value = valueAt(entry, field.key);
  const nothing = !asked || value === null || (Array.isArray(value) && value.length === 0);
  if (nothing) return { text: NOTHING, full: NOTHING };
  const full = fieldText(field, entry).replaceAll('\u2009', '\u202f');
  // The words behind a choice are for the panel.
  if (field.kind === 'choice') return { text: words(value), full };
  return { text: field.kind === 'number' && field.unit ? full.replace(`\u202f${field.unit}`, '') : full, full };
}
