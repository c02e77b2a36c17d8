import { BreakpointObserver } from '@angular/cdk/layout';
import { ChangeDetectionStrategy, Component, inject, Injectable } from '@angular/core';
import { MAT_BOTTOM_SHEET_DATA, MatBottomSheet, MatBottomSheetRef } from '@angular/material/bottom-sheet';
import type { Explanation } from '#calc';
import { ExplainPanel } from './explain-panel';

@Component({
  selector: 'lw-explain-sheet',
  imports: [ExplainPanel],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: 'lw-explain-panel { margin: -8px -16px; }',
  template: '<lw-explain-panel [explanation]="explanation" (closed)="sheet.dismiss()" />',
})
export class ExplainSheet {
  protected readonly explanation = inject<Explanation>(MAT_BOTTOM_SHEET_DATA);
  protected readonly sheet = inject(MatBottomSheetRef);
}

/**
 * Where an explanation goes: a page has a side panel for it; on a phone it rises from the bottom.
 * `show` answers false where there is room, and the page then puts an `lw-explain-panel` beside the figures.
 */
@Injectable({ providedIn: 'root' })
export class ExplainOpener {
  private readonly screen = inject(BreakpointObserver);
  private readonly sheet = inject(MatBottomSheet);

  show(explanation: Explanation): boolean {
    if (!this.screen.isMatched('(max-width: 600px)')) return false;
    this.sheet.open(ExplainSheet, { data: explanation, ariaLabel: `Why: ${explanation.title}` });
    return true;
  }
}
