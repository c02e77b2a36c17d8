import { CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollViewport } from '@angular/cdk/scrolling';
import { ChangeDetectionStrategy, Component, computed, input, linkedSignal } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import type { ImportPreview, ImportRow } from '#contract';
import { FindingMark } from '../../shared/findings/finding-mark';
import { Icon } from '../../shared/icon/icon';

const ACTIONS: Readonly<Record<ImportRow['action'], string>> = {
  create: 'Create', update: 'Change', same: 'Same', hold: 'Held back', skip: 'Skip',
};
const SKIPS: ReadonlyMap<string, string> = new Map([['blank', 'A blank row'], ['repeated-heading', 'The headings again'], ['totals', 'A row of totals']]);
const LEADING = ['tag', 'description'];

/** Row by row what the import would do, with each problem's cell and remedy. */
@Component({
  selector: 'lw-row-table',
  imports: [CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollViewport, FindingMark, Icon, MatIconButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './row-table.html',
  styleUrl: './row-table.css',
})
export class RowTable {
  readonly preview = input.required<ImportPreview>();
  readonly rows = input.required<readonly ImportRow[]>();

  protected readonly actions = ACTIONS;
  /** The row whose problems stand below in full; another preview closes it. */
  protected readonly picked = linkedSignal<readonly ImportRow[], ImportRow | null>({ source: this.rows, computation: () => null });
  protected readonly fields = computed(() => {
    const mapped = new Set(this.preview().columns.map((c) => c.field));
    return this.preview().fields.filter((f) => mapped.has(f.key) && !LEADING.includes(f.key));
  });

  protected whyOf(why: string): string {
    return SKIPS.get(why) ?? why;
  }

  protected byRow = (_index: number, row: ImportRow): number => row.row;

  /** The cell as a person reads it: the value understood, or the text at fault. */
  protected text(row: ImportRow, field: string): string {
    const fault = row.problems.find((p) => p.field === field || p.column === this.columnOf(field));
    if (fault?.cell) return fault.cell;
    return shown(row.values, field);
  }

  protected faulty(row: ImportRow, field: string): boolean {
    const column = this.columnOf(field);
    return row.problems.some((p) => p.field === field || (p.column !== null && p.column === column));
  }

  protected before(row: ImportRow, field: string): string | null {
    const change = row.changes.find((c) => c.field === valueKeyOf(field));
    return change ? plain(valueKeyOf(field), change.from) || 'blank' : null;
  }

  private columnOf(field: string): string | null {
    return this.preview().columns.find((c) => c.field === field)?.column ?? null;
  }
}

/** The value behind a field: volumes are kept in whole microlitres. */
const valueKeyOf = (field: string): string =>
  field.replace(/^demandCm3Per/, 'demandUlPer').replace(/Cm3$/, 'Ul');

const shown = (values: ImportRow['values'], field: string): string => plain(valueKeyOf(field), values[valueKeyOf(field)] ?? null);

const plain = (key: string, value: string | number | null): string =>
  value === null ? '' : typeof value === 'number' && /Ul($|Per)/.test(key) ? String(value / 1000) : String(value);
