import { computed, inject, Injectable, linkedSignal, signal } from '@angular/core';
import { ProjectStore } from '../core/project/project-store';
import { BoardStore } from './board-store';
import { type ChannelRow, type GroupSection, mappingSections, type SectionSource, type Shown } from './mapping-rows';
import { filtered, lacking } from './open-lanes';
import type { Cargo } from './moves/drop-target';
import { PreviewStore } from './preview-store';
import { kept, NONE, type Selection } from './selection';

/** What the mapping screen shows and selects; the rows themselves belong to the project store. */
@Injectable()
export class MappingViewStore {
  private readonly project = inject(ProjectStore);
  private readonly store = inject(BoardStore);
  private readonly previews = inject(PreviewStore);
  readonly shown = signal<Shown>('output');
  readonly filter = signal('');
  readonly focusedKey = signal<string | null>(null);
  /** A tap adds to the selection, as Ctrl with a click does. */
  readonly selecting = signal(false);

  readonly sections = linkedSignal<SectionSource | null, readonly GroupSection[]>({
    source: () => {
      const board = this.store.board();
      const assessment = this.store.assessment();
      return board && assessment && { board, assessment, lanes: this.store.lanes(), shown: this.shown(), proposals: this.previews.proposals() };
    },
    computation: (source, before) => (source ? mappingSections(source, before?.value) : []),
  });
  readonly channels = computed(() => this.sections().flatMap((section) => section.channels));
  readonly rowsByKey = computed(() => new Map(this.channels().map((row) => [row.key, row])));
  readonly focused = computed(() => this.rowsByKey().get(this.focusedKey() ?? '') ?? null);
  readonly visibleOpen = computed(() => filtered(this.store.open(), this.filter()));
  readonly openOrder = computed(() => this.visibleOpen().map((lane) => lane.dispenser.id));
  /** Keys of mapped channels, in order. */
  readonly mappedOrder = computed(() => this.channels().filter((row) => row.occupant && !row.proposed).map((row) => row.key));

  private readonly openIds = computed(() => new Set(this.store.open().map((lane) => lane.dispenser.id)));
  /** Chosen among those not mapped, by dispenser id; what is mapped meanwhile is chosen no more. */
  readonly openSelection = linkedSignal<ReadonlySet<string>, Selection>({
    source: this.openIds, computation: (ids, before) => kept(before?.value ?? NONE, (id) => ids.has(id)),
  });
  /** Chosen among mapped channels, by channel key. */
  readonly channelSelection = linkedSignal<readonly string[], Selection>({
    source: this.mappedOrder,
    computation: (order, before) => {
      const keys = new Set(order);
      return kept(before?.value ?? NONE, (key) => keys.has(key));
    },
  });
  readonly selected = computed(() => this.openSelection().ids);
  readonly marked = computed(() => this.channelSelection().ids);
  /** In the list's order. */
  readonly selectedOpen = computed(() => this.store.open().filter((lane) => this.selected().has(lane.dispenser.id)));
  readonly markedRows = computed<readonly ChannelRow[]>(() => this.channels().filter((row) => this.marked().has(row.key)));

  readonly counts = computed(() => {
    const design = this.project.design();
    const held = this.store.board()?.held;
    const pulsed = design?.dispensers.filter((d) => d.method === 'pulse') ?? [];
    return {
      mapped: pulsed.filter((d) => held?.has(`control/${d.id}`)).length, dispensers: pulsed.length,
      modules: design?.modules.length ?? 0, cabinets: design?.cabinets.length ?? 0,
    };
  });

  /** Shows channels of this kind beside what is shown already. */
  reveal(kind: 'output' | 'input'): void {
    if (this.shown() !== 'both') this.shown.set(kind);
  }

  /** What is picked up with a mapped channel: all that are chosen with it, of its kind, else itself. */
  cargoFrom(row: ChannelRow): Cargo | null {
    if (!row.occupant || row.proposed) return null;
    const rows = this.marked().has(row.key) ? this.markedRows().filter((r) => r.purpose === row.purpose) : [row];
    return { dispenserIds: rows.flatMap((r) => r.occupant?.dispenser.id ?? []), purpose: row.purpose };
  }

  /** What is picked up with a dispenser of the list: all that are chosen with it, else itself. */
  cargoOf(dispenserId: string): Cargo {
    return { dispenserIds: this.selected().has(dispenserId) ? this.selectedOpen().map((lane) => lane.dispenser.id) : [dispenserId], purpose: null };
  }

  /** Those chosen that may still go on a channel like this one. */
  waitingFor(row: ChannelRow): readonly string[] {
    return this.selectedOpen().filter((lane) => lacking(lane, row.purpose)).map((lane) => lane.dispenser.id);
  }
}
