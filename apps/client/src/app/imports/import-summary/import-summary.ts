import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { ImportPreview, ImportRow } from '#contract';
import { counted } from '../progress/progress-words';
import { ActionMark } from '../rows/action-mark/action-mark';

const PARTS: readonly { readonly action: ImportRow['action']; readonly count: 'toCreate' | 'toUpdate' | 'same' | 'heldBack' | 'skipped'; readonly words: string }[] = [
  { action: 'create', count: 'toCreate', words: 'new' },
  { action: 'update', count: 'toUpdate', words: 'to update' },
  { action: 'same', count: 'same', words: 'the same' },
  { action: 'hold', count: 'heldBack', words: 'held back' },
  { action: 'skip', count: 'skipped', words: 'skipped' },
];

/** How many rows do what, as a bar with its legend; acts (content) stand beside the legend. */
@Component({
  selector: 'lw-import-summary',
  imports: [ActionMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './import-summary.css',
  template: `
    <div class="bar" aria-hidden="true">
      @for (part of parts(); track part.action) { <i class="{{ part.action }}" [style.flex-grow]="part.rows"></i> }
    </div>
    <div class="below">
      <ul>
        @for (part of parts(); track part.action) { <li><lw-action-mark [action]="part.action" /><span><b>{{ part.shown }}</b> {{ part.words }}</span></li> }
      </ul>
      <ng-content />
    </div>`,
})
export class ImportSummary {
  readonly counts = input.required<ImportPreview['counts']>();
  protected readonly parts = computed(() =>
    PARTS.map((part) => ({ ...part, rows: this.counts()[part.count], shown: counted(this.counts()[part.count]) })).filter((part) => part.rows > 0));
}
