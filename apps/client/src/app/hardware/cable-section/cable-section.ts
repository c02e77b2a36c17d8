import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { formatMetres } from '#calc';
import { Caution, type CautionItem } from '../../shared/caution/caution';
import { SaveField } from '../../shared/fields/save-field';
import { SaveSelect } from '../../shared/fields/save-select';
import { numberText } from '../../shared/fields/typed';
import { Icon } from '../../shared/icon/icon';
import { EmptyState } from '../../shared/states/empty-state';
import { FoundList } from '../found-list/found-list';
import { HardwareActs } from '../hardware-acts';
import { HardwareViewStore } from '../hardware-view-store';
import { CONDUCTOR_CLASSES, READ, sectionsWith } from '../readers';
import { HungList } from './hung-list';

/** The cable tree of each circuit: from the cabinet's terminals to the boxes, with the dispensers that hang on each. */
@Component({
  selector: 'lw-cable-section',
  imports: [Caution, EmptyState, FoundList, HungList, Icon, MatButton, SaveField, SaveSelect],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrls: ['../hardware.css', './cable-section.css'],
  templateUrl: './cable-section.html',
})
export class CableSection {
  protected readonly view = inject(HardwareViewStore);
  protected readonly acts = inject(HardwareActs);
  protected readonly projectId = computed(() => this.view.policies()?.id ?? '');
  protected readonly read = READ;
  protected readonly typed = numberText;
  protected readonly sections = sectionsWith;
  protected readonly classes = CONDUCTOR_CLASSES;
  protected readonly metres = formatMetres;
  protected readonly cautions: readonly CautionItem[] = [
    { act: 'Isolate, lock out and prove dead before wiring.', why: 'The machine drive and the 24 V are two isolations.' },
    { act: 'Only a SELV or PELV supply of 24 V.', why: 'Nothing else may feed a dispenser.' },
  ];
}
