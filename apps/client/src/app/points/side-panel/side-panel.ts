import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { Design } from '#calc';
import { ProjectStore } from '../../core/project/project-store';
import { Segmented } from '../../shared/controls/segmented';
import { FindingItem } from '../../shared/findings/finding-item';
import { Icon } from '../../shared/icon/icon';
import { SaveStateLine } from '../../shared/states/save-state';
import { AlternativesPanel, type DoseChoice } from '../alternatives-panel/alternatives-panel';
import { DemandForm } from '../demand-form/demand-form';
import { DispenserForm } from '../dispenser-form/dispenser-form';
import { PointEdits } from '../point-edits';
import type { PointRow } from '../point-rows';
import { type PanelTab, PointsViewStore } from '../points-view-store';

/** The focused point beside the table: dose and cartridge, demand, dispenser. */
@Component({
  selector: 'lw-points-side-panel',
  imports: [AlternativesPanel, DemandForm, DispenserForm, FindingItem, Icon, MatIconButton, RouterLink, SaveStateLine, Segmented],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(keydown.escape)': 'closed.emit()' },
  styleUrl: './side-panel.css',
  templateUrl: './side-panel.html',
})
export class PointsSidePanel {
  readonly row = input.required<PointRow>();
  readonly design = input.required<Design>();
  readonly closed = output<void>();
  protected readonly view = inject(PointsViewStore);
  protected readonly project = inject(ProjectStore);
  protected readonly edits = inject(PointEdits);

  protected readonly tabs: readonly { readonly value: PanelTab; readonly label: string }[] = [
    { value: 'dose', label: 'Dose' }, { value: 'demand', label: 'Demand' }, { value: 'dispenser', label: 'Dispenser' },
  ];
  /** Forms begin anew for another point. */
  protected readonly rows = computed(() => [this.row()]);
  protected readonly about = computed(() => [this.row().point.description, this.row().type?.name].filter(Boolean).join('; '));

  protected show(tab: string): void {
    this.view.tab.set(tab as PanelTab);
  }

  protected use({ cartridgeUl, doseUl, forTicked }: DoseChoice): void {
    this.edits.setDose(forTicked ? this.view.tickedRows() : [this.row()], cartridgeUl, doseUl);
  }
}
