import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Icon } from '../../shared/icon/icon';

/** Where a tag list is dropped or picked. */
@Component({
  selector: 'lw-file-drop',
  imports: [Icon, MatButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(dragover)': 'over($event)', '(dragleave)': 'dragging.set(false)', '(drop)': 'drop($event)', '[class.dragging]': 'dragging()' },
  template: `
    <lw-icon name="upload" />
    <p><b>Drop a tag list here</b>, a CSV file with one lubrication point a row.</p>
    <p class="quiet">Commas, semicolons or tabs; any heading row; up to 10 MB and 50,000 rows. You see what it would do before anything is changed.</p>
    <button matButton="filled" type="button" [disabled]="busy()" (click)="field.click()">Choose a file</button>
    <input #field type="file" accept=".csv,.txt,.tsv,text/csv,text/plain" hidden (change)="pick(field)" aria-label="Tag list" />`,
  styleUrl: './file-drop.css',
})
export class FileDrop {
  readonly busy = input(false);
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
    if (file && !this.busy()) this.picked.emit(file);
  }

  protected pick(field: HTMLInputElement): void {
    const file = field.files?.[0];
    if (file) this.picked.emit(file);
    field.value = '';
  }
}
