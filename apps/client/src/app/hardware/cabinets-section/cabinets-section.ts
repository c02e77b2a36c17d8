import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { ampsAgainstMaximum, formatAmps, type LoadFigures, NOTHING } from '#calc';
import { LoadBar } from '../../shared/figure/load-bar';
import { SaveField } from '../../shared/fields/save-field';
import { SaveSelect } from '../../shared/fields/save-select';
import { numberText } from '../../shared/fields/typed';
import { Icon } from '../../shared/icon/icon';
import { EmptyState } from '../../shared/states/empty-state';
import type { ModuleView } from '../cabinet-views';
import { FoundList } from '../found-list/found-list';
import { HardwareActs } from '../hardware-acts';
import { HardwareViewStore } from '../hardware-view-store';
import { READ } from '../readers';

/** Cabinets with their controllers; their modules in rack order with addresses, loads and the circuits that feed their groups. */
@Component({
  selector: 'lw-cabinets-section',
  imports: [EmptyState, FoundList, Icon, LoadBar, MatButton, SaveField, SaveSelect],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: '../hardware.css',
  templateUrl: './cabinets-section.html',
})
export class CabinetsSection {
  protected readonly view = inject(HardwareViewStore);
  protected readonly acts = inject(HardwareActs);
  protected readonly read = READ;
  protected readonly typed = numberText;
  protected readonly nothing = NOTHING;

  /** Only outputs carry a load. */
  protected loadOf({ type, figures }: ModuleView): LoadFigures | null {
    return type.kind === 'output' ? figures : null;
  }

  /** `1.26 A of 1.50 A` */
  protected of(load: LoadFigures): string {
    const worst = ampsAgainstMaximum(load.worstA);
    return load.ratingA === null ? worst : `${worst} of ${formatAmps(load.ratingA)}`;
  }
}
