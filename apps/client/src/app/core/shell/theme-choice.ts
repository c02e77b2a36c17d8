import { DOCUMENT, inject, Injectable, signal } from '@angular/core';

export type Theme = 'light' | 'dark' | 'device';

const KEY = 'lanewright.theme';

/** Light, dark or as the device says; kept on this device. */
@Injectable({ providedIn: 'root' })
export class ThemeChoice {
  private readonly document = inject(DOCUMENT);
  private readonly chosen = signal<Theme>('device');
  readonly theme = this.chosen.asReadonly();

  restore(): void {
    const kept = this.document.defaultView?.localStorage.getItem(KEY);
    this.apply(kept === 'light' || kept === 'dark' ? kept : 'device');
  }

  choose(theme: Theme): void {
    this.document.defaultView?.localStorage.setItem(KEY, theme);
    this.apply(theme);
  }

  private apply(theme: Theme): void {
    this.chosen.set(theme);
    if (theme === 'device') delete this.document.documentElement.dataset['theme'];
    else this.document.documentElement.dataset['theme'] = theme;
  }
}
