import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import type { ImportPreview, ImportRow } from '#contract';
import { FindingMark } from '../../../shared/findings/finding-mark';
import { Icon } from '../../../shared/icon/icon';
import { ACTION_WORDS, ActionMark } from '../action-mark/action-mark';
import { changesOf, hasDetails, remarkOf, rowNumbers } from '../row-cells';

/** One row in full: its problems with what to do, what was read otherwise, and old and new of an update. */
@Component({
  selector: 'lw-row-detail',
  imports: [ActionMark, FindingMark, Icon, MatIconButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'region', '[attr.aria-label]': 'title()' },
  styleUrl: './row-detail.css',
  templateUrl: './row-detail.html',
})
export class RowDetail {
  readonly row = input.required<ImportRow>();
  readonly preview = input.required<ImportPreview>();
  readonly closed = output();

  protected readonly actions = ACTION_WORDS;
  protected readonly title = computed(() => `${this.row().rows.length > 1 ? 'Rows' : 'Row'} ${rowNumbers(this.row())}`);
  protected readonly where = computed(() => {
    const { sheet, line, row } = this.row();
    const sheets = this.preview().sheets.filter((each) => each.taken).length;
    return [sheet !== null && sheets > 1 ? `sheet “${sheet}”` : '', sheet === null && line !== row ? `line ${line}` : ''].filter(Boolean).join(', ');
  });
  protected readonly changes = computed(() => changesOf(this.row(), this.preview().fields));
  protected readonly remark = computed(() => (hasDetails(this.row()) ? '' : remarkOf(this.row(), this.preview().fields)));

  /** The cell as a spreadsheet names it. */
  protected cell(column: string | null): string {
    return column === null ? '' : `${column}${this.row().row}`;
  }
}
