import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Assignment, Finding } from '#calc';
import { FindingMark } from '../../shared/findings/finding-mark';
import { channelKey, type CabinetModules } from '../mapping-rows';

/** Every channel of the plant, one cell each: dotted free, hollow mapped. Pick a module to go there. */
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
  readonly picked = output<string>();

  protected readonly view = computed(() => {
    const taken = new Set(this.assignments().map((a) => channelKey(a.moduleId, a.channel)));
    return this.cabinets().map(({ cabinet, modules }) => ({
      cabinet,
      modules: modules.map(({ module, type }) => {
        const cells = Array.from({ length: type.channels }, (_, c) => ({
          x: c * 9 + Math.floor(c / type.channelsPerGroup) * 4, taken: taken.has(channelKey(module.id, c)),
        }));
        return {
          module, cells, width: (cells.at(-1)?.x ?? 0) + 7,
          used: cells.filter((cell) => cell.taken).length,
          note: type.kind === 'input' ? 'in' : type.technology === 'relay' ? 'relay' : 'out',
          severity: this.worst(module.id),
        };
      }),
    }));
  });

  private worst(moduleId: string): 'error' | 'warning' | null {
    const own = this.findings().filter((f) => f.subject.id === moduleId || f.subject.id.startsWith(`${moduleId}/`));
    return own.some((f) => f.severity === 'error') ? 'error' : own.some((f) => f.severity === 'warning') ? 'warning' : null;
  }
}
