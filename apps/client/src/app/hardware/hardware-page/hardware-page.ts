import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Router } from '@angular/router';
import { ProjectStore } from '../../core/project/project-store';
import { Segmented } from '../../shared/controls/segmented';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { PageHead } from '../../shared/states/page-head';
import { CabinetsSection } from '../cabinets-section/cabinets-section';
import { CableSection } from '../cable-section/cable-section';
import { HardwareActs } from '../hardware-acts';
import { HardwareViewStore } from '../hardware-view-store';
import { PoliciesSection } from '../policies-section/policies-section';
import { SuppliesSection } from '../supplies-section/supplies-section';

type Part = 'cabinets' | 'circuits' | 'cables' | 'policies';

/** Cabinets and modules, supplies and circuits, the cable tree, and the project's policies. */
@Component({
  selector: 'lw-hardware-page',
  imports: [CabinetsSection, CableSection, ErrorState, LoadingRows, PageHead, PoliciesSection, Segmented, SuppliesSection],
  providers: [HardwareViewStore, HardwareActs],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'page' },
  styleUrl: './hardware-page.css',
  template: `
    <lw-page-head title="Hardware and wiring" [sub]="sentence()" />
    @if (store.failed(); as problem) {
      <lw-error-state title="The project did not load." [detail]="problem.detail ?? problem.title" (retry)="store.reload()" />
    } @else if (store.design() && store.assessment()) {
      <div class="parts"><lw-segmented label="Part of the hardware" [segments]="parts" [value]="shown()" (valueChange)="show($event)" /></div>
      <div class="fill">
        @switch (shown()) {
          @case ('cabinets') { <lw-cabinets-section /> }
          @case ('circuits') { <lw-supplies-section /> }
          @case ('cables') { <lw-cable-section /> }
          @case ('policies') { <lw-policies-section /> }
        }
      </div>
    } @else { <lw-loading-rows text="Loading the project" /> }`,
})
export class HardwarePage {
  /** From the address, `?part=circuits`. */
  readonly part = input<string>();
  protected readonly store = inject(ProjectStore);
  private readonly router = inject(Router);

  protected readonly parts: readonly { readonly value: Part; readonly label: string }[] = [
    { value: 'cabinets', label: 'Cabinets and modules' }, { value: 'circuits', label: 'Supplies and circuits' },
    { value: 'cables', label: 'Cable tree' }, { value: 'policies', label: 'Policies' },
  ];
  protected readonly shown = computed<Part>(() => this.parts.find(({ value }) => value === this.part())?.value ?? 'cabinets');
  protected readonly sentence = computed(() => {
    const design = this.store.design();
    if (!design) return '';
    return `${count(design.cabinets, 'cabinet')}, ${count(design.modules, 'module')}, ${count(design.circuits, 'circuit')}, ${count(design.cableNodes, 'box', 'boxes')}.`;
  });

  protected show(part: Part): void {
    void this.router.navigate([], { queryParams: { part }, queryParamsHandling: 'merge', replaceUrl: true });
  }
}

const count = (rows: readonly unknown[], one: string, many = `${one}s`): string => `${rows.length} ${rows.length === 1 ? one : many}`;
