import { CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollableWindow, CdkVirtualScrollViewport } from '@angular/cdk/scrolling';
import { ChangeDetectionStrategy, Component, computed, effect, input, output, viewChild } from '@angular/core';
import type { ImportPreview, ImportRow } from '#contract';
import { FindingMark } from '../../../shared/findings/finding-mark';
import { ACTION_WORDS, ActionMark } from '../action-mark/action-mark';
import { cellText, remarkOf, rowNumbers, tagColumnOf } from '../row-cells';
import type { RowSource } from '../row-source';

const CARD_PX = 92;
/** What stands above the cards while they scroll: the app's bar. */
const ABOVE_PX = 60;

/** The rows on a phone: a card each with tag, what it does and the first remark; a tap opens it. */
@Component({
  selector: 'lw-row-cards',
  imports: [ActionMark, CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollableWindow, CdkVirtualScrollViewport, FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './row-cards.css',
  template: `
    <cdk-virtual-scroll-viewport scrollWindow [itemSize]="cardPx" [minBufferPx]="640" [maxBufferPx]="1280" (scrolledIndexChange)="seen.emit({ first: $event, last: $event })">
      <ng-container *cdkVirtualFor="let row of source(); trackBy: place; let index = index; templateCacheSize: 0">
        @if (row) {
          <button type="button" class="card" [class.held]="row.action === 'hold'" [attr.aria-expanded]="picked()?.index === row.index" (click)="pickedChange.emit({ row, index })">
            <span class="line"><span class="tag">{{ tag(row) }}</span><span class="grow"></span><lw-action-mark [action]="row.action" />{{ actions[row.action] }}</span>
            <span class="line name">{{ text(row, 'description', null) }}</span>
            <span class="line quiet">
              @if (row.problems[0]; as first) { <lw-finding-mark [kind]="first.severity" /> }
              <span class="name">{{ said(row) }}</span><span class="grow"></span><span class="nowrap">{{ where(row) }}</span>
            </span>
          </button>
        } @else { <div class="card"><i class="place"></i></div> }
      </ng-container>
    </cdk-virtual-scroll-viewport>`,
})
export class RowCards {
  readonly preview = input.required<ImportPreview>();
  readonly source = input.required<RowSource>();
  readonly at = input<{ readonly index: number } | null>(null);
  readonly picked = input<ImportRow | null>(null);
  readonly pickedChange = output<{ readonly row: ImportRow; readonly index: number }>();
  readonly seen = output<{ readonly first: number; readonly last: number }>();

  protected readonly cardPx = CARD_PX;
  protected readonly actions = ACTION_WORDS;
  protected readonly text = cellText;
  private readonly tagColumn = computed(() => tagColumnOf(this.preview()));
  private readonly viewport = viewChild(CdkVirtualScrollViewport);

  constructor() {
    effect(() => {
      const at = this.at();
      if (at) this.bringIntoView(at.index);
    });
  }

  protected readonly place = (index: number): number => index;

  protected tag(row: ImportRow): string {
    return cellText(row, 'tag', this.tagColumn()) || 'no tag';
  }

  protected said(row: ImportRow): string {
    return remarkOf(row, this.preview().fields);
  }

  protected where(row: ImportRow): string {
    return `${row.rows.length > 1 ? 'rows' : 'row'} ${rowNumbers(row)}`;
  }

  private bringIntoView(index: number): void {
    const viewport = this.viewport();
    if (!viewport) return;
    const y = viewport.elementRef.nativeElement.getBoundingClientRect().top + index * CARD_PX;
    if (y < ABOVE_PX || y + CARD_PX > window.innerHeight / 2) window.scrollBy({ top: y - ABOVE_PX - CARD_PX / 2 });
  }
}
