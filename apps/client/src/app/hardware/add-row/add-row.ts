import { ChangeDetectionStrategy, Component, DestroyRef, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogRef, MatDialogTitle } from '@angular/material/dialog';
import { MatFormField, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { type NewRow, readAll, type Values } from './new-row';

/** Asks for what a new row begins with. Answers its values, or nothing. */
@Component({
  selector: 'lw-add-row',
  imports: [MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle, MatFormField, MatInput, MatOption, MatSelect, MatSuffix, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './add-row.css',
  template: `
    <h2 matDialogTitle>{{ data.title }}</h2>
    <form [formGroup]="form" (ngSubmit)="create()">
      <mat-dialog-content>
        @for (field of data.fields; track field.field) {
          <div class="field">
            @if (field.choices; as choices) {
              <span class="label">{{ field.label }}</span>
              <mat-form-field>
                <mat-select [formControlName]="field.field" [aria-label]="field.label" placeholder="choose">
                  @for (choice of choices; track choice.value) { <mat-option [value]="choice.value">{{ choice.label }}</mat-option> }
                </mat-select>
              </mat-form-field>
            } @else {
              <label [for]="'new-' + field.field">{{ field.label }}</label>
              <mat-form-field>
                <input matInput [id]="'new-' + field.field" [formControlName]="field.field" autocomplete="off" spellcheck="false" [class.num]="field.unit"
                  [attr.aria-invalid]="!!reasons()[field.field]" [attr.aria-describedby]="reasons()[field.field] ? 'why-' + field.field : null">
                @if (field.unit; as unit) { <span matSuffix class="unit">{{ unit }}</span> }
              </mat-form-field>
            }
            @if (reasons()[field.field]; as why) { <p class="why" role="alert" [id]="'why-' + field.field">{{ why }}</p> }
          </div>
        }
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" mat-dialog-close>Cancel</button>
        <button matButton="filled" type="submit">Add</button>
      </mat-dialog-actions>
    </form>`,
})
export class AddRow {
  protected readonly data = inject<NewRow>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<AddRow, Record<string, unknown>>>(MatDialogRef);
  protected readonly form = inject(NonNullableFormBuilder).record<string>(this.first());
  protected readonly reasons = signal<Readonly<Record<string, string>>>({});

  constructor() {
    this.form.valueChanges.pipe(takeUntilDestroyed(inject(DestroyRef))).subscribe(() => this.suggest());
  }

  protected create(): void {
    const { values, reasons } = readAll(this.data.fields, this.form.getRawValue());
    this.reasons.set(reasons);
    if (Object.keys(reasons).length === 0) this.dialog.close({ ...this.data.fixed, ...values });
  }

  private first(): Record<string, string> {
    const values: Record<string, string> = {};
    for (const { field, suggest } of this.data.fields) values[field] = suggest(values);
    return values;
  }

  /** Suggestions follow what is chosen, until somebody types over them. */
  private suggest(): void {
    const values: Values = this.form.getRawValue();
    for (const { field, suggest, choices } of this.data.fields) {
      const control = this.form.controls[field];
      if (!choices && control.pristine) control.setValue(suggest(values), { emitEvent: false });
    }
  }
}
