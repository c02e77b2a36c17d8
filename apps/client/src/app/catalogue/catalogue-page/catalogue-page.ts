import { ChangeDetectionStrategy, Component, effect, ElementRef, inject, input, linkedSignal, signal, untracked, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import { Segmented } from '../../shared/controls/segmented';
import { Icon } from '../../shared/icon/icon';
import { EmptyState } from '../../shared/states/empty-state';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { Notice } from '../../shared/states/notice';
import { PageHead } from '../../shared/states/page-head';
import { CatalogueStore, type Open } from '../catalogue-store';
import type { Kind } from '../fields/field';
import { isKind } from '../fields/kind-views';
import { TypeForm } from '../type-form/type-form';
import { TypePanel } from '../type-panel/type-panel';
import { TypeTable } from '../type-table/type-table';

/** What the organisation builds with: every type with the data that the checks read. */
@Component({
  selector: 'lw-catalogue-page',
  imports: [EmptyState, ErrorState, Icon, LoadingRows, MatButton, Notice, PageHead, Segmented, TypeForm, TypePanel, TypeTable],
  providers: [CatalogueStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'page', '(keydown.escape)': 'back()' },
  templateUrl: './catalogue-page.html',
  styleUrl: './catalogue-page.css',
})
export class CataloguePage {
  /** From the address; anything unknown: dispensers. */
  readonly kind = input<string>();
  protected readonly store = inject(CatalogueStore);
  private readonly router = inject(Router);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly form = viewChild(TypeForm);
  /** Kind pressed in the row of kinds; it goes back when what was typed is kept. */
  protected readonly chosen = linkedSignal(() => this.store.view().kind);
  /** Where to go once what was typed is given up; null: nothing is asked. */
  protected readonly asked = signal<{ readonly go: () => void } | null>(null);

  constructor() {
    effect(() => {
      const kind = this.kind();
      untracked(() => this.store.show(isKind(kind) ? kind : 'dispenserTypes'));
    });
    // The keyboard follows what opens beside the table.
    effect(() => {
      const open = this.store.open();
      this.asked.set(null);
      if (open) setTimeout(() => this.host.nativeElement.querySelector<HTMLElement>('.beside h2')?.focus());
    });
    void this.store.load();
  }

  protected showKind(kind: Kind): void {
    this.chosen.set(kind);
    this.unlessTyped(() => void this.router.navigate([], { queryParams: { kind }, queryParamsHandling: 'merge' }));
  }

  protected read(id: string): void {
    this.leave({ mode: 'read', id });
  }

  protected askVersion(): void {
    const id = this.store.entry()?.id;
    if (id) this.store.put({ mode: 'version', id });
  }

  /** Leaves a new version for the type it came from, and anything else for the table. */
  protected back(): void {
    const open = this.store.open();
    this.leave(open?.mode === 'version' ? { mode: 'read', id: open.id } : null);
  }

  protected leave(open: Open | null): void {
    const former = this.store.entry()?.id;
    this.unlessTyped(() => {
      this.store.put(open);
      if (!open && former) this.host.nativeElement.querySelector<HTMLElement>(`[data-entry="${former}"]`)?.focus();
    });
  }

  protected keep(): void {
    this.asked.set(null);
    this.chosen.set(this.store.view().kind);
  }

  protected discard(): void {
    const asked = this.asked();
    this.asked.set(null);
    asked?.go();
  }

  /** Goes there at once, or asks first where something was typed that is not saved. */
  private unlessTyped(go: () => void): void {
    if (this.form()?.isDirty) this.asked.set({ go });
    else go();
  }
}
