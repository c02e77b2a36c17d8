import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { ImportPreview } from '#contract';
import { Icon } from '../../shared/icon/icon';
import { counted } from '../progress/progress-words';

type Sheet = ImportPreview['sheets'][number];

/** The sheets that are taken after a click on one: those with like headings together, any other alone, and never none. */
export function takenAfter(sheets: readonly Sheet[], clicked: Sheet): readonly string[] {
  const taken = sheets.filter((sheet) => sheet.taken);
  if (clicked.taken) return taken.length === 1 ? [clicked.name] : taken.filter((sheet) => sheet !== clicked).map((sheet) => sheet.name);
  if (!clicked.alike) return [clicked.name];
  return sheets.filter((sheet) => sheet.taken || sheet === clicked).map((sheet) => sheet.name);
}

/** The sheets of a workbook, with the rows of each; pressed: taken. */
@Component({
  selector: 'lw-sheet-list',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './sheet-list.css',
  template: `
    <h3 id="sheets">Sheets</h3>
    <ul aria-labelledby="sheets">
      @for (sheet of sheets(); track sheet.name) {
        <li>
          <button type="button" [attr.aria-pressed]="sheet.taken" [disabled]="locked()" (click)="click(sheet)">
            <span class="tick"><lw-icon [name]="sheet.taken ? 'check' : 'plus'" [size]="14" /></span>
            <span class="name">{{ sheet.name }}</span><span class="quiet">{{ rows(sheet) }}</span>
          </button>
          @if (!sheet.taken && !sheet.alike) { <span class="quiet note">other headings, taken alone</span> }
        </li>
      }
    </ul>
    @if (more()) { <button type="button" class="all" [disabled]="locked()" (click)="takeAlike()">Take all sheets with these headings</button> }`,
})
export class SheetList {
  readonly sheets = input.required<readonly Sheet[]>();
  readonly locked = input(false);
  readonly taken = output<readonly string[]>();
  /** There are several sheets with like headings that are not taken. */
  protected readonly more = computed(() => this.sheets().filter((sheet) => sheet.alike && !sheet.taken).length > 1);

  protected rows(sheet: Sheet): string {
    return `${counted(sheet.rows)} ${sheet.rows === 1 ? 'row' : 'rows'}`;
  }

  protected click(sheet: Sheet): void {
    const after = takenAfter(this.sheets(), sheet);
    if (after.length !== 1 || !sheet.taken || this.sheets().filter((each) => each.taken).length > 1) this.taken.emit(after);
  }

  protected takeAlike(): void {
    this.taken.emit(this.sheets().filter((sheet) => sheet.alike || sheet.taken).map((sheet) => sheet.name));
  }
}
