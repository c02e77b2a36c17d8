import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatCheckbox } from '@angular/material/checkbox';
import { formatAmps } from '#calc';
import type { OpenLane } from '../mapping-view-store';

/** Dispensers that lack an output or a status input, to be ticked and placed. */
@Component({
  selector: 'lw-unmapped-list',
  imports: [MatCheckbox],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './unmapped-list.html',
  styleUrl: './unmapped-list.css',
})
export class UnmappedList {
  readonly lanes = input.required<readonly OpenLane[]>();
  readonly selected = input.required<ReadonlySet<string>>();
  readonly editable = input.required<boolean>();
  /** Said where no row is shown. */
  readonly empty = input.required<string>();
  readonly toggled = output<string>();
  readonly allToggled = output<boolean>();

  protected readonly amps = formatAmps;
  protected readonly allOn = computed(() => this.lanes().length > 0 && this.lanes().every((l) => this.selected().has(l.dispenser.id)));
  protected readonly someOn = computed(() => !this.allOn() && this.lanes().some((l) => this.selected().has(l.dispenser.id)));

  protected lacks(lane: OpenLane): string {
    return lane.missing.length === 2 ? 'both' : lane.missing[0] === 'control' ? 'output' : 'status';
  }
}
