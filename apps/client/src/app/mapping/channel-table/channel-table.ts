import { ChangeDetectionStrategy, Component, ElementRef, inject, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { ampsAgainstMaximum } from '#calc';
import { LoadBar } from '../../shared/figure/load-bar';
import { FindingMark } from '../../shared/findings/finding-mark';
import type { Mend } from '../../shared/findings/finding-mend';
import { Icon } from '../../shared/icon/icon';
import { LaneLine } from '../../shared/lane/lane-line';
import type { LaneView } from '../../shared/lane/lane-view';
import { ChannelFinder } from '../channel-finder/channel-finder';
import type { ChannelRow, GroupSection } from '../mapping-rows';
import type { OpenLane } from '../mapping-view-store';

/** The channels of the modules shown, by group with its worst load. Arrow keys move, typing in a free channel searches. */
@Component({
  selector: 'lw-channel-table',
  imports: [ChannelFinder, FindingMark, Icon, LaneLine, LoadBar, MatButton, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './channel-table.html',
  styleUrl: './channel-table.css',
})
export class ChannelTable {
  readonly sections = input.required<readonly GroupSection[]>();
  readonly open = input.required<readonly OpenLane[]>();
  readonly lanes = input.required<ReadonlyMap<string, LaneView>>();
  readonly editable = input.required<boolean>();
  readonly projectId = input.required<string>();
  readonly focusedKey = input.required<string | null>();
  readonly marked = input.required<ReadonlySet<string>>();
  /** Edits that would mend a finding by themselves, by the finding's key. */
  readonly mends = input.required<ReadonlyMap<string, Mend>>();
  readonly focusMoved = output<string>();
  readonly assigned = output<{ readonly lane: OpenLane; readonly row: ChannelRow }>();
  readonly filled = output<ChannelRow>();
  readonly unassigned = output<ReadonlySet<string>>();
  readonly markToggled = output<string>();
  readonly mended = output<Mend>();

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  protected readonly searching = signal<{ readonly key: string; readonly first: string } | null>(null);
  protected readonly upTo = ampsAgainstMaximum;

  /** Puts the keyboard on the first channel that auto-assignment would give. */
  goToProposed(): void {
    const row = this.sections().flatMap((s) => s.channels).find((r) => r.proposed);
    if (row) this.focus(row.key);
  }

  /** Puts the keyboard on the first channel of a module. */
  goTo(moduleId: string): void {
    const row = this.sections().flatMap((s) => s.channels).find((r) => r.module.id === moduleId);
    if (row) this.focus(row.key);
  }

  protected one(key: string): ReadonlySet<string> {
    return new Set([key]);
  }

  protected press(event: KeyboardEvent, row: ChannelRow): void {
    const act = this.acts[event.key];
    if (act && this.searching()?.key !== row.key) {
      event.preventDefault();
      act(row, event);
    } else if (this.editable() && !row.occupant && event.key.length === 1 && !event.ctrlKey && !event.altKey && !event.metaKey) {
      event.preventDefault();
      // Whoever types fast is ahead of the field that opens: what came before it is kept.
      const before = this.searching();
      this.searching.set({ key: row.key, first: (before?.key === row.key ? before.first : '') + event.key });
    }
  }

  protected search(row: ChannelRow): void {
    if (this.editable() && !row.occupant) this.searching.set({ key: row.key, first: '' });
  }

  protected choose(lane: OpenLane, row: ChannelRow): void {
    this.searching.set(null);
    this.assigned.emit({ lane, row });
    this.step(row, 1);
  }

  protected leave(row: ChannelRow): void {
    if (this.searching()?.key !== row.key) return;
    this.searching.set(null);
    this.focus(row.key);
  }

  private readonly acts: Readonly<Record<string, (row: ChannelRow, event: KeyboardEvent) => void>> = {
    ArrowDown: (row) => this.step(row, 1),
    ArrowUp: (row) => this.step(row, -1),
    Enter: (row, event) => (event.shiftKey ? this.filled.emit(row) : this.search(row)),
    ' ': (row) => row.occupant && this.editable() && this.markToggled.emit(row.key),
    Delete: (row) => this.editable() && this.unassigned.emit(this.marked().size > 0 ? this.marked() : new Set([row.key])),
  };

  private step(row: ChannelRow, by: number): void {
    const rows = this.sections().flatMap((s) => s.channels);
    const next = rows[rows.findIndex((r) => r.key === row.key) + by];
    if (next) this.focus(next.key);
  }

  private focus(key: string): void {
    this.focusMoved.emit(key);
    const element = this.host.nativeElement.querySelector<HTMLElement>(`[data-channel="${key}"]`);
    element?.focus();
    element?.scrollIntoView({ block: 'nearest' });
  }
}
