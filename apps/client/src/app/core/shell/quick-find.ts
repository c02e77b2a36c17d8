import { ChangeDetectionStrategy, Component, computed, inject, linkedSignal, signal } from '@angular/core';
import { MAT_DIALOG_DATA, MatDialogRef } from '@angular/material/dialog';
import { Router } from '@angular/router';
import { Icon } from '../../shared/icon/icon';
import { type FindTarget, matching } from './find-targets';

const KINDS: Readonly<Record<FindTarget['kind'], string>> = { page: 'page', point: 'point', address: 'address', hardware: 'hardware' };

/** Type a tag, an address or a page, and go there. */
@Component({
  selector: 'lw-quick-find',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './quick-find.css',
  template: `
    <div class="line">
      <lw-icon name="search" />
      <input #field cdkFocusInitial type="text" role="combobox" aria-label="Find a tag, an address or a page" aria-controls="found" aria-expanded="true" autocomplete="off" spellcheck="false"
        placeholder="Tag, address, page" [attr.aria-activedescendant]="active()" [value]="query()" (input)="query.set(field.value)" (keydown)="steer($event)">
    </div>
    <ul id="found" role="listbox" aria-label="Found">
      @for (target of found(); track $index) {
        <li role="option" tabindex="-1" [id]="'found-' + $index" [class.at]="$index === at()" [attr.aria-selected]="$index === at()" (pointermove)="at.set($index)" (click)="go(target)" (keydown.enter)="go(target)">
          <span [class.tag]="target.kind !== 'page'">{{ target.label }}</span><span class="detail quiet">{{ target.detail }}</span><span class="quiet tiny">{{ kinds[target.kind] }}</span>
        </li>
      } @empty { <li class="none quiet" role="option" aria-selected="false">Nothing has “{{ query() }}” in its name.</li> }
    </ul>
    <footer><span><kbd>Enter</kbd> go there</span><span><kbd>Esc</kbd> close</span></footer>`,
})
export class QuickFind {
  private readonly targets = inject<readonly FindTarget[]>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<QuickFind>>(MatDialogRef);
  private readonly router = inject(Router);
  protected readonly kinds = KINDS;
  protected readonly query = signal('');
  protected readonly found = computed(() => matching(this.targets, this.query()));
  protected readonly at = linkedSignal(() => (this.found(), 0));
  protected readonly active = computed(() => (this.found().length > 0 ? `found-${this.at()}` : null));

  protected steer(event: KeyboardEvent): void {
    const count = this.found().length;
    if (event.key === 'ArrowDown' && count > 0) this.at.update((i) => (i + 1) % count);
    else if (event.key === 'ArrowUp' && count > 0) this.at.update((i) => (i + count - 1) % count);
    else if (event.key === 'Enter' && count > 0) this.go(this.found()[this.at()]);
    else return;
    event.preventDefault();
  }

  protected go(target: FindTarget): void {
    this.dialog.close();
    void this.router.navigate([...target.link], target.point === undefined ? {} : { queryParams: { point: target.point } });
  }
}
