import { BreakpointObserver } from '@angular/cdk/layout';
import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal, signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton, MatIconButton } from '@angular/material/button';
import type { ImportPreview, ImportRow, RowFilter } from '#contract';
import { map } from 'rxjs';
import { Segmented } from '../../../shared/controls/segmented';
import { FindingMark } from '../../../shared/findings/finding-mark';
import { Icon } from '../../../shared/icon/icon';
import { Notice } from '../../../shared/states/notice';
import { ImportSummary } from '../../import-summary/import-summary';
import { formulaWords } from '../../import-words';
import { counted } from '../../progress/progress-words';
import { countOf, ImportRows } from '../import-rows';
import { RowCards } from '../row-cards/row-cards';
import { RowDetail } from '../row-detail/row-detail';
import { RowTable } from '../row-table/row-table';

const FILTERS: readonly (readonly [RowFilter, string])[] = [
  ['all', 'All'], ['create', 'New'], ['update', 'Updates'], ['problems', 'Problems'], ['hold', 'Held back'], ['same', 'Same'], ['skip', 'Skipped'],
];

/** The rows of the preview: which kind, the list, the row that is open, and the ways to a row or a problem. */
@Component({
  selector: 'lw-rows-panel',
  imports: [FindingMark, Icon, ImportSummary, MatButton, MatIconButton, Notice, RowCards, RowDetail, RowTable, Segmented],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:keydown)': 'keys($event)' },
  templateUrl: './rows-panel.html',
  styleUrl: './rows-panel.css',
})
export class RowsPanel {
  protected readonly rows = inject(ImportRows);
  readonly preview = input.required<ImportPreview>();

  protected readonly phone = toSignal(inject(BreakpointObserver).observe('(max-width: 600px)').pipe(map((state) => state.matches)), { initialValue: false });
  protected readonly filters = computed(() => {
    const { counts } = this.preview();
    return FILTERS.map(([value, label]) => ({ value, label, count: counted(countOf(counts, value)) }))
      .filter(({ value, count }) => count !== '0' || value === 'all' || value === this.rows.filter());
  });
  protected readonly formulas = computed(() => formulaWords(this.preview()));
  protected readonly sheets = computed(() => this.preview().sheets.filter((sheet) => sheet.taken).map((sheet) => sheet.name));
  /** The sheet in which a row is sought; null where there is only one. */
  protected readonly sheet = linkedSignal(() => (this.sheets().length > 1 ? this.sheets()[0] : null));
  protected readonly lastRow = computed(() => this.preview().settings.headerRow + Math.max(...this.preview().sheets.map((sheet) => sheet.rows), this.preview().counts.rows + this.preview().counts.skipped));
  private readonly inView = signal({ first: 0, last: 0 });
  protected readonly inViewWords = computed(() => {
    const total = this.rows.source()?.total() ?? 0;
    const last = Math.min(this.inView().last, total - 1);
    return total === 0 ? '' : `${counted(this.inView().first + 1)} to ${counted(last + 1)} of ${counted(total)}`;
  });

  protected show(filter: string): void {
    this.rows.show(filter as RowFilter);
  }

  protected see(range: { readonly first: number; readonly last: number }): void {
    this.inView.set(range);
    this.rows.see(range.first);
  }

  /** Opens the row, or closes it where it is the one that is open. */
  protected toggle(row: ImportRow, index: number): void {
    const open = this.rows.picked()?.index === row.index;
    this.rows.pick(open ? null : row, open ? undefined : index);
  }

  protected jump(text: string): void {
    const row = Number(text);
    if (Number.isInteger(row) && row > 0) void this.rows.goToRow(row, this.sheet());
  }

  protected problem(step: 1 | -1): void {
    void this.rows.goToProblem(step);
  }

  /** Alt N and Alt P by the key's place, because Alt makes other letters of them on some keyboards. */
  protected keys(event: KeyboardEvent): void {
    if (event.key === 'Escape' && this.rows.picked()) this.rows.pick(null);
    if (!event.altKey || event.ctrlKey || event.metaKey || event.defaultPrevented) return;
    if (event.code === 'KeyN') this.problem(1);
    else if (event.code === 'KeyP') this.problem(-1);
    else return;
    event.preventDefault();
  }
}
