import { ChangeDetectionStrategy, Component, computed, input, linkedSignal, output } from '@angular/core';
import type { Assignment, Finding } from '#calc';
import { FindingMark } from '../../shared/findings/finding-mark';
import type { CabinetModules } from '../board';
import { kept } from '../mapping-rows';
import { type ModuleMark, moduleMarks } from './module-marks';

/** Every channel of the plant, one cell each: dotted free, hollow mapped. Pick a module to go there, or drop on it to fill it. */
@Component({
  selector: 'lw-channel-strip',
  imports: [FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './channel-strip.html',
  styleUrl: './channel-strip.css',
})
export class ChannelStrip {
  readonly cabinets = input.required<readonly CabinetModules[]>();
  readonly assignments = input.required<readonly Assignment[]>();
  readonly findings = input.required<readonly Finding[]>();
  /** Key of what a drag is over. */
  readonly aimed = input<string | null>(null);
  readonly picked = output<string>();

  /** By module id; what reads as before is the same object. */
  private readonly marks = linkedSignal<ReadonlyMap<string, ModuleMark>, ReadonlyMap<string, ModuleMark>>({
    source: () => moduleMarks(this.cabinets().flatMap((c) => c.modules), this.assignments(), this.findings()),
    computation: (made, before) => new Map([...made].map(([id, mark]) => [id, kept(mark, before?.value.get(id))])),
  });
  protected readonly view = computed(() => this.cabinets().map(({ cabinet, modules }) => ({
    cabinet, modules: modules.flatMap(({ module }) => this.marks().get(module.id) ?? []),
  })));
}
