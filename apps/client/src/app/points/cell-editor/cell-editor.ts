import { afterNextRender, ChangeDetectionStrategy, Component, type ElementRef, input, output, viewChild } from '@angular/core';
import { type EditorAct, editorAct } from '../grid-keys';

/** The field in a cell that is being edited. Enter commits and goes down, Tab right, Escape leaves. */
@Component({
  selector: 'lw-cell-editor',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[class.bad]': 'reason() !== null' },
  styleUrl: './cell-editor.css',
  template: `
    <input #field type="text" autocomplete="off" spellcheck="false" [value]="text()" [attr.aria-label]="label()" [attr.aria-invalid]="reason() !== null"
      [attr.aria-describedby]="reason() ? 'cell-reason' : null" [class.num]="number()" (keydown)="steer($event)" (blur)="left.emit(field.value)">
    @if (reason(); as why) {
      <p class="under reason" id="cell-reason" role="alert">{{ why }}</p>
    } @else if (choices().length > 0) {
      <ul class="under" role="listbox" aria-label="Values that fit">
        @for (choice of choices(); track choice) {
          <li role="option" [attr.aria-selected]="choice === text()" (mousedown)="take($event, choice)">{{ choice }}</li>
        }
      </ul>
    }`,
})
export class CellEditor {
  readonly text = input.required<string>();
  readonly label = input.required<string>();
  readonly choices = input<readonly string[]>([]);
  /** Why what was typed cannot be taken. */
  readonly reason = input<string | null>(null);
  readonly number = input(false);
  /** The cell is opened as it stands: all of it is marked, so that typing replaces it. */
  readonly whole = input(false);
  readonly acted = output<{ readonly act: EditorAct; readonly text: string }>();
  /** The keyboard went elsewhere. */
  readonly left = output<string>();
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');

  constructor() {
    afterNextRender(() => this.focus());
  }

  focus(): void {
    const field = this.field().nativeElement;
    field.focus();
    if (this.whole()) field.select();
  }

  protected steer(event: KeyboardEvent): void {
    const act = editorAct(event);
    event.stopPropagation();
    if (act) {
      event.preventDefault();
      this.acted.emit({ act, text: this.field().nativeElement.value });
    } else if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      this.step(event, event.key === 'ArrowDown' ? 1 : -1);
    }
  }

  protected take(event: Event, choice: string): void {
    event.preventDefault();
    this.acted.emit({ act: 'down', text: choice });
  }

  /** The next or previous of the values that fit. */
  private step(event: Event, by: number): void {
    const choices = this.choices();
    if (choices.length === 0) return;
    event.preventDefault();
    const field = this.field().nativeElement;
    const at = choices.indexOf(field.value);
    field.value = choices[at < 0 ? (by > 0 ? 0 : choices.length - 1) : Math.min(choices.length - 1, Math.max(0, at + by))]!;
    field.select();
  }
}
