import { BreakpointObserver } from '@angular/cdk/layout';
import { ChangeDetectionStrategy, Component, computed, inject, signal, viewChild } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { map } from 'rxjs';
import { ProjectStore } from '../../core/project/project-store';
import { Segmented } from '../../shared/controls/segmented';
import type { Mend } from '../../shared/findings/finding-mend';
import { Icon } from '../../shared/icon/icon';
import { EmptyState } from '../../shared/states/empty-state';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { Notice } from '../../shared/states/notice';
import { PageHead } from '../../shared/states/page-head';
import { BoardStore } from '../board-store';
import { ChannelPanel } from '../channel-panel/channel-panel';
import { ChannelStrip } from '../channel-strip/channel-strip';
import { ChannelTable } from '../channel-table/channel-table';
import { FillPanel } from '../fill-panel/fill-panel';
import type { ChannelRow, Shown } from '../mapping-rows';
import { MappingViewStore } from '../mapping-view-store';
import { MoveBar } from '../move-bar/move-bar';
import { MoveChip } from '../move-chip/move-chip';
import { DragGesture, type DragPoint } from '../moves/drag-gesture';
import { targetOf } from '../moves/drop-target';
import { MoveActs } from '../move-acts';
import { MoveStore } from '../moves/move-store';
import type { OpenLane } from '../open-lanes';
import { PreviewPanel } from '../preview-panel/preview-panel';
import { PreviewStore } from '../preview-store';
import { type MenuOf, RowMenu } from '../row-menu/row-menu';
import { NONE } from '../selection';
import { UnmappedList } from '../unmapped-list/unmapped-list';

@Component({
  selector: 'lw-mapping-page',
  imports: [
    ChannelPanel, ChannelStrip, ChannelTable, DragGesture, EmptyState, ErrorState, FillPanel, Icon, LoadingRows, MatButton, MatCheckbox, MatMenu,
    MatMenuItem, MatMenuTrigger, MoveBar, MoveChip, Notice, PageHead, PreviewPanel, RouterLink, RowMenu, Segmented, UnmappedList,
  ],
  providers: [BoardStore, PreviewStore, MappingViewStore, MoveStore, MoveActs],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:keydown.alt.a)': 'preview($event)', '(document:keydown.escape)': 'giveUp()' },
  templateUrl: './mapping-page.html',
  styleUrl: './mapping-page.css',
})
export class MappingPage {
  protected readonly project = inject(ProjectStore);
  protected readonly store = inject(BoardStore);
  protected readonly view = inject(MappingViewStore);
  protected readonly move = inject(MoveStore);
  protected readonly previews = inject(PreviewStore);
  protected readonly acts = inject(MoveActs);
  private readonly screens = inject(BreakpointObserver);
  private readonly table = viewChild(ChannelTable);
  private readonly list = viewChild(UnmappedList);
  private readonly menu = viewChild(RowMenu);

  protected readonly none = NONE;
  protected readonly kinds: readonly { readonly value: Shown; readonly label: string }[] = [
    { value: 'output', label: 'Outputs' }, { value: 'input', label: 'Inputs' }, { value: 'both', label: 'Both' },
  ];
  protected readonly phone = this.media('(max-width: 600px)');
  private readonly coarse = this.media('(pointer: coarse), (max-width: 600px)');
  protected readonly rowPx = computed(() => (this.coarse() ? 48 : 28));
  protected readonly channelPx = computed(() => (this.phone() ? 56 : this.rowPx()));
  protected readonly pointer = signal<DragPoint | null>(null);
  protected readonly editable = computed(() => this.store.canEdit() && !this.previews.active());
  protected readonly projectId = computed(() => this.project.document()?.project.id ?? '');
  protected readonly listUrl = computed(() => `/api/v1/projects/${this.projectId()}/documents/io-list`);
  protected readonly sentence = computed(() => {
    const c = this.view.counts();
    return `${c.mapped} of ${c.dispensers} dispensers mapped. ${c.cabinets} cabinets, ${c.modules} modules.`;
  });
  protected readonly nothingOpen = computed(() => {
    if (this.project.design()?.dispensers.length === 0) return 'No dispensers yet: import the tag list, or enter points.';
    return this.store.open().length === 0 ? 'Every dispenser has its channels.' : 'No dispenser without a channel meets the filter.';
  });
  protected preview(event?: Event): void {
    event?.preventDefault();
    if (!this.store.canEdit() || this.store.open().length === 0) return;
    this.previews.startAuto(this.view.selectedOpen().map((lane) => lane.dispenser.id));
    this.view.shown.set('both');
    setTimeout(() => this.table()?.goToProposed());
  }

  protected giveUp(): void {
    if (this.move.move()?.by === 'form') return;
    if (this.move.move()) this.move.cancel();
    else this.previews.discard();
  }

  protected show(kind: string): void {
    this.view.shown.set(kind as Shown);
  }

  protected goTo(moduleId: string): void {
    const rack = this.store.board()?.moduleOf.get(moduleId);
    if (rack) this.view.reveal(rack.type.kind);
    setTimeout(() => this.table()?.goToModule(moduleId));
  }

  protected mend(mend: Mend): void {
    void this.project.edit('circuits', mend.circuitId, { concurrencyLimit: mend.concurrencyLimit });
  }

  protected assign(lane: OpenLane, row: ChannelRow): void {
    this.move.put({ dispenserIds: [lane.dispenser.id], purpose: null }, targetOf(row.key));
  }

  /** The chosen dispensers on the free channels from this row on. */
  protected assignSelected(row: ChannelRow): void {
    this.move.put({ dispenserIds: this.view.waitingFor(row), purpose: null }, targetOf(row.key));
  }

  protected startFill(targetKey?: string): void {
    const first = this.view.sections().find((section) => section.free > 0)?.key;
    const key = targetKey ?? first;
    if (key === undefined) return;
    this.previews.startFill(key, this.view.selectedOpen().map((lane) => lane.dispenser.id));
    setTimeout(() => this.table()?.goToProposed());
  }

  /** A row is dragged: with all that are chosen, where it is one of them. */
  protected dragFrom(lift: string): void {
    const cargo = this.acts.cargoAt(lift);
    if (cargo) this.move.lift({ cargo, by: 'pointer', from: lift });
  }

  protected drag(at: DragPoint): void {
    if (!this.move.move()) return;
    this.pointer.set(at);
    this.move.aim(at.key);
  }

  protected dropHere(): void {
    this.pointer.set(null);
    this.move.drop();
  }

  protected dropDragged(): void {
    this.pointer.set(null);
    this.move.cancel();
  }

  /** The keyboard carries: it goes to the channel over which it begins. */
  protected follow(): void {
    setTimeout(() => this.table()?.goTo(this.move.aimed() ?? undefined));
  }

  protected dropCarried(): void {
    const key = this.move.aimed();
    if (this.move.drop()) this.table()?.goTo(key ?? undefined);
  }

  protected cancelCarried(): void {
    const from = this.move.move()?.from;
    this.move.cancel();
    if (from === undefined) return;
    if (this.view.rowsByKey().has(from)) this.table()?.goTo(from);
    else this.list()?.goTo(from);
  }

  protected openMenu(at: HTMLElement, of: Omit<MenuOf, 'count'>): void {
    this.menu()?.open(at, { ...of, count: this.acts.cargoAt(`${of.kind} ${of.key}`)?.dispenserIds.length ?? 1 });
  }

  private media(query: string) {
    return toSignal(this.screens.observe(query).pipe(map((state) => state.matches)), { initialValue: false });
  }
}
