import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle } from '@angular/material/dialog';

/** Two people changed the same field of one row. */
export interface ConflictView {
  /** What was changed, `GC1-LP11`. */
  readonly label: string;
  readonly fields: readonly { readonly name: string; readonly mine: string; readonly theirs: string }[];
}
export type ConflictAnswer = 'mine' | 'theirs';

/** Both values side by side; nothing is lost before somebody chooses. */
@Component({
  selector: 'lw-conflict-dialog',
  imports: [MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: 'p { margin-bottom: 12px; } td, th { padding-left: 0; } th { background: none; position: static; } td.mine, td.theirs { font-weight: 600; white-space: normal; }',
  template: `
    <h2 matDialogTitle>{{ conflict.label }} was changed before you</h2>
    <mat-dialog-content>
      <p>Somebody else saved another value while you were typing. Choose which one stands.</p>
      <table>
        <thead><tr><th scope="col">Field</th><th scope="col">Yours</th><th scope="col">Theirs, saved</th></tr></thead>
        <tbody>
          @for (field of conflict.fields; track field.name) {
            <tr><th scope="row">{{ field.name }}</th><td class="mine">{{ field.mine }}</td><td class="theirs c-changed">{{ field.theirs }}</td></tr>
          }
        </tbody>
      </table>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton="outlined" type="button" [mat-dialog-close]="'theirs'">Take theirs</button>
      <button matButton="filled" type="button" [mat-dialog-close]="'mine'">Keep mine</button>
    </mat-dialog-actions>`,
})
export class ConflictDialog {
  protected readonly conflict = inject<ConflictView>(MAT_DIALOG_DATA);
}
