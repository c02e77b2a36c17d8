import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { LaneFigureName } from '#calc';
import { Figure } from '../../shared/figure/figure';
import type { FigureRow } from './figure-rows';

/** A list of figures with their limits; a dotted underline says that a click explains it. */
@Component({
  selector: 'lw-lane-figures',
  imports: [Figure],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    dl { margin: 0; font: var(--mat-sys-body-small); }
    div { display: grid; grid-template-columns: minmax(0, 1fr) auto; align-items: baseline; column-gap: 12px; min-height: var(--lw-row); padding: 4px 14px; border-top: 1px solid var(--lw-rule); }
    div.open { background: var(--lw-selected); }
    dt { color: var(--mat-sys-on-surface-variant); }
    dd { margin: 0; text-align: right; font-weight: 500; }
    .limit { grid-column: 1 / -1; font: var(--mat-sys-label-small); font-weight: 400; color: var(--mat-sys-on-surface-variant); text-align: right; }
    @media print {
      div { grid-template-columns: minmax(0, 1fr) auto auto; min-height: 0; padding: 1px 10px; }
      dd { font-weight: 600; }
      .limit { grid-column: auto; }
    }`,
  template: `
    <dl>
      @for (row of rows(); track row.label) {
        <div [class.open]="row.name !== null && row.name === shown()">
          <dt>{{ row.label }}</dt>
          <dd><lw-figure [text]="row.text" [explains]="row.name ? row.label : ''" [open]="row.name === shown()" [bad]="row.bad" (explain)="explain(row.name)" /></dd>
          @if (row.limit) { <dd class="limit">{{ row.limit }}</dd> }
        </div>
      }
    </dl>`,
})
export class LaneFigures {
  readonly rows = input.required<readonly FigureRow[]>();
  readonly shown = input<LaneFigureName | null>(null);
  readonly explained = output<LaneFigureName>();

  protected explain(name: LaneFigureName | null): void {
    if (name) this.explained.emit(name);
  }
}
