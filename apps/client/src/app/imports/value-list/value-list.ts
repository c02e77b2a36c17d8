import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { ImportPreview } from '#contract';
import type { ValueChoice } from '../import-settings';
import { several } from '../import-words';

/** Texts of choice fields that the project does not know, each with the value that it stands for. */
@Component({
  selector: 'lw-value-list',
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './value-list.css',
  template: `
    <h3>Words the project does not know</h3>
    <ul>
      @for (each of values(); track each.field + each.text) {
        <li>
          <span class="heading"><b>{{ each.text }}</b><span class="quiet">{{ labelOf(each.field) }}, {{ rows(each.rows) }}</span></span>
          <select #valueOf [disabled]="locked()" [class.open]="each.value === undefined" [attr.aria-label]="'Meaning of ' + each.text + ' in ' + labelOf(each.field)"
            (change)="mapped.emit({ field: each.field, text: each.text, value: valueOf.value || null })">
            <option value="" [selected]="!each.value">leave blank</option>
            @for (choice of each.choices; track choice) { <option [value]="choice" [selected]="choice === each.value">{{ choice }}</option> }
          </select>
        </li>
      }
    </ul>`,
})
export class ValueList {
  readonly values = input.required<readonly ValueChoice[]>();
  readonly fields = input.required<ImportPreview['fields']>();
  readonly locked = input(false);
  readonly mapped = output<{ readonly field: string; readonly text: string; readonly value: string | null }>();

  protected readonly rows = (count: number): string => several(count, 'row');

  protected labelOf(field: string): string {
    return this.fields().find((each) => each.key === field)?.label ?? field;
  }
}
