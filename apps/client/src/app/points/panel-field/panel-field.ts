import { ChangeDetectionStrategy, Component, effect, inject, input, output, signal, untracked } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatFormField, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { NOTHING } from '#calc';
import type { Typed } from '../typed-values';

let next = 0;

/**
 * A field that saves by itself when it is left or Enter is pressed. What cannot be taken stays as it was typed,
 * with its reason under it, and is not sent.
 */
@Component({
  selector: 'lw-panel-field',
  imports: [MatFormField, MatInput, MatSuffix, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'field' },
  styleUrl: './panel-field.css',
  template: `
    @if (editable()) {
      <label [for]="id">{{ label() }}</label>
      <mat-form-field>
        @if (rows() > 1) {
          <textarea matInput [id]="id" [rows]="rows()" [formControl]="control" [attr.aria-invalid]="reason() !== null" [attr.aria-describedby]="reason() ? id + '-why' : null" (blur)="save()"></textarea>
        } @else {
          <input matInput [id]="id" [formControl]="control" autocomplete="off" [class.num]="unit() !== ''" [attr.aria-invalid]="reason() !== null" [attr.aria-describedby]="reason() ? id + '-why' : null" (blur)="save()" (keydown.enter)="save()" (keydown.escape)="restore($event)">
        }
        @if (unit()) { <span matSuffix class="unit">{{ unit() }}</span> }
      </mat-form-field>
      @if (reason(); as why) { <p class="why" role="alert" [id]="id + '-why'">{{ why }}</p> }
    } @else {
      <span class="label">{{ label() }}</span>
      <p class="read">{{ value() || nothing }}@if (value() && unit()) {<span class="u">{{ unit() }}</span>}</p>
    }`,
})
export class PanelField<T> {
  readonly label = input.required<string>();
  /** The value saved, as it is typed. */
  readonly value = input.required<string>();
  readonly unit = input('');
  readonly rows = input(1);
  readonly editable = input.required<boolean>();
  readonly read = input.required<(text: string) => Typed<T>>();
  readonly saved = output<T>();

  protected readonly id = `panel-field-${(next += 1)}`;
  protected readonly control = inject(NonNullableFormBuilder).control('');
  protected readonly reason = signal<string | null>(null);
  protected readonly nothing = NOTHING;

  constructor() {
    effect(() => {
      const value = this.value();
      untracked(() => this.control.pristine && this.control.reset(value));
    });
  }

  protected save(): void {
    const text = this.control.value;
    if (text.trim() === this.value()) return this.settle();
    const typed = this.read()(text);
    if (!typed.ok) return this.reason.set(typed.reason);
    this.settle();
    this.saved.emit(typed.value);
  }

  protected restore(event: Event): void {
    if (this.control.pristine) return;
    event.stopPropagation();
    this.control.reset(this.value());
    this.reason.set(null);
  }

  private settle(): void {
    this.control.markAsPristine();
    this.reason.set(null);
  }
}
