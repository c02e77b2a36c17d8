import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatDialogActions, MatDialogContent, MatDialogRef, MatDialogTitle } from '@angular/material/dialog';
import { MatFormField } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { BoardStore } from '../board-store';
import { PlanSummary } from '../plan-summary/plan-summary';
import { groupOf } from '../moves/drop-rules';
import { MoveStore } from '../moves/move-store';
import { channelOptions, placeOptions } from '../moves/place-options';
import { cargoWords } from '../moves/plan-words';

/** Moves what is carried by choosing a place: for those who use neither pointer nor keys, and on a phone. */
@Component({
  selector: 'lw-move-dialog',
  imports: [MatButton, MatCheckbox, MatDialogActions, MatDialogContent, MatDialogTitle, MatFormField, MatInput, PlanSummary],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: '.fields { display: grid; gap: 12px; padding-top: 4px; }',
  template: `
    <h2 mat-dialog-title>{{ title() }}</h2>
    <mat-dialog-content>
      <div class="fields">
        <div class="field">
          <label for="move-place">Group or module</label>
          <mat-form-field subscriptSizing="dynamic">
            <select matNativeControl id="move-place" #at (change)="choosePlace(at.value)">
              @for (group of places(); track group.label) {
                <optgroup [label]="group.label">
                  @for (option of group.options; track option.key) { <option [value]="option.key" [selected]="option.key === place()">{{ option.label }}</option> }
                </optgroup>
              }
            </select>
          </mat-form-field>
        </div>
        <div class="field">
          <label for="move-channel">Channel</label>
          <mat-form-field subscriptSizing="dynamic">
            <select matNativeControl id="move-channel" #channel (change)="move.aim(channel.value)">
              <option value="" disabled [selected]="move.aimed() === null">Choose a channel</option>
              @for (option of channels(); track option.key) { <option [value]="option.key" [selected]="option.key === move.aimed()">{{ option.label }}</option> }
            </select>
          </mat-form-field>
        </div>
        <mat-checkbox [checked]="store.withStatus()" (change)="store.withStatus.set($event.checked)">with status inputs</mat-checkbox>
        <lw-plan-summary />
      </div>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton type="button" (click)="cancel()">Cancel</button>
      <button matButton="filled" type="button" [disabled]="!possible()" (click)="drop()">{{ swaps() ? 'Swap' : 'Place' }}</button>
    </mat-dialog-actions>`,
})
export class MoveDialog {
  protected readonly store = inject(BoardStore);
  protected readonly move = inject(MoveStore);
  private readonly dialog = inject<MatDialogRef<MoveDialog>>(MatDialogRef);
  protected readonly place = signal(this.begin());

  protected readonly title = computed(() => {
    const [board, move] = [this.store.board(), this.move.move()];
    return board && move ? `${move.cargo.purpose === null ? 'Place' : 'Move'} ${cargoWords(board, move.cargo)}` : '';
  });
  protected readonly places = computed(() => {
    const board = this.store.board();
    return board ? placeOptions(board, this.move.move()?.cargo.purpose ?? null) : [];
  });
  protected readonly channels = computed(() => {
    const board = this.store.board();
    return board ? channelOptions(board, this.place()) : [];
  });
  protected readonly possible = computed(() => (this.move.plan()?.kind ?? 'refused') !== 'refused');
  protected readonly swaps = computed(() => this.move.plan()?.kind === 'swap');

  protected choosePlace(key: string): void {
    this.place.set(key);
    this.move.aim(key);
  }

  protected drop(): void {
    this.move.drop();
    this.dialog.close();
  }

  protected cancel(): void {
    this.move.cancel();
    this.dialog.close();
  }

  /** The group of the channel where it would begin. */
  private begin(): string {
    const [board, key] = [this.store.board(), this.move.aimed()];
    const place = (board && key && groupOf(board, key)) || (board?.modules[0]?.module.id ?? '');
    // Where it is mapped already is no answer.
    if (this.move.plan()?.kind === 'refused') this.move.aim(null);
    return place;
  }
}
