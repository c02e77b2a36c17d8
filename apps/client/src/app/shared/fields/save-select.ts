import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatFormField } from '@angular/material/form-field';
import { MatOption, MatSelect } from '@angular/material/select';
import type { Choice } from './choice';

/** One of a list, saved as soon as it is chosen. In a table (`cell`) its label is spoken, not drawn. */
@Component({
  selector: 'lw-save-select',
  imports: [MatFormField, MatOption, MatSelect],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[class.field]': '!cell()', '[class.cell]': 'cell()' },
  styleUrl: './save-field.css',
  template: `
    @if (!cell()) { <span class="label">{{ label() }}</span> }
    @if (editable()) {
      <mat-form-field>
        <mat-select [aria-label]="label()" [value]="value()" [placeholder]="none()" (selectionChange)="picked.emit($event.value)">
          @if (clearable()) { <mat-option [value]="null">{{ none() }}</mat-option> }
          @for (choice of choices(); track choice.value) { <mat-option [value]="choice.value">{{ choice.label }}</mat-option> }
        </mat-select>
      </mat-form-field>
    } @else { <p class="read">{{ shown() }}</p> }`,
})
export class SaveSelect<V extends string | number | null> {
  readonly label = input.required<string>();
  readonly choices = input.required<readonly Choice<V>[]>();
  readonly value = input.required<V | null>();
  readonly editable = input.required<boolean>();
  readonly cell = input(false);
  /** None may be chosen. */
  readonly clearable = input(false);
  /** What having none is called. */
  readonly none = input('not decided');
  readonly picked = output<V>();
  protected readonly shown = computed(() => this.choices().find((choice) => choice.value === this.value())?.label ?? this.none());
}
