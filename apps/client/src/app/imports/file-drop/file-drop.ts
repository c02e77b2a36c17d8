import { ChangeDetectionStrategy, Component, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Icon } from '../../shared/icon/icon';

/** Where a tag list is dropped or picked. */
@Component({
  selector: 'lw-file-drop',
  imports: [Icon, MatButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(dragover)': 'over($event)', '(dragleave)': 'dragging.set(false)', '(drop)': 'drop($event)', '[class.dragging]': 'dragging()' },
  template: `
    <lw-icon name="upload" [size]="28" />
    <p><b>Drop a tag list here</b>, a workbook or a CSV file.</p>
    <button matButton="filled" type="button" (click)="field.click()">Choose a file</button>
    <ul class="quiet">
      <li><b>.xlsx</b> with one sheet or several, or <b>.csv</b>, <b>.tsv</b>, <b>.txt</b> with commas, semicolons or tabs</li>
      <li>One lubrication point a row, or one signal a row; the headings may stand in any row</li>
      <li>Up to 25 MB and 100,000 rows</li>
    </ul>
    <p class="quiet">You see row by row what it would do. Nothing is changed before you press Import.</p>
    <input #field type="file" accept=".xlsx,.csv,.txt,.tsv" hidden (change)="pick(field)" aria-label="Tag list" />`,
  styleUrl: './file-drop.css',
})
export class FileDrop {
  readonly picked = output<File>();
  protected readonly dragging = signal(false);

  protected over(event: DragEvent): void {
    event.preventDefault();
    this.dragging.set(true);
  }

  protected drop(event: DragEvent): void {
    event.preventDefault();
    this.dragging.set(false);
    const file = event.dataTransfer?.files[0];
    if (file) this.picked.emit(file);
  }

  protected pick(field: HTMLInputElement): void {
    const file = field.files?.[0];
    if (file) this.picked.emit(file);
    field.value = '';
  }
}
