import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatAutocomplete, MatAutocompleteTrigger, MatOption } from '@angular/material/autocomplete';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatDialogActions, MatDialogContent, MatDialogRef, MatDialogTitle } from '@angular/material/dialog';
import { MatFormField } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { channelKey } from '../board';
import { BoardStore } from '../board-store';
import { addressOf } from '../moves/drop-rules';
import { MoveStore } from '../moves/move-store';
import { cargoWords } from '../moves/plan-words';
import { PlanSummary } from '../plan-summary/plan-summary';

const SHOWN = 50;

/** Chooses the mapped dispenser with which the carried one changes places. */
@Component({
  selector: 'lw-swap-dialog',
  imports: [MatAutocomplete, MatAutocompleteTrigger, MatButton, MatCheckbox, MatDialogActions, MatDialogContent, MatDialogTitle, MatFormField, MatInput, MatOption, PlanSummary],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: '.fields { display: grid; gap: 12px; padding-top: 4px; }',
  template: `
    <h2 mat-dialog-title>Swap {{ who() }}</h2>
    <mat-dialog-content>
      <div class="fields">
        <div class="field">
          <label for="swap-with">With the dispenser</label>
          <mat-form-field subscriptSizing="dynamic">
            <input matInput id="swap-with" #field placeholder="Tag, description or address" autocomplete="off" spellcheck="false" [matAutocomplete]="found" (input)="search(field.value)">
          </mat-form-field>
          <mat-autocomplete #found="matAutocomplete" autoActiveFirstOption (optionSelected)="choose($event.option.value)">
            @for (option of options(); track option.key) { <mat-option [value]="option.label"><span class="tag">{{ option.tag }}</span> <span class="quiet">{{ option.address }} {{ option.description }}</span></mat-option> }
            @empty { <mat-option disabled>No mapped dispenser matches</mat-option> }
          </mat-autocomplete>
        </div>
        <mat-checkbox [checked]="store.withStatus()" (change)="store.withStatus.set($event.checked)">with status inputs</mat-checkbox>
        <lw-plan-summary />
      </div>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton type="button" (click)="cancel()">Cancel</button>
      <button matButton="filled" type="button" [disabled]="!possible()" (click)="drop()">Swap</button>
    </mat-dialog-actions>`,
})
export class SwapDialog {
  protected readonly store = inject(BoardStore);
  protected readonly move = inject(MoveStore);
  private readonly dialog = inject<MatDialogRef<SwapDialog>>(MatDialogRef);
  private readonly typed = signal('');

  protected readonly who = computed(() => {
    const [board, move] = [this.store.board(), this.move.move()];
    return board && move ? cargoWords(board, move.cargo) : '';
  });
  private readonly others = computed(() => {
    const [board, cargo] = [this.store.board(), this.move.move()?.cargo];
    if (!board || !cargo) return [];
    return board.design.assignments.filter((a) => a.purpose === cargo.purpose && a.dispenserId !== cargo.dispenserIds[0]).map((a) => {
      const point = board.occupants.get(a.dispenserId)?.point;
      const [tag, address] = [point?.tag ?? '', addressOf(board, a)];
      return { key: channelKey(a.moduleId, a.channel), tag, address, description: point?.description ?? '', label: `${tag}, ${address}` };
    }).sort((a, b) => a.label.localeCompare(b.label, 'en', { numeric: true }));
  });
  protected readonly options = computed(() => {
    const words = this.typed().toLowerCase().split(/\s+/).filter(Boolean);
    return this.others().filter((o) => words.every((w) => `${o.label} ${o.description}`.toLowerCase().includes(w))).slice(0, SHOWN);
  });
  protected readonly possible = computed(() => this.move.plan()?.kind === 'swap');

  protected search(text: string): void {
    this.typed.set(text);
    this.move.aim(null);
  }

  protected choose(label: string): void {
    this.move.aim(this.others().find((o) => o.label === label)?.key ?? null);
  }

  protected drop(): void {
    this.move.drop();
    this.dialog.close();
  }

  protected cancel(): void {
    this.move.cancel();
    this.dialog.close();
  }
}
