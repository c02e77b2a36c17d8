import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Drawing } from '../drawing/drawing';
import { capsule, outputSquare, run } from '../lane/lane-parts';

/** Nothing here yet: a dotted lane, one sentence, and the act that fills it (put in as content). */
@Component({
  selector: 'lw-empty-state',
  imports: [Drawing],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    :host { display: grid; gap: 12px; justify-items: start; align-content: start; max-width: 520px; padding: 28px var(--lw-gutter); }
    b { font-weight: 600; }
    .acts { display: flex; flex-wrap: wrap; gap: 8px; }
    .acts:empty { display: none; }`,
  template: `
    <svg class="lane" width="200" height="24" viewBox="0 0 200 24" aria-hidden="true" [lwDrawing]="lane"></svg>
    <p><b>{{ title() }}</b> {{ text() }}</p>
    <div class="acts"><ng-content /></div>`,
})
export class EmptyState {
  /** What is missing, `No points yet.` */
  readonly title = input.required<string>();
  /** What to do. */
  readonly text = input('');
  protected readonly lane = [run(10, 150, 12, 'unmapped'), outputSquare(1, 12, 9, 'unmapped'), capsule(150, 12, 18, 12, 'unmapped')];
}
