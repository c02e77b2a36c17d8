import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle } from '@angular/material/dialog';

/** What is deleted, what goes with it, and what has to be freed first. */
export interface Deletion {
  readonly name: string;
  readonly goes: string;
  /** What still stands on it, `2 controllers, 1 supply`; empty: nothing. */
  readonly held: string;
  /** Where each of these is moved or deleted, a sentence each. */
  readonly how: readonly string[];
}

/** Names what goes before it goes, or what has to go first. Answers true to delete. */
@Component({
  selector: 'lw-confirm-delete',
  imports: [MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: 'mat-dialog-content { display: grid; gap: 10px; }',
  template: `
    @if (data.held) {
      <h2 matDialogTitle>{{ data.name }} cannot be deleted yet</h2>
      <mat-dialog-content>
        <p>Still on it: {{ data.held }}. Move or delete these first.</p>
        @for (step of data.how; track step) { <p class="small">{{ step }}</p> }
      </mat-dialog-content>
      <mat-dialog-actions align="end"><button matButton="filled" type="button" [mat-dialog-close]="false">Close</button></mat-dialog-actions>
    } @else {
      <h2 matDialogTitle>Delete {{ data.name }}?</h2>
      <mat-dialog-content><p>{{ data.goes }} This cannot be undone.</p></mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" [mat-dialog-close]="false">Keep</button>
        <button matButton="filled" type="button" [mat-dialog-close]="true">Delete</button>
      </mat-dialog-actions>
    }`,
})
export class ConfirmDelete {
  protected readonly data = inject<Deletion>(MAT_DIALOG_DATA);
}
