import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { ImportResult as Result } from '#contract';
import { Icon } from '../../shared/icon/icon';
import { counted } from '../progress/progress-words';

/** What was imported, and where to go from here. */
@Component({
  selector: 'lw-import-result',
  imports: [Icon, MatButton, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'status' },
  styleUrl: './import-result.css',
  template: `
    @let done = result();
    <h2>{{ undone() ? 'Undone' : done.sequence === null ? 'The file changes nothing' : 'Imported' }}</h2>
    @if (undone()) { <p>The project is as it was before the import.</p> }
    @else {
      <dl>
        <dt>Points created</dt><dd>{{ count(done.created) }}</dd>
        <dt>Points changed</dt><dd>{{ count(done.updated) }}</dd>
        <dt>The same</dt><dd>{{ count(done.same) }}</dd>
        <dt>Held back</dt><dd>{{ count(done.heldBack) }}</dd>
      </dl>
    }
    <div class="acts">
      <a matButton="filled" [routerLink]="['/projects', projectId(), 'points']">To the points</a>
      <a matButton="outlined" [routerLink]="['/projects', projectId(), 'mapping']">To the I/O mapping</a>
      <button matButton type="button" (click)="another.emit()">Import another file</button>
      @if (done.sequence !== null && !undone()) {
        <button matButton type="button" [disabled]="busy()" (click)="undo.emit()"><lw-icon name="undo" [size]="16" /> {{ busy() ? 'Undoing' : 'Undo this import' }}</button>
      }
    </div>`,
})
export class ImportResult {
  readonly result = input.required<Result>();
  readonly projectId = input.required<string>();
  readonly undone = input(false);
  /** It is being taken back. */
  readonly busy = input(false);
  readonly another = output();
  readonly undo = output();

  protected readonly count = counted;
}
