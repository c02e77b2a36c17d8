import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { FindingMark } from '../findings/finding-mark';

/** What happened and what to do about it. */
@Component({
  selector: 'lw-error-state',
  imports: [FindingMark, MatButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'alert' },
  styles: ':host { display: grid; grid-template-columns: 18px minmax(0, 1fr); gap: 10px; max-width: 560px; padding: 24px var(--lw-gutter); } lw-finding-mark { margin-top: 2px; } b { font-weight: 600; } button { margin-top: 12px; }',
  template: `
    <lw-finding-mark kind="error" [size]="16" />
    <div>
      <p><b>{{ title() }}</b> {{ detail() }}</p>
      @if (canRetry()) { <button matButton="outlined" type="button" (click)="retry.emit()">Try again</button> }
    </div>`,
})
export class ErrorState {
  readonly title = input.required<string>();
  readonly detail = input('');
  readonly canRetry = input(true);
  readonly retry = output();
}
