import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { BrandMark } from '../../shared/brand/brand-mark';
import { FindingCounts } from '../../shared/findings/finding-counts';
import { Icon } from '../../shared/icon/icon';
import { SaveStateLine } from '../../shared/states/save-state';
import { ProjectStore } from '../project/project-store';
import { AccountMenu } from './account-menu';
import { ProjectSwitcher } from './project-switcher';
import { UndoButtons } from './undo-buttons';

/** The header: brand, project, revision, findings, find, undo and redo, whether the work is saved, and who is signed in. */
@Component({
  selector: 'lw-app-bar',
  imports: [AccountMenu, BrandMark, FindingCounts, Icon, MatIconButton, ProjectSwitcher, RouterLink, SaveStateLine, UndoButtons],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './app-bar.css',
  templateUrl: './app-bar.html',
})
export class AppBar {
  readonly projectId = input.required<string | null>();
  readonly find = output();
  protected readonly store = inject(ProjectStore);
  protected readonly name = computed(() => this.store.document()?.project.name ?? null);
}
