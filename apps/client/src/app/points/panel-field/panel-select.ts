import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatFormField } from '@angular/material/form-field';
import { MatOption, MatSelect } from '@angular/material/select';
import { NOTHING } from '#calc';

export interface Choice<V extends string | number | null = string | number | null> {
  readonly value: V;
  readonly label: string;
}

/** One of a list, saved as soon as it is chosen. */
@Component({
  selector: 'lw-panel-select',
  imports: [MatFormField, MatOption, MatSelect],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'field' },
  styleUrl: './panel-field.css',
  template: `
    @if (editable()) {
      <span class="label">{{ label() }}</span>
      <mat-form-field>
        <mat-select [aria-label]="label()" [value]="value()" [placeholder]="blank()" (selectionChange)="picked.emit($event.value)">
          @if (clearable()) { <mat-option [value]="null">{{ blank() }}</mat-option> }
          @for (choice of choices(); track choice.value) { <mat-option [value]="choice.value">{{ choice.label }}</mat-option> }
        </mat-select>
      </mat-form-field>
    } @else {
      <span class="label">{{ label() }}</span><p class="read">{{ shown() }}</p>
    }`,
})
export class PanelSelect<V extends string | number | null> {
  readonly label = input.required<string>();
  readonly choices = input.required<readonly Choice<V>[]>();
  readonly value = input.required<V | null>();
  readonly editable = input.required<boolean>();
  /** May be left undecided. */
  readonly clearable = input(false);
  readonly blank = input('not decided');
  readonly picked = output<V>();
  protected readonly shown = computed(() => this.choices().find((choice) => choice.value === this.value())?.label ?? NOTHING);
}
