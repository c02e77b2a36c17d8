import { DOCUMENT, inject, Injectable } from '@angular/core';
import { dayAndTime } from '../words/day-and-time';

/** What heads every printed sheet. Margins of a page can show custom properties of the root only, so there it stands. */
@Injectable({ providedIn: 'root' })
export class PrintHeading {
  private readonly document = inject(DOCUMENT);

  constructor() {
    this.document.defaultView?.addEventListener('beforeprint', () => this.set('--lw-printed', `Printed ${dayAndTime(new Date().toISOString())}`));
  }

  /** Names the project, and how far the design is, `Draft, not for construction`. */
  show(project: string, state: string): void {
    this.set('--lw-print-project', project);
    this.set('--lw-print-state', state);
  }

  /** As a string of CSS: quotes and backslashes would end it, a line break would spoil it. */
  private set(property: string, words: string): void {
    this.document.documentElement.style.setProperty(property, `"${words.replace(/["\\]/g, '\\$&').replace(/\s+/g, ' ')}"`);
  }
}
