import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { LoopView } from './loop-view';
import { stationRows } from './station-rows';

/** The diagram's figures as a table, opened by mouse or keyboard. */
@Component({
  selector: 'lw-loop-stations',
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    summary { display: flex; align-items: center; gap: 6px; width: fit-content; min-height: 32px; padding: 0 14px; font: var(--mat-sys-body-small); color: var(--mat-sys-primary); cursor: pointer; }
    summary::before { content: ''; width: 6px; height: 6px; border: solid currentColor; border-width: 0 1.5px 1.5px 0; rotate: -45deg; }
    [open] summary::before { rotate: 45deg; }
    table { border-top: 1px solid var(--lw-rule); }
    th { position: static; padding: 0 14px; }
    tbody th { background: none; border-bottom-color: var(--lw-rule); vertical-align: middle; }
    td { height: 26px; padding: 3px 14px; white-space: normal; }
    @media (pointer: coarse) { summary { min-height: 48px; } }`,
  template: `
    <details>
      <summary>Stations as a table</summary>
      <table>
        <caption class="sr">Stations of the lane</caption>
        <thead><tr><th scope="col">Station</th><th scope="col">What leads there</th><th scope="col" class="num">From the cabinet</th><th scope="col" class="num">Current</th><th scope="col" class="num">Worst set</th><th scope="col" class="num">Running alone</th><th scope="col">Findings</th></tr></thead>
        <tbody>
          @for (row of rows(); track row.station) {
            <tr><th scope="row">{{ row.station }}</th><td>{{ row.cable }}</td><td class="num">{{ row.metres }}</td><td class="num">{{ row.amps }}</td><td class="num">{{ row.worst }}</td><td class="num">{{ row.alone }}</td><td class="code">{{ row.findings || '–' }}</td></tr>
          }
        </tbody>
      </table>
    </details>`,
})
export class LoopStations {
  readonly loop = input.required<LoopView>();
  protected readonly rows = computed(() => stationRows(this.loop()));
}
