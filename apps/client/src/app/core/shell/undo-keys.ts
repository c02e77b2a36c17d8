import { DOCUMENT, inject, Injectable } from '@angular/core';
import type { Direction } from '../project/undo-stack';

type Key = Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'altKey' | 'shiftKey' | 'repeat'>;

/** Ctrl or Cmd with Z undoes, with Y or Shift and Z redoes. A key that is held down counts once. */
export function undoKey({ key, ctrlKey, metaKey, altKey, shiftKey, repeat }: Key): Direction | null {
  if (!(ctrlKey || metaKey) || altKey || repeat) return null;
  const letter = key.toLowerCase();
  if (letter === 'z') return shiftKey ? 'redo' : 'undo';
  return letter === 'y' && !shiftKey ? 'redo' : null;
}

/** Knows the field in which text is being typed that is not saved: there the browser's own undo is meant. */
@Injectable({ providedIn: 'root' })
export class TypedText {
  private field: EventTarget | null = null;

  constructor() {
    const document = inject(DOCUMENT);
    const listen = (name: 'input' | 'change' | 'focusout' | 'keydown', heard: (event: Event) => void) => document.addEventListener(name, heard, true);
    listen('input', (event) => (this.field = event.target));
    listen('change', () => (this.field = null));
    listen('focusout', () => (this.field = null));
    listen('keydown', (event) => this.settle(event as KeyboardEvent));
  }

  isIn(target: EventTarget | null): boolean {
    return target !== null && (target === this.field || (target instanceof Element && target.getAttribute('aria-invalid') === 'true'));
  }

  /** Enter saves a field of one line, and Escape gives up what was typed. */
  private settle({ key, target }: KeyboardEvent): void {
    if (key === 'Escape' || (key === 'Enter' && !(target instanceof HTMLTextAreaElement))) this.field = null;
  }
}
