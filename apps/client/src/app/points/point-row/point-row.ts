import { ChangeDetectionStrategy, Component, computed, input, output, viewChild } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { DemandUnit, Project } from '#calc';
import { FindingMark } from '../../shared/findings/finding-mark';
import { CellEditor } from '../cell-editor/cell-editor';
import { cellChoices, cellText } from '../cell-values';
import { beyondPolicy } from '../beyond-policy';
import { findingWords } from '../finding-words';
import type { EditorAct } from '../grid-keys';
import { type ColumnId, COLUMNS } from '../grid-columns';
import { intervalParts } from '../interval-parts';
import type { PointRow } from '../point-rows';
import type { CellEdit } from '../points-view-store';

/** A point as a row of the grid. It shows; the grid decides. */
@Component({
  selector: 'lw-point-row',
  imports: [CellEditor, FindingMark, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'row', '[class.sel]': 'ticked() || focusColumn() !== null', '[class.open]': 'editing() !== null', '[attr.aria-selected]': 'ticked()' },
  styleUrl: './point-row.css',
  templateUrl: './point-row.html',
})
export class PointRowLine {
  readonly row = input.required<PointRow>();
  readonly project = input.required<Project>();
  readonly unit = input.required<DemandUnit>();
  readonly ticked = input.required<boolean>();
  readonly tickable = input.required<boolean>();
  /** The focused column, where this row has the focus. */
  readonly focusColumn = input.required<ColumnId | null>();
  /** The column in which this row is part of a range. */
  readonly rangeColumn = input.required<ColumnId | null>();
  readonly editing = input.required<CellEdit | null>();
  readonly picked = output<{ readonly column: ColumnId; readonly extend: boolean }>();
  readonly opened = output<ColumnId>();
  readonly tickToggled = output<void>();
  readonly acted = output<{ readonly act: EditorAct; readonly text: string }>();
  readonly left = output<string>();
  private readonly editor = viewChild(CellEditor);

  protected readonly parts = intervalParts;
  protected readonly short = findingWords;
  protected readonly link = computed(() => {
    const dispenser = this.row().dispenser;
    return dispenser ? ['/projects', this.project().id, 'lanes', dispenser.id] : null;
  });
  protected readonly cells = computed(() => {
    const beyond = beyondPolicy(this.row(), this.project());
    return COLUMNS.map((column) => ({ column, text: cellText(column.id, this.row(), this.unit()), bad: beyond.has(column.id) }));
  });
  protected readonly choices = computed(() => {
    const editing = this.editing();
    return editing ? cellChoices(editing.column, this.row()) : [];
  });

  /** Puts the keyboard back into the open cell. */
  focusEditor(): void {
    this.editor()?.focus();
  }
}
