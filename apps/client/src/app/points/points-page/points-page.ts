import { NgTemplateOutlet } from '@angular/common';
import { BreakpointObserver } from '@angular/cdk/layout';
import { ChangeDetectionStrategy, Component, computed, type ElementRef, inject, viewChild, effect, input, untracked } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { Router, RouterLink } from '@angular/router';
import { map } from 'rxjs';
import { ProjectStore } from '../../core/project/project-store';
import { Icon } from '../../shared/icon/icon';
import { EmptyState } from '../../shared/states/empty-state';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { Notice } from '../../shared/states/notice';
import { PageHead } from '../../shared/states/page-head';
import { BulkEdit, type BulkEditData } from '../bulk-edit/bulk-edit';
import { DeletePoints, type DeletePointsData } from '../delete-points/delete-points';
import type { CellEdits } from '../grid-changes';
import { NewPointDialog, type NewPointData } from '../new-point/new-point';
import { type NewPoint, PointEdits } from '../point-edits';
import type { PointRow } from '../point-rows';
import { PointsGrid } from '../points-grid/points-grid';
import { PointsList } from '../points-list/points-list';
import { PointsViewStore } from '../points-view-store';
import { PointsSidePanel } from '../side-panel/side-panel';

/** Points and doses: the table of all points, and beside it the one under the keyboard. */
@Component({
  selector: 'lw-points-page',
  imports: [EmptyState, ErrorState, Icon, LoadingRows, MatButton, MatIconButton, NgTemplateOutlet, Notice, PageHead, PointsGrid, PointsList, PointsSidePanel, RouterLink],
  providers: [PointsViewStore, PointEdits],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:keydown.alt.f)': 'focusFilter($event)', '(document:keydown.alt.n)': 'nextFinding($event)' },
  styleUrl: './points-page.css',
  templateUrl: './points-page.html',
})
export class PointsPage {
  protected readonly project = inject(ProjectStore);
  protected readonly view = inject(PointsViewStore);
  private readonly edits = inject(PointEdits);
  private readonly dialog = inject(MatDialog);
  private readonly router = inject(Router);
  /** Of the address: the point to begin with. */
  readonly point = input<string>();
  private readonly grid = viewChild(PointsGrid);
  private beganWith: string | null = null;
  private readonly filter = viewChild<ElementRef<HTMLInputElement>>('filter');

  protected readonly phone = toSignal(inject(BreakpointObserver).observe('(max-width: 600px)').pipe(map((state) => state.matches)), { initialValue: false });
  protected readonly projectId = computed(() => this.project.document()?.project.id ?? '');
  protected readonly sentence = computed(() => {
    const rows = this.view.rows();
    if (rows.length === 0) return '';
    const functions = new Set(rows.map((row) => row.point.function).filter((each) => each !== null)).size;
    const unknown = rows.filter((row) => row.demandUlPer1000h === null).length;
    return `${counted(rows.length, 'point')}, ${counted(functions, 'function')}. ${unknown === 0 ? 'Demand known for all.' : `Demand not known for ${unknown}.`}`;
  });
  /** On a phone the panel is a sheet over the list, in the page only while it is open. */
  protected readonly panelRow = computed(() => ((this.phone() ? this.view.sheetOpen() : this.view.panelOpen()) ? this.view.focusedRow() : null));

  constructor() {
    // The router sets the input, and the rows may come later than it.
    effect(() => {
      const pointId = this.point();
      if (!pointId || !this.view.rows().some((row) => row.point.id === pointId)) return;
      untracked(() => {
        if (this.beganWith === pointId) return;
        this.beganWith = pointId;
        this.view.goTo({ pointId, column: 'doseUl' });
        this.view.openPanel();
      });
    });
  }

  protected focusFilter(event: Event): void {
    event.preventDefault();
    this.filter()?.nativeElement.focus();
    this.filter()?.nativeElement.select();
  }

  protected nextFinding(event: Event): void {
    if (event.defaultPrevented) return;
    event.preventDefault();
    this.view.goToNextFinding();
    this.grid()?.focus();
  }

  protected toGrid(): void {
    this.grid()?.focus();
  }

  protected openOnPhone(row: PointRow): void {
    this.view.goTo({ pointId: row.point.id, column: 'doseUl' });
    this.view.openPanel();
  }

  protected closePanel(): void {
    this.view.closePanel();
    this.grid()?.focus();
  }

  protected openLane(row: PointRow): void {
    void this.router.navigate(['/projects', this.projectId(), 'lanes', row.dispenser?.id]);
  }

  protected add(): void {
    const focused = this.view.focusedRow()?.point;
    const data: NewPointData = {
      types: this.project.design()?.dispenserTypes ?? [], tags: new Set(this.view.context().tags.keys()),
      function: focused?.function ?? null, machine: focused?.machine ?? null,
    };
    this.dialog.open<NewPointDialog, NewPointData, NewPoint>(NewPointDialog, { data, width: '520px' }).afterClosed()
      .subscribe((point) => point && void this.edits.add(point));
  }

  protected change(): void {
    const design = this.project.design();
    if (!design) return;
    const data: BulkEditData = { rows: this.view.tickedRows(), types: design.dispenserTypes, greases: design.greases };
    this.dialog.open<BulkEdit, BulkEditData, CellEdits>(BulkEdit, { data, width: '560px' }).afterClosed()
      .subscribe((edits) => edits && this.edits.several(edits, 'changed'));
  }

  protected remove(): void {
    const rows = this.view.tickedRows();
    const own = new Set(rows.map((row) => row.dispenser?.id).filter((id) => id !== undefined));
    const data: DeletePointsData = {
      tags: rows.map((row) => row.point.tag), dispensers: own.size,
      channels: this.project.design()?.assignments.filter((each) => own.has(each.dispenserId)).length ?? 0,
    };
    this.dialog.open<DeletePoints, DeletePointsData, boolean>(DeletePoints, { data, width: '460px' }).afterClosed()
      .subscribe((yes) => yes && void this.edits.remove(rows));
  }
}

const counted = (count: number, noun: string): string => `${count} ${noun}${count === 1 ? '' : 's'}`;
