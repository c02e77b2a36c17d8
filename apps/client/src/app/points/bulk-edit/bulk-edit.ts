import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogRef, MatDialogTitle } from '@angular/material/dialog';
import { MatFormField, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import type { BearingFactors, DispenserType, Grease } from '#calc';
import { typeChoices } from '../../shared/fields/type-choices';
import { FindingMark } from '../../shared/findings/finding-mark';
import { bulkEdits } from '../bulk-changes';
import { FACTOR_STEPS } from '../factor-steps';
import { type CellEdits, refusalText } from '../grid-changes';
import type { PointRow } from '../point-rows';

export interface BulkEditData {
  readonly rows: readonly PointRow[];
  readonly types: readonly DispenserType[];
  readonly greases: readonly Grease[];
}

/** One set of values for all ticked points; what is left blank stays as it is. Answers the edits. */
@Component({
  selector: 'lw-bulk-edit',
  imports: [FindingMark, MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle, MatFormField, MatInput, MatOption, MatSelect, MatSuffix, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './bulk-edit.css',
  templateUrl: './bulk-edit.html',
})
export class BulkEdit {
  protected readonly data = inject<BulkEditData>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<BulkEdit, CellEdits>>(MatDialogRef);
  private readonly forms = inject(NonNullableFormBuilder);
  protected readonly form = this.forms.group({
    typeId: '', dose: '', cartridge: '', hours: '', greaseId: '',
    factors: this.forms.group({ temperature: 0, contamination: 0, moisture: 0, vibration: 0, position: 0, design: 0 }),
  });
  protected readonly types = typeChoices(this.data.types);
  protected readonly factors = FACTOR_STEPS;
  protected readonly refusal = signal<string | null>(null);
  private readonly values = toSignal(this.form.valueChanges, { initialValue: null });
  private readonly result = computed(() => (this.values(), bulkEdits(this.data.rows, this.chosen())));
  protected readonly nothing = computed(() => this.result().edits.length === 0 && this.result().refusals.length === 0);

  protected apply(): void {
    const result = this.result();
    if (result.refusals.length > 0) this.refusal.set(refusalText(result));
    else if (result.edits.length > 0) this.dialog.close(result);
  }

  private chosen() {
    const { typeId, dose, cartridge, hours, greaseId, factors } = this.form.getRawValue();
    // 0 is no factor: it stands for "as it is".
    const set = Object.fromEntries(Object.entries(factors).filter(([, value]) => value !== 0)) as Partial<BearingFactors>;
    return { type: this.data.types.find((type) => type.id === typeId) ?? null, dose, cartridge, hours, greaseId: greaseId || null, factors: set };
  }
}
