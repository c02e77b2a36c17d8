import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { ImportPreview } from '#contract';

/** Columns of the file, each with the field it becomes and why; texts that the project does not know. */
@Component({
  selector: 'lw-column-list',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './column-list.html',
  styleUrl: './column-list.css',
})
export class ColumnList {
  readonly preview = input.required<ImportPreview>();
  readonly busy = input(false);
  readonly mapped = output<{ readonly column: string; readonly field: string | null }>();
  readonly valueMapped = output<{ readonly field: string; readonly text: string; readonly value: string | null }>();
  readonly read = output<{ encoding?: ImportPreview['settings']['encoding']; delimiter?: ImportPreview['settings']['delimiter']; decimal?: '.' | ','; headerRow?: number }>();

  protected readonly encodings = [
    { value: 'utf-8', label: 'UTF-8' }, { value: 'windows-1252', label: 'Windows-1252' },
    { value: 'utf-16le', label: 'UTF-16, little end first' }, { value: 'utf-16be', label: 'UTF-16, big end first' },
  ] as const;
  protected readonly delimiters = [
    { value: ',', label: 'comma' }, { value: ';', label: 'semicolon' }, { value: '\t', label: 'tab' }, { value: '|', label: 'bar' },
  ] as const;

  protected encoding(value: string): void {
    this.read.emit({ encoding: value as ImportPreview['settings']['encoding'] });
  }

  protected delimiter(value: string): void {
    this.read.emit({ delimiter: value as ImportPreview['settings']['delimiter'] });
  }

  protected decimal(value: string): void {
    this.read.emit({ decimal: value as '.' | ',' });
  }

  protected headerRow(value: string): void {
    const row = Number(value);
    if (Number.isInteger(row) && row > 0) this.read.emit({ headerRow: row });
  }

  protected labelOf(field: string): string {
    return this.preview().fields.find((f) => f.key === field)?.label ?? field;
  }
}
