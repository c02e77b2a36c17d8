import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatTooltip } from '@angular/material/tooltip';
import { Icon } from '../../shared/icon/icon';
import { UndoCommands } from '../project/undo-commands';

const KEYS = { undo: { shown: 'Ctrl Z', spoken: 'Control+Z' }, redo: { shown: 'Ctrl Y', spoken: 'Control+Y' } } as const;

/** Undo and redo in the header: each says what it would take back. */
@Component({
  selector: 'lw-undo-buttons',
  imports: [Icon, MatIconButton, MatTooltip],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    :host { display: flex; }
    button { width: 36px; height: 36px; padding: 0; display: grid; place-items: center; }`,
  template: `
    @for (act of undo.acts(); track act.direction) {
      <button matIconButton type="button" disabledInteractive [disabled]="!act.set" [attr.aria-label]="act.label" [attr.aria-keyshortcuts]="keys[act.direction].spoken"
        [matTooltip]="act.set ? act.label + ' (' + keys[act.direction].shown + ')' : 'Nothing of yours to ' + act.direction + ' since this page was opened'" (click)="undo.run(act.direction)">
        <lw-icon [name]="act.direction" [size]="18" />
      </button>
    }`,
})
export class UndoButtons {
  protected readonly undo = inject(UndoCommands);
  protected readonly keys = KEYS;
}
