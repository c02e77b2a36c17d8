import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Drawing } from '../drawing/drawing';
import { Figure } from '../figure/figure';
import type { LoopView } from './loop-view';
import { uprightStations } from './upright-stations';

/** The loop diagram on a phone: one station a line. */
@Component({
  selector: 'lw-loop-upright',
  imports: [Drawing, Figure],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './loop-upright.css',
  template: `
    <ol>
      @for (station of stations(); track $index) {
        <li class="st-{{ loop().state }}" [class.grease]="station.grease">
          <span class="ln {{ loop().state }}" aria-hidden="true"></span>
          <svg class="lane" width="24" height="24" viewBox="0 0 24 24" aria-hidden="true" [lwDrawing]="station.node"></svg>
          <div><span class="k">{{ station.kind }}</span><span class="v" [class.mono]="station.mono">{{ station.name }}</span><span class="d">{{ station.detail }}</span></div>
          @if (station.figure) { <lw-figure class="r" [text]="station.figure" [bad]="station.bad" /> }
        </li>
      }
    </ol>
    @if (loop().wiring === 'four-core') {
      <p class="back">{{ loop().status === null ? 'The status signal has no input yet.' : 'Status back to ' }}@if (loop().status; as status) {<span class="mono">{{ status.module }} {{ status.address }}</span>}</p>
    } @else { <p class="back">Two-core: the output feeds the motor; there is no status signal.</p> }`,
})
export class LoopUpright {
  readonly loop = input.required<LoopView>();
  protected readonly stations = computed(() => uprightStations(this.loop()));
}
