import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { ImportPreview, ReadingSettings as Settings } from '#contract';
import { DELIMITER_CHOICES, ENCODING_CHOICES, readingWords } from '../import-words';

/** How the file was read, and what of it can be set: a workbook has no encoding and no delimiter. */
@Component({
  selector: 'lw-reading-settings',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './reading-settings.html',
  styleUrl: './reading-settings.css',
})
export class ReadingSettings {
  readonly preview = input.required<ImportPreview>();
  readonly locked = input(false);
  readonly read = output<Settings>();

  protected readonly encodings = ENCODING_CHOICES;
  protected readonly delimiters = DELIMITER_CHOICES;
  protected readonly words = computed(() => readingWords(this.preview()));

  protected encoding(value: string): void {
    this.read.emit({ encoding: value as Settings['encoding'] });
  }

  protected delimiter(value: string): void {
    this.read.emit({ delimiter: value as Settings['delimiter'] });
  }

  protected decimal(value: string): void {
    this.read.emit({ decimal: value as Settings['decimal'] });
  }

  protected headerRow(value: string): void {
    const row = Number(value);
    if (Number.isInteger(row) && row > 0) this.read.emit({ headerRow: row });
  }
}
