import { CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollableWindow, CdkVirtualScrollViewport } from '@angular/cdk/scrolling';
import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { DemandUnit, Project } from '#calc';
import { DEMAND_UNITS, withUnit } from '#calc';
import { Figure } from '../../shared/figure/figure';
import { FindingMark } from '../../shared/findings/finding-mark';
import { beyondPolicy } from '../beyond-policy';
import { cellText } from '../cell-values';
import type { ColumnId } from '../grid-columns';
import type { GridLine, PointRow } from '../point-rows';

/** The points on a phone: a line each with its main figures; a tap opens it. */
@Component({
  selector: 'lw-points-list',
  imports: [CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollableWindow, CdkVirtualScrollViewport, Figure, FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './points-list.css',
  template: `
    <cdk-virtual-scroll-viewport scrollWindow [itemSize]="64" [minBufferPx]="640" [maxBufferPx]="1280">
      <ng-container *cdkVirtualFor="let line of lines(); trackBy: key; templateCacheSize: 0">
        @if (line.kind === 'group') {
          <div class="line group"><p><span class="code">{{ line.group.designation }}</span> <b>{{ line.group.machine }}</b></p><p class="quiet">{{ line.group.rows.length }} {{ line.group.rows.length === 1 ? 'point' : 'points' }}, {{ line.group.note }}</p></div>
        } @else {
          @let row = line.row;
          <button type="button" class="line" (click)="picked.emit(row)">
            <span class="top">
              <span class="tag">{{ row.point.tag }}</span><span class="name">{{ row.point.description }}</span>
              @if (row.findings[0]; as first) { <lw-finding-mark [kind]="first.severity" /><span class="code quiet">{{ first.code }}</span> }
            </span>
            <span class="figures quiet">
              <span><lw-figure [text]="demand(row)" /></span>
              <span>{{ text('cartridgeUl', row) }}, {{ text('doseUl', row) }}</span>
              <span>{{ text('interval', row) }}</span>
              <span [class.bad]="beyond(row).has('life')">{{ text('life', row) }} d</span>
            </span>
          </button>
        }
      </ng-container>
    </cdk-virtual-scroll-viewport>
    @if (lines().length === 0) { <p class="none" role="status">No point matches the filter.</p> }`,
})
export class PointsList {
  readonly lines = input.required<readonly GridLine[]>();
  readonly project = input.required<Project>();
  readonly unit = input.required<DemandUnit>();
  readonly picked = output<PointRow>();

  protected readonly key = (_index: number, line: GridLine): string => line.key;
  protected readonly text = (column: ColumnId, row: PointRow): string => cellText(column, row, this.unit());
  protected readonly demand = (row: PointRow): string => withUnit(this.text('demand', row), DEMAND_UNITS[this.unit()]);
  protected readonly beyond = (row: PointRow): ReadonlySet<ColumnId> => beyondPolicy(row, this.project());
}
