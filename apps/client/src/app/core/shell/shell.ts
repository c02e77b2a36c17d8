import { ChangeDetectionStrategy, Component, computed, effect, type ElementRef, inject, viewChild } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { NavigationEnd, Router, RouterOutlet } from '@angular/router';
import { fieldName } from '#contract/field-words';
import { filter, map } from 'rxjs';
import { ConflictDialog, type ConflictAnswer, type ConflictView } from '../../shared/conflict/conflict-dialog';
import { PrintHeading } from '../../shared/drawing/print-heading';
import { Notice } from '../../shared/states/notice';
import { problemText } from '../api/problem';
import { ProjectStore } from '../project/project-store';
import { UndoCommands } from '../project/undo-commands';
import type { Direction } from '../project/undo-stack';
import { AppBar } from './app-bar';
import { fieldValue } from './field-words';
import { navOf } from './nav';
import { NavList } from './nav-list';
import { QuickFindOpener } from './quick-find-opener';
import { TabBar } from './tab-bar';
import { TypedText, undoKey } from './undo-keys';

/** The frame around every page: header, navigation, what was refused, and the page. */
@Component({
  selector: 'lw-shell',
  imports: [AppBar, MatButton, NavList, Notice, RouterOutlet, TabBar],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:keydown)': 'listen($event)' },
  styleUrl: './shell.css',
  templateUrl: './shell.html',
})
export class Shell {
  private readonly page = viewChild.required<ElementRef<HTMLElement>>('page');
  protected readonly store = inject(ProjectStore);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly find = inject(QuickFindOpener);
  private readonly typed = inject(TypedText);
  protected readonly undo = inject(UndoCommands);
  private readonly url = toSignal(
    this.router.events.pipe(filter((e) => e instanceof NavigationEnd), map((e) => e.urlAfterRedirects)),
    { initialValue: this.router.url },
  );
  /** The project that the address names, else the one that is still open. */
  protected readonly projectId = computed(() => /^\/projects\/([^/?#]+)/.exec(this.url())?.[1] ?? this.store.document()?.project.id ?? null);
  protected readonly nav = computed(() => navOf(this.projectId(), this.store.assessment(), this.store.design()));
  protected readonly refusal = computed(() => {
    const state = this.store.saveState();
    return state.kind === 'refused' ? problemText(state.problem) : null;
  });

  constructor() {
    const heading = inject(PrintHeading);
    effect(() => heading.show(this.store.document()?.project.name ?? '', 'Draft, not for construction; no revision issued yet'));
    effect(() => this.askWhoseValue());
  }

  protected listen(event: KeyboardEvent): void {
    const direction = undoKey(event);
    if (direction) return this.takeBack(direction, event);
    if (!(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== 'k' || event.shiftKey || event.altKey) return;
    event.preventDefault();
    this.find.open(this.nav());
  }

  /** Not behind an open dialog, and not where the browser's own undo is meant. */
  private takeBack(direction: Direction, event: KeyboardEvent): void {
    if (!this.store.document() || !this.store.canEdit() || this.dialog.openDialogs.length > 0 || this.typed.isIn(event.target)) return;
    event.preventDefault();
    void this.undo.run(direction);
  }

  /** The address stays as it is: the page is under a base address, where a bare hash would lead away. */
  protected skip(event: Event): void {
    event.preventDefault();
    this.page().nativeElement.focus();
  }

  protected openFind(): void {
    this.find.open(this.nav());
  }

  private askWhoseValue(): void {
    const conflict = this.store.conflict();
    if (!conflict) return;
    const view: ConflictView = {
      label: conflict.label,
      fields: conflict.fields.map((f) => ({ name: fieldName(f.field), mine: fieldValue(f.field, f.mine), theirs: fieldValue(f.field, f.theirs) })),
    };
    this.dialog.open<ConflictDialog, ConflictView, ConflictAnswer>(ConflictDialog, { data: view, disableClose: true, width: '520px' })
      .afterClosed().subscribe((answer) => (answer === 'mine' ? conflict.keepMine() : conflict.takeTheirs()));
  }
}
