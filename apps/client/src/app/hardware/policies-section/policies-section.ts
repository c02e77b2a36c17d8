import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { SaveField } from '../../shared/fields/save-field';
import { FoundList } from '../found-list/found-list';
import { HardwareViewStore } from '../hardware-view-store';
import { POLICIES, type Policy } from './policies';

/** The defaults of the project that a user may change, each with what it does and where it comes from. */
@Component({
  selector: 'lw-policies-section',
  imports: [FoundList, SaveField],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrls: ['../hardware.css', './policies-section.css'],
  template: `
    @if (view.policies(); as project) {
      @if (view.findingsOf(project.id).length > 0) { <div class="sub"><lw-found-list [subject]="project.id" /></div> }
      @for (part of parts; track part.title) {
        <section [attr.aria-label]="part.title">
          <header class="band"><h2>{{ part.title }}</h2></header>
          @for (policy of part.policies; track policy.field) {
            <div class="policy">
              <lw-save-field [label]="policy.label" [unit]="policy.unit" [blank]="policy.blank ?? ''" [value]="policy.text(project)" [read]="policy.read"
                [editable]="view.canEdit()" (saved)="save(project.id, policy, $event)" />
              <p class="small">{{ policy.does }} <span class="quiet">{{ policy.source }}.</span></p>
            </div>
          }
        </section>
      }
    }`,
})
export class PoliciesSection {
  protected readonly view = inject(HardwareViewStore);
  protected readonly parts = POLICIES;

  protected save(projectId: string, policy: Policy, value: string | number | null): void {
    this.view.edit('projects', projectId, { [policy.field]: value });
  }
}
