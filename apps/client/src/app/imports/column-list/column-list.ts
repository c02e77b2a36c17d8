import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { ImportColumn, ImportPreview } from '#contract';
import { headingParts } from '../import-words';

/** Columns of the file, each with the field that it becomes and why. */
@Component({
  selector: 'lw-column-list',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './column-list.html',
  styleUrl: './column-list.css',
})
export class ColumnList {
  readonly preview = input.required<ImportPreview>();
  readonly locked = input(false);
  readonly mapped = output<{ readonly column: string; readonly field: string | null }>();

  protected readonly parts = headingParts;

  /** Under the choice: why it was suggested, "left out last time" included. */
  protected why({ field, reason }: ImportColumn): string {
    return reason || (field === null ? 'not used' : 'chosen here');
  }
}
