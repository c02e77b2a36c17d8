import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { formatNumber } from '#calc';
import { Drawing } from '../drawing/drawing';
import { Figure } from '../figure/figure';
import { FindingMark } from '../findings/finding-mark';
import type { LoopView } from './loop-view';
import { columnParts } from './upright-profile';
import { uprightStations } from './upright-stations';

/** The loop diagram where there is little room: one station a line, the voltage profile as a column beside it. */
@Component({
  selector: 'lw-loop-upright',
  imports: [Drawing, Figure, FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './loop-upright.css',
  templateUrl: './loop-upright.html',
})
export class LoopUpright {
  readonly loop = input.required<LoopView>();
  readonly words = input.required<string>();
  protected readonly stations = computed(() => uprightStations(this.loop()));
  protected readonly column = computed(() => columnParts(this.loop().profile, this.stations()));
  /** What stands under the column: the figures that have no station of their own. */
  protected readonly notes = computed(() => {
    const profile = this.loop().profile;
    if (!profile) return null;
    const volts = (value: number | null): string | null => (value === null ? null : `${formatNumber(value, 1, 'down')} V`);
    return { worstSet: profile.worstSet, min: volts(profile.minV), idle: volts(profile.idleV), allOn: volts(profile.allOnV), count: profile.allOnCount };
  });
}
