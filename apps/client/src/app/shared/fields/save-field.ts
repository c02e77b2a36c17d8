import { ChangeDetectionStrategy, Component, computed, effect, inject, input, output, signal, untracked } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatFormField, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { NOTHING } from '#calc';
import type { Read } from './typed';

let next = 0;

/**
 * A field that saves by itself when it is left or Enter is pressed. What cannot be taken stays as it was typed,
 * with its reason under it, and is not sent. In a table (`cell`) its label is spoken, not drawn.
 */
@Component({
  selector: 'lw-save-field',
  imports: [MatFormField, MatInput, MatSuffix, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[class.field]': '!cell()', '[class.cell]': 'cell()' },
  styleUrl: './save-field.css',
  template: `
    @if (editable()) {
      @if (!cell()) { <label [for]="id">{{ label() }}</label> }
      <mat-form-field>
        @if (rows() > 1) {
          <textarea matInput [id]="id" [rows]="rows()" [formControl]="control"
            [attr.aria-label]="spoken()" [attr.aria-invalid]="reason() !== null" [attr.aria-describedby]="reason() ? id + '-why' : null" (blur)="save()"></textarea>
        } @else {
          <input matInput [id]="id" [formControl]="control" autocomplete="off" spellcheck="false" [class.num]="figures()" [class.code]="code()"
            [attr.aria-label]="spoken()" [attr.aria-invalid]="reason() !== null" [attr.aria-describedby]="reason() ? id + '-why' : null"
            (blur)="save()" (keydown.enter)="save()" (keydown.escape)="restore($event)">
        }
        @if (unit()) { <span matSuffix class="unit">{{ unit() }}</span> }
      </mat-form-field>
      @if (reason(); as why) { <p class="why" role="alert" [id]="id + '-why'">{{ why }}</p> }
    } @else {
      @if (!cell()) { <span class="label">{{ label() }}</span> }
      <p class="read"><span [class.code]="code()" [class.strong]="code()">{{ value() || blank() }}</span>@if (value() && unit()) {<span class="u">{{ unit() }}</span>}</p>
    }`,
})
export class SaveField<T> {
  readonly label = input.required<string>();
  /** The value saved, as it is typed. */
  readonly value = input.required<string>();
  readonly read = input.required<Read<T>>();
  readonly editable = input.required<boolean>();
  readonly unit = input('');
  readonly cell = input(false);
  /** A number without a unit. */
  readonly number = input(false);
  /** A designation. */
  readonly code = input(false);
  /** Lines of text; Enter begins a new one. */
  readonly rows = input(1);
  /** What stands for blank where nothing can be typed. */
  readonly blank = input(NOTHING);
  readonly saved = output<T>();

  protected readonly id = `save-field-${(next += 1)}`;
  protected readonly control = inject(NonNullableFormBuilder).control('');
  protected readonly reason = signal<string | null>(null);
  /** Figures stand right. */
  protected readonly figures = computed(() => this.number() || this.unit() !== '');
  protected readonly spoken = computed(() => (this.cell() ? this.label() : null));

  constructor() {
    effect(() => {
      const value = this.value();
      untracked(() => this.control.pristine && this.control.reset(value));
    });
  }

  protected save(): void {
    const text = this.control.value;
    if (text.trim() === this.value()) return this.settle(this.value());
    const typed = this.read()(text);
    if (!typed.ok) return this.reason.set(typed.reason);
    this.settle(text);
    this.saved.emit(typed.value);
  }

  protected restore(event: Event): void {
    if (this.control.pristine) return;
    event.stopPropagation();
    this.settle(this.value());
  }

  private settle(text: string): void {
    this.control.reset(text);
    this.reason.set(null);
  }
}
