import { computed, inject, Injectable, signal } from '@angular/core';
import type { DemandUnit } from '#calc';
import { ProjectStore } from '../core/project/project-store';
import { type ColumnId, columnAt, COLUMNS, stepColumn } from './grid-columns';
import { filteredRows, gridLines, groupedRows, nextWithFinding, pointRows, rangeOf } from './point-rows';

/** The cell under the keyboard. */
export interface CellPlace {
  readonly pointId: string;
  readonly column: ColumnId;
}

/** A cell that is being typed into, and why it could not be taken. */
export interface CellEdit extends CellPlace {
  readonly text: string;
  /** What was typed began the edit and has replaced what stood there. */
  readonly typed: boolean;
  readonly reason: string | null;
}

export type PanelTab = 'dose' | 'demand' | 'dispenser';

/** What the page shows, filters, ticks and focuses; the rows themselves belong to the project store. */
@Injectable()
export class PointsViewStore {
  private readonly project = inject(ProjectStore);
  private readonly wanted = signal<CellPlace | null>(null);
  private readonly anchor = signal<string | null>(null);
  private readonly tickedIds = signal<ReadonlySet<string>>(new Set());
  private readonly ownUnit = signal<DemandUnit | null>(null);

  readonly filter = signal('');
  readonly onlyFindings = signal(false);
  readonly editing = signal<CellEdit | null>(null);
  /** Why the last paste, fill or deletion was not made. */
  readonly refusal = signal<string | null>(null);
  readonly tab = signal<PanelTab>('dose');
  readonly panelOpen = signal(true);
  /** On a phone the panel is a sheet, which opens for a row that is chosen. */
  readonly sheetOpen = signal(false);

  readonly canEdit = this.project.canEdit;
  readonly rows = computed(() => {
    const design = this.project.design();
    const assessment = this.project.assessment();
    return design && assessment ? pointRows(design, assessment) : [];
  });
  readonly groups = computed(() => groupedRows(filteredRows(this.rows(), this.filter(), this.onlyFindings())));
  readonly lines = computed(() => gridLines(this.groups()));
  /** The rows shown, in the order shown. */
  readonly shown = computed(() => this.groups().flatMap((group) => group.rows));
  readonly withFindings = computed(() => this.rows().filter((row) => row.findings.length > 0).length);
  readonly unit = computed<DemandUnit>(() => this.ownUnit() ?? this.project.design()?.project.demandPer ?? '1000h');
  readonly context = computed(() => ({ demandPer: this.unit(), tags: new Map(this.rows().map((row) => [row.point.tag, row.point.id])) }));

  /** The focused cell; where its row is filtered away, the same column of the first row. */
  readonly focus = computed<CellPlace | null>(() => {
    const wanted = this.wanted();
    const shown = this.shown();
    if (wanted && shown.some((row) => row.point.id === wanted.pointId)) return wanted;
    return shown[0] ? { pointId: shown[0].point.id, column: wanted?.column ?? 'doseUl' } : null;
  }, { equal: (a, b) => a?.pointId === b?.pointId && a?.column === b?.column });
  readonly focusedRow = computed(() => this.shown().find((row) => row.point.id === this.focus()?.pointId) ?? null);
  /** Rows of the range that Shift and the arrows stretch, the focused one included. */
  readonly range = computed<ReadonlySet<string>>(() => {
    const focus = this.focus();
    return new Set(focus ? rangeOf(this.shown(), this.anchor() ?? focus.pointId, focus.pointId) : []);
  });
  readonly rangeRows = computed(() => this.shown().filter((row) => this.range().has(row.point.id)));
  readonly ticked = computed(() => this.tickedIds());
  readonly tickedRows = computed(() => this.rows().filter((row) => this.tickedIds().has(row.point.id)));

  setUnit(unit: DemandUnit): void {
    const project = this.project.design()?.project;
    if (!project) return;
    if (!this.canEdit()) this.ownUnit.set(unit);
    else if (unit !== project.demandPer) void this.project.edit('projects', project.id, { demandPer: unit });
  }

  goTo(place: CellPlace, extend = false): void {
    this.anchor.set(extend ? (this.anchor() ?? this.focus()?.pointId ?? place.pointId) : null);
    this.wanted.set(place);
  }

  move(rows: number, columns: number, extend = false): void {
    const focus = this.focus();
    const shown = this.shown();
    if (!focus || shown.length === 0) return;
    const at = shown.findIndex((row) => row.point.id === focus.pointId);
    const row = shown[Math.min(shown.length - 1, Math.max(0, at + rows))];
    this.goTo({ pointId: row.point.id, column: stepColumn(focus.column, columns) }, extend);
  }

  /** To the first (−1) or last (1) row or column; 0 stays. */
  moveToEdge(rows: number, columns: number, extend = false): void {
    this.move(rows * this.shown().length, columns * COLUMNS.length, extend);
  }

  goToNextFinding(): void {
    const next = nextWithFinding(this.shown(), this.focus()?.pointId ?? null);
    if (next) this.goTo({ pointId: next.point.id, column: 'findings' });
  }

  /** Opens the focused cell with this text. */
  edit(text: string, typed: boolean): void {
    const focus = this.focus();
    if (focus && this.canEdit() && COLUMNS[columnAt(focus.column)]?.editable) this.editing.set({ ...focus, text, typed, reason: null });
  }

  tick(pointIds: readonly string[], on: boolean): void {
    this.tickedIds.update((before) => {
      const next = new Set(before);
      for (const id of pointIds) {
        if (on) next.add(id);
        else next.delete(id);
      }
      return next;
    });
  }

  tickRange(pointId: string): void {
    const on = !this.tickedIds().has(pointId);
    this.tick(this.range().has(pointId) ? [...this.range()] : [pointId], on);
  }

  untickAll(): void {
    this.tickedIds.set(new Set());
  }

  openPanel(tab: PanelTab = this.tab()): void {
    this.tab.set(tab);
    this.panelOpen.set(true);
    this.sheetOpen.set(true);
  }

  closePanel(): void {
    this.panelOpen.set(false);
    this.sheetOpen.set(false);
  }
}
