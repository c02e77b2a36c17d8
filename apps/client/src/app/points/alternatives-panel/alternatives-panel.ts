import { afterRenderEffect, ChangeDetectionStrategy, Component, computed, ElementRef, inject, input, linkedSignal, output, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type Alternative, formatCount, formatDuration, formatInterval, formatNumber, type Project, type RankBy, volumeFigure } from '#calc';
import { Segmented } from '../../shared/controls/segmented';
import { Figure } from '../../shared/figure/figure';
import { intervalParts } from '../interval-parts';
import type { PointRow } from '../point-rows';
import { alternativesView, changesInYear, keyOf, pairText, spoken } from './alternatives-view';

/** A dose and cartridge to be set, for this point or for all that are ticked. */
export interface DoseChoice {
  readonly cartridgeUl: number;
  readonly doseUl: number;
  readonly forTicked: boolean;
}

const RANKS: readonly { readonly value: RankBy; readonly label: string }[] = [
  { value: 'fewest-changes', label: 'Fewest changes' }, { value: 'smallest-dose', label: 'Smallest dose' }, { value: 'least-over', label: 'Least over' },
];

/** Cartridges and doses of the type for one point: what each would give, and which does not pass. */
@Component({
  selector: 'lw-alternatives-panel',
  imports: [Figure, MatButton, Segmented],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './alternatives-panel.css',
  templateUrl: './alternatives-panel.html',
})
export class AlternativesPanel {
  readonly row = input.required<PointRow>();
  readonly project = input.required<Project>();
  readonly editable = input.required<boolean>();
  /** How many points are ticked; from two on the choice can go to all of them. */
  readonly tickedCount = input.required<number>();
  readonly used = output<DoseChoice>();

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly matrix = viewChild<ElementRef<HTMLElement>>('matrix');
  protected readonly ranks = RANKS;
  protected readonly rankBy = linkedSignal(() => this.project().rankBy);
  protected readonly target = linkedSignal<string>(() => (this.tickedCount() > 1 ? 'ticked' : 'one'));
  protected readonly targets = computed(() => [{ value: 'one', label: this.row().point.tag }, { value: 'ticked', label: `${this.tickedCount()} ticked` }]);
  protected readonly view = computed(() => alternativesView(this.row(), this.project(), this.rankBy()));
  private readonly pickedKey = linkedSignal<string, string | null>({ source: () => this.row().point.id, computation: () => null });
  /** What is compared: now, the first in rank, and the one picked in the matrix. */
  protected readonly compared = computed(() => {
    const { now, first, third, lines } = this.view();
    const picked = lines.flatMap((line) => line.cells).find((each) => keyOf(each) === this.pickedKey());
    const other = picked && picked !== now && picked !== first ? picked : third;
    return [now, first === now ? null : first, other].filter((each): each is Alternative => each !== null);
  });
  protected readonly otherKey = computed(() => {
    const other = this.compared().at(-1);
    return other && other !== this.view().now && other !== this.view().first ? keyOf(other) : null;
  });

  protected readonly cm3 = volumeFigure;
  protected readonly whole = formatNumber;
  protected readonly pair = pairText;
  protected readonly key = keyOf;
  protected readonly changes = changesInYear;
  protected readonly spoken = spoken;
  protected readonly interval = formatInterval;
  protected readonly parts = intervalParts;
  protected readonly count = formatCount;
  protected readonly duration = formatDuration;

  constructor() {
    afterRenderEffect(() => {
      this.view();
      this.showChosen();
    });
  }

  protected rank(by: string): void {
    this.rankBy.set(by as RankBy);
  }

  protected pick(each: Alternative): void {
    this.pickedKey.set(keyOf(each));
  }

  protected use({ cartridgeUl, doseUl }: Alternative): void {
    this.used.emit({ cartridgeUl, doseUl, forTicked: this.target() === 'ticked' && this.tickedCount() > 1 });
  }

  protected heading(each: Alternative): string {
    const rank = each.rank === null ? 'not passing' : `rank\u00a0${each.rank}`;
    return each === this.view().now ? `Now, ${rank}` : rank.charAt(0).toUpperCase() + rank.slice(1);
  }

  /** Arrow keys walk through the matrix. */
  protected walk(event: KeyboardEvent, line: number, column: number): void {
    const steps: Readonly<Record<string, readonly [number, number]>> = { ArrowDown: [1, 0], ArrowUp: [-1, 0], ArrowRight: [0, 1], ArrowLeft: [0, -1] };
    const step = steps[event.key];
    if (!step) return;
    event.preventDefault();
    const [down, right] = step;
    this.host.nativeElement.querySelector<HTMLElement>(`[data-cell="${line + down}/${column + right}"]`)?.focus();
  }

  /** Many doses do not fit beside each other: the one set now is brought into view, with the first in rank if both fit. */
  private showChosen(): void {
    const box = this.matrix()?.nativeElement;
    const cells = [...(box?.querySelectorAll<HTMLElement>('td.cur, td.cmp') ?? [])];
    if (!box || cells.length === 0) return;
    const room = box.getBoundingClientRect();
    const left = room.left + (box.querySelector('th')?.offsetWidth ?? 0);
    const [from, to] = spanOf(cells);
    const shown = to - from <= room.right - left ? [from, to] : spanOf([box.querySelector<HTMLElement>('td.cur') ?? cells[0]]);
    box.scrollLeft += (shown[0] + shown[1]) / 2 - (left + room.right) / 2;
  }
}

/** Where cells begin and end across the screen, px. */
function spanOf(cells: readonly HTMLElement[]): readonly [from: number, to: number] {
  const boxes = cells.map((cell) => cell.getBoundingClientRect());
  return [Math.min(...boxes.map((box) => box.left)), Math.max(...boxes.map((box) => box.right))];
}
