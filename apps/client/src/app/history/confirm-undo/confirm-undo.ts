import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle } from '@angular/material/dialog';
import type { EntryView } from '../entry-view';

/** Asks before several rows at once go back to what they were. Closes with true. */
@Component({
  selector: 'lw-confirm-undo',
  imports: [MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: 'p + p { margin-top: 8px; }',
  template: `
    <h2 matDialogTitle>{{ verb }} {{ entry.rows }} rows?</h2>
    <mat-dialog-content>
      <p><b>{{ view.act?.set?.summary }}</b>, by {{ entry.by }}, {{ view.when }}.</p>
      @if (verb === 'Undo') { <p>Every row goes back to what it was before: new rows go, deleted ones return. Other fields keep what they have now.</p> }
      @else { <p>Every row becomes what this edit made of it. Other fields keep what they have now.</p> }
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton="outlined" type="button" [mat-dialog-close]="false">Cancel</button>
      <button matButton="filled" type="button" [mat-dialog-close]="true">{{ verb }} {{ entry.rows }} rows</button>
    </mat-dialog-actions>`,
})
export class ConfirmUndo {
  protected readonly view = inject<EntryView>(MAT_DIALOG_DATA);
  protected readonly entry = this.view.entry;
  protected readonly verb = this.view.act?.label;
}
