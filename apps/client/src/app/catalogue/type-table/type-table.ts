import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { type Entry, fieldsOf, type KindView } from '../fields/field';
import { fieldText, valueAt } from '../fields/field-values';

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
    const cells = this.columns().map(({ key, head, field, num, unit }) => {
      const text = fieldText(field, entry);
      return { key, head, num, text: shortText(text, unit, valueAt(entry, key)), full: text };
    });
    return { entry, cells, summary: cells.filter((c) => c.text !== '–').map((c) => (c.num ? `${c.head.toLowerCase()} ${c.full}` : c.text)).join('; ') };
  }));
}

/** A cell's text: the unit stands in the head, and of a choice only the value, which may be none of those offered. */
function shortText(text: string, unit: string, value: unknown): string {
  if (unit !== '') return text.replace(`\u2009${unit}`, '');
  return typeof value === 'string' ? value : text.split(', ').length > 1 && typeof value === 'number' ? String(value) : text;
}
