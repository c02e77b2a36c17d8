import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { type AbstractControl, NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogRef, MatDialogTitle } from '@angular/material/dialog';
import { MatFormField } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import type { NewProject, ProjectSummary } from '#contract';
import { firstValueFrom } from 'rxjs';
import { v7 as newId } from 'uuid';
import { problemOf, problemText } from '../../core/api/problem';
import { ProjectApi } from '../../core/project/project-api';
import { FindingMark } from '../../shared/findings/finding-mark';

/** Answers the new project's id. The id is made here once, so that a repeated request makes no second project. */
@Component({
  selector: 'lw-new-project-dialog',
  imports: [FindingMark, MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle, MatFormField, MatInput, MatOption, MatSelect, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: 'mat-dialog-content { display: grid; gap: 14px; } .said { display: flex; gap: 7px; color: var(--mat-sys-error); font: var(--mat-sys-body-small); }',
  templateUrl: './new-project-dialog.html',
})
export class NewProjectDialog {
  protected readonly others = inject<readonly ProjectSummary[]>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<NewProjectDialog, string>>(MatDialogRef);
  private readonly api = inject(ProjectApi);
  private readonly id = newId();
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', [(c: AbstractControl) => Validators.required(c), Validators.maxLength(200)]],
    description: ['', Validators.maxLength(2000)],
    copyHardwareFrom: [''],
  });
  protected readonly busy = signal(false);
  protected readonly refusal = signal<string | null>(null);

  protected async create(): Promise<void> {
    const { name, description, copyHardwareFrom } = this.form.getRawValue();
    if (name.trim() === '') {
      this.refusal.set('Give the project a name.');
      return;
    }
    const project: NewProject = {
      id: this.id, name: name.trim(), description: description.trim(),
      timeZone: Intl.DateTimeFormat().resolvedOptions().timeZone,
      ...(copyHardwareFrom ? { copyHardwareFrom } : {}),
    };
    this.busy.set(true);
    this.refusal.set(null);
    try {
      await firstValueFrom(this.api.create(project));
      this.dialog.close(this.id);
    } catch (error) {
      this.refusal.set(problemText(problemOf(error)));
    } finally {
      this.busy.set(false);
    }
  }
}
