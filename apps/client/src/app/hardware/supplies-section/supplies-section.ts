import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { ampsAgainstMaximum, ampsAgainstMinimum, type CircuitFigures, formatAmps, NOTHING, type SupplyFigures, voltsAgainstMinimum } from '#calc';
import { Figure } from '../../shared/figure/figure';
import { LoadBar } from '../../shared/figure/load-bar';
import { SaveField } from '../../shared/fields/save-field';
import { SaveSelect } from '../../shared/fields/save-select';
import { numberText } from '../../shared/fields/typed';
import { Icon } from '../../shared/icon/icon';
import { EmptyState } from '../../shared/states/empty-state';
import { FoundList } from '../found-list/found-list';
import { HardwareActs } from '../hardware-acts';
import { HardwareViewStore } from '../hardware-view-store';
import { PROTECTIONS, READ } from '../readers';

interface Line {
  readonly name: string;
  readonly text: string;
  readonly bad?: boolean;
}

/** Supplies with what they carry, and the circuits on each with protection, limit k, loads and voltages. */
@Component({
  selector: 'lw-supplies-section',
  imports: [EmptyState, Figure, FoundList, Icon, LoadBar, MatButton, MatCheckbox, SaveField, SaveSelect],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrls: ['../hardware.css', './supplies-section.css'],
  templateUrl: './supplies-section.html',
})
export class SuppliesSection {
  protected readonly view = inject(HardwareViewStore);
  protected readonly acts = inject(HardwareActs);
  protected readonly read = READ;
  protected readonly typed = numberText;
  protected readonly protections = PROTECTIONS;
  protected readonly upTo = ampsAgainstMaximum;
  protected readonly atLeast = ampsAgainstMinimum;
  protected readonly amps = formatAmps;
  protected readonly volts = voltsAgainstMinimum;
  protected readonly nothing = NOTHING;

  protected linesOf(f: SupplyFigures): readonly Line[] {
    return [
      { name: 'Standing', text: ampsAgainstMaximum(f.standingA) }, { name: 'Worst under k', text: ampsAgainstMaximum(f.worstA) },
      { name: 'All on', text: ampsAgainstMaximum(f.allOnA) }, { name: 'Demand with margin', text: ampsAgainstMaximum(f.demandA), bad: f.demandA > f.ratingA },
      { name: 'Derated rating', text: ampsAgainstMinimum(f.ratingA) }, { name: 'Headroom', text: ampsAgainstMinimum(f.headroomA), bad: f.headroomA < 0 },
      { name: 'Room for dispensers', text: roomFor(f.headroomDispensers) }, { name: 'Lowest voltage', text: voltsAgainstMinimum(f.lowestV) },
    ];
  }

  /** The limit that would pass, where it is another than the one set. */
  protected offered(figures: CircuitFigures): number | null {
    const { largestPassingK: largest, concurrencyLimit, dispensers } = figures;
    return largest && largest !== (concurrencyLimit ?? dispensers) ? largest : null;
  }

  protected largest({ largestPassingK }: CircuitFigures): string {
    return largestPassingK === 0 ? 'none' : String(largestPassingK ?? NOTHING);
  }
}

const roomFor = (dispensers: number | null): string => (dispensers === null ? NOTHING : `${dispensers} more at once`);
