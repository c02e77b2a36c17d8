import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { ProjectStore } from '../project/project-store';
import { findTargets } from './find-targets';
import type { NavGroup } from './nav';
import { QuickFind } from './quick-find';

/** Opens the find dialog over what the open project holds. */
@Injectable({ providedIn: 'root' })
export class QuickFindOpener {
  private readonly dialog = inject(MatDialog);
  private readonly store = inject(ProjectStore);
  private opened = false;

  open(nav: readonly NavGroup[]): void {
    if (this.opened) return;
    this.opened = true;
    const data = findTargets(nav, this.store.design(), this.store.assessment());
    this.dialog.open(QuickFind, { data, width: '560px', position: { top: '72px' }, ariaLabel: 'Find', enterAnimationDuration: 0 }).afterClosed().subscribe(() => (this.opened = false));
  }
}
