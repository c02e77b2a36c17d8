import { CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollViewport } from '@angular/cdk/scrolling';
import { ChangeDetectionStrategy, Component, computed, effect, input, output, signal, viewChild } from '@angular/core';
import type { ImportPreview, ImportRow } from '#contract';
import { FindingMark } from '../../../shared/findings/finding-mark';
import { ACTION_WORDS, ActionMark } from '../action-mark/action-mark';
import { cellText, hasDetails, isFaulty, oldText, remarkOf, rowFieldsOf, rowNumbers, tagColumnOf, unsaid } from '../row-cells';
import type { RowSource } from '../row-source';

const ROW_PX = 30;
const FIXED_PX = { sheet: 96, does: 98, tag: 114, name: 200 } as const;

/** Row by row what the import would do; rows that have not come yet are places. */
@Component({
  selector: 'lw-row-table',
  imports: [ActionMark, CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollViewport, FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './row-table.html',
  styleUrl: './row-table.css',
})
export class RowTable {
  readonly preview = input.required<ImportPreview>();
  readonly source = input.required<RowSource>();
  readonly at = input<{ readonly index: number } | null>(null);
  readonly picked = input<ImportRow | null>(null);
  readonly pickedChange = output<{ readonly row: ImportRow; readonly index: number }>();
  /** First and last place in view. */
  readonly seen = output<{ readonly first: number; readonly last: number }>();

  protected readonly rowPx = ROW_PX;
  protected readonly px = FIXED_PX;
  protected readonly actions = ACTION_WORDS;
  protected readonly text = cellText;
  protected readonly faulty = isFaulty;
  protected readonly before = oldText;
  protected readonly remark = (row: ImportRow): string => remarkOf(row, this.preview().fields);
  protected readonly details = hasDetails;
  protected readonly more = unsaid;
  protected readonly numbers = rowNumbers;
  protected readonly fields = computed(() => rowFieldsOf(this.preview()));
  protected readonly tagColumn = computed(() => tagColumnOf(this.preview()));
  protected readonly withSheets = computed(() => this.preview().sheets.filter((sheet) => sheet.taken).length > 1);
  /** Room for two row numbers. */
  protected readonly rowWidth = computed(() => (this.preview().counts.rows > 9_000 ? 112 : this.preview().counts.rows > 900 ? 98 : 82));
  /** Rows that have nothing to say need little room for it. */
  protected readonly remarkWidth = computed(() => {
    const { withProblems, notes, toUpdate } = this.preview().counts;
    return withProblems + notes + toUpdate > 0 ? 260 : 120;
  });
  protected readonly width = computed(() => {
    const { sheet, ...always } = FIXED_PX;
    const fixed = Object.values(always).reduce((sum, px) => sum + px, this.rowWidth() + this.remarkWidth() + (this.withSheets() ? sheet : 0));
    return this.fields().reduce((sum, field) => sum + field.width, fixed);
  });
  private readonly viewport = viewChild(CdkVirtualScrollViewport);

  /** The head sticks in a list that is moved by a transform, which sticking does not see. */
  protected readonly headTop = signal(0);

  constructor() {
    effect((cleanUp) => {
      const moved = this.viewport()?.renderedRangeStream.subscribe(({ start }) => this.headTop.set(-start * ROW_PX));
      cleanUp(() => moved?.unsubscribe());
    });
    effect(() => {
      const at = this.at();
      if (at) this.bringIntoView(at.index);
    });
  }

  protected readonly place = (index: number): number => index;

  protected tellSeen(first: number): void {
    const rows = Math.max(1, Math.floor((this.viewport()?.getViewportSize() ?? 0) / ROW_PX) - 1);
    this.seen.emit({ first, last: Math.min(this.source().total(), first + rows) - 1 });
  }

  /** Leaves two rows above, so that the neighbours stay in sight; a row already in view stays where it is. */
  private bringIntoView(index: number): void {
    const viewport = this.viewport();
    if (!viewport) return;
    const top = viewport.measureScrollOffset('top');
    const y = index * ROW_PX;
    if (y < top || y > top + viewport.getViewportSize() - 3 * ROW_PX) viewport.scrollToOffset(Math.max(0, y - 2 * ROW_PX));
  }
}
