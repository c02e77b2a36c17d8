import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { Router } from '@angular/router';
import type { Role } from '#contract';
import { Icon } from '../../shared/icon/icon';
import type { IconName } from '../../shared/icon/icon-paths';
import { ProjectStore } from '../project/project-store';
import { SessionStore } from '../session/session-store';
import { type Theme, ThemeChoice } from './theme-choice';

const ROLE_WORDS: Readonly<Record<Role, string>> = {
  engineer: 'Automation engineer', electrician: 'Electrician', commissioning: 'Commissioning engineer',
  technician: 'Lubrication technician', administrator: 'Administrator', viewer: 'Viewer',
};

const THEMES: readonly { readonly theme: Theme; readonly label: string; readonly icon: IconName }[] = [
  { theme: 'light', label: 'Light', icon: 'sun' }, { theme: 'dark', label: 'Dark', icon: 'moon' }, { theme: 'device', label: 'As the device', icon: 'device' },
];

/** Who is signed in, how the screen looks, and the way out. */
@Component({
  selector: 'lw-account-menu',
  imports: [Icon, MatMenu, MatMenuItem, MatMenuTrigger],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    .who { display: block; min-height: 36px; padding: 0 6px; font: var(--mat-sys-body-small); line-height: 15px; text-align: right; white-space: nowrap; background: none; border: 0; border-radius: var(--mat-sys-corner-small); cursor: pointer; }
    .who:hover { background: var(--lw-hover); }
    .who .role { display: block; font-size: 12px; color: var(--mat-sys-on-surface-variant); }
    .small-who { display: none; }
    .head { padding: 6px 16px 4px; font: var(--mat-sys-label-small); color: var(--mat-sys-on-surface-variant); }
    .item { display: flex; align-items: center; gap: 10px; } .item .on { margin-left: auto; }
    hr { height: 1px; margin: 4px 0; background: var(--lw-rule); border: 0; }
    @media (max-width: 600px) { .who { width: 48px; height: 48px; padding: 0; display: grid; place-items: center; } .wide-who { display: none; } .small-who { display: block; } }`,
  template: `
    <button class="who" type="button" [matMenuTriggerFor]="menu" [attr.aria-label]="'Account of ' + name()">
      <span class="wide-who">{{ name() }}<span class="role">{{ role() }}</span></span>
      <lw-icon class="small-who" name="person" [size]="22" />
    </button>
    <mat-menu #menu="matMenu" xPosition="before">
      <p class="head">{{ organisation() }}</p>
      @for (option of themes; track option.theme) {
        <button mat-menu-item role="menuitemradio" type="button" [attr.aria-checked]="theme() === option.theme" (click)="choose(option.theme)">
          <span class="item"><lw-icon [name]="option.icon" [size]="16" />{{ option.label }}@if (theme() === option.theme) {<lw-icon class="on" name="check" [size]="16" />}</span>
        </button>
      }
      <hr>
      <button mat-menu-item type="button" (click)="signOut()"><span class="item"><lw-icon name="leave" [size]="16" />Sign out</span></button>
    </mat-menu>`,
})
export class AccountMenu {
  private readonly session = inject(SessionStore);
  private readonly project = inject(ProjectStore);
  private readonly router = inject(Router);
  private readonly choice = inject(ThemeChoice);
  protected readonly themes = THEMES;
  protected readonly theme = this.choice.theme;
  protected readonly name = computed(() => this.session.session()?.person.name ?? '');
  protected readonly role = computed(() => this.session.roles().map((r) => ROLE_WORDS[r]).join(', '));
  protected readonly organisation = computed(() => this.session.session()?.organisation.name ?? '');

  protected choose(theme: Theme): void {
    this.choice.choose(theme);
  }

  protected async signOut(): Promise<void> {
    await this.session.signOut();
    this.project.close();
    await this.router.navigate(['/sign-in']);
  }
}
