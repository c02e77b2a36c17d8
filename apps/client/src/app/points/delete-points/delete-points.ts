import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle } from '@angular/material/dialog';

/** What goes when points are deleted. */
export interface DeletePointsData {
  readonly tags: readonly string[];
  readonly dispensers: number;
  readonly channels: number;
}

const NAMED = 12;

/** Names what goes before it goes. Answers true to delete. */
@Component({
  selector: 'lw-delete-points',
  imports: [MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: 'mat-dialog-content { display: grid; gap: 10px; } .tags { display: flex; flex-wrap: wrap; gap: 4px 12px; }',
  template: `
    <h2 matDialogTitle>Delete {{ data.tags.length === 1 ? data.tags[0] : data.tags.length + ' points' }}?</h2>
    <mat-dialog-content>
      @if (data.tags.length > 1) {
        <p class="tags">@for (tag of data.tags.slice(0, named); track tag) { <span class="tag">{{ tag }}</span> } @if (data.tags.length > named) { <span class="quiet">and {{ data.tags.length - named }} more</span> }</p>
      }
      <p>
        @if (data.dispensers > 0) { {{ data.dispensers === 1 ? 'Its dispenser goes' : data.dispensers + ' dispensers go' }} too, with cable and settings. }
        @if (data.channels > 0) { {{ data.channels === 1 ? 'One channel becomes' : data.channels + ' channels become' }} free. }
        This cannot be undone.
      </p>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton type="button" [mat-dialog-close]="false">Keep</button>
      <button matButton="filled" type="button" [mat-dialog-close]="true">Delete</button>
    </mat-dialog-actions>`,
})
export class DeletePoints {
  protected readonly data = inject<DeletePointsData>(MAT_DIALOG_DATA);
  protected readonly named = NAMED;
}
