import { ChangeDetectionStrategy, Component, input, model } from '@angular/core';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';

export interface Segment<T extends string = string> {
  readonly value: T;
  readonly label: string;
  /** Stands behind the label, for instance a count; a large one as words. */
  readonly count?: number | string;
}

/** One choice of a few, side by side. */
@Component({
  selector: 'lw-segmented',
  imports: [MatButtonToggle, MatButtonToggleGroup],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: ':host { display: inline-block; } b { font-weight: 600; margin-left: 4px; }',
  template: `
    <mat-button-toggle-group hideSingleSelectionIndicator [attr.aria-label]="label()" [value]="value()" (change)="value.set($event.value)">
      @for (segment of segments(); track segment.value) {
        <mat-button-toggle [value]="segment.value">{{ segment.label }}@if (segment.count !== undefined) {<b>{{ segment.count }}</b>}</mat-button-toggle>
      }
    </mat-button-toggle-group>`,
})
export class Segmented<T extends string = string> {
  readonly segments = input.required<readonly Segment<T>[]>();
  /** What is chosen here, for those who listen. */
  readonly label = input.required<string>();
  readonly value = model.required<T>();
}
