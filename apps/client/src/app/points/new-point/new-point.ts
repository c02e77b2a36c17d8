import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogRef, MatDialogTitle } from '@angular/material/dialog';
import { MatFormField } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import type { DispenserType } from '#calc';
import { typeChoices } from '../../shared/fields/type-choices';
import { FindingMark } from '../../shared/findings/finding-mark';
import type { NewPoint } from '../point-edits';

export interface NewPointData {
  readonly types: readonly DispenserType[];
  readonly tags: ReadonlySet<string>;
  /** Function and machine of the point that has the focus: a new one mostly stands beside it. */
  readonly function: string | null;
  readonly machine: string | null;
}

/** Asks for what a new point and its dispenser begin with. */
@Component({
  selector: 'lw-new-point',
  imports: [FindingMark, MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle, MatFormField, MatInput, MatOption, MatSelect, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: '../bulk-edit/bulk-edit.css',
  templateUrl: './new-point.html',
})
export class NewPointDialog {
  protected readonly data = inject<NewPointData>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<NewPointDialog, NewPoint>>(MatDialogRef);
  protected readonly form = inject(NonNullableFormBuilder).group({
    tag: '', description: '', function: this.data.function ?? '', machine: this.data.machine ?? '', typeId: '',
  });
  protected readonly types = typeChoices(this.data.types);
  protected readonly refusal = signal<string | null>(null);

  protected create(): void {
    const { tag, description, function: designation, machine, typeId } = this.form.getRawValue();
    const name = tag.trim();
    if (name === '') return this.refusal.set('A point needs a tag.');
    if (name.length > 200) return this.refusal.set('A tag has at most 200 characters.');
    if (this.data.tags.has(name)) return this.refusal.set(`${name} is the tag of another point.`);
    this.dialog.close({ tag: name, description: description.trim() || null, function: designation.trim() || null, machine: machine.trim() || null, typeId: typeId || null });
  }
}
