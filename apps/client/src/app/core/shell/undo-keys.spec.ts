import { DOCUMENT } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { TypedText, undoKey } from './undo-keys';

const NONE = { key: '', ctrlKey: false, metaKey: false, altKey: false, shiftKey: false, repeat: false };

describe('undoKey', () => {
  it.each([
    [{ key: 'z', ctrlKey: true }, 'undo'],
    [{ key: 'z', metaKey: true }, 'undo'],
    [{ key: 'y', ctrlKey: true }, 'redo'],
    [{ key: 'Z', ctrlKey: true, shiftKey: true }, 'redo'],
    [{ key: 'Z', metaKey: true, shiftKey: true }, 'redo'],
    [{ key: 'z' }, null],
    [{ key: 'z', ctrlKey: true, altKey: true }, null],
    [{ key: 'z', ctrlKey: true, repeat: true }, null],
    [{ key: 'k', ctrlKey: true }, null],
  ])('%o: %s', (key, direction) => {
    expect(undoKey({ ...NONE, ...key })).toBe(direction);
  });
});

describe('TypedText', () => {
  let typed: TypedText;
  let field: HTMLInputElement;

  beforeEach(() => {
    typed = TestBed.inject(TypedText);
    field = TestBed.inject(DOCUMENT).createElement('input');
    TestBed.inject(DOCUMENT).body.append(field);
  });
  afterEach(() => field.remove());
  const happens = (name: string) => field.dispatchEvent(new Event(name, { bubbles: true }));
  const press = (key: string) => field.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true }));

  it('is in a field from the first letter on', () => {
    expect(typed.isIn(field)).toBe(false);
    happens('input');
    expect(typed.isIn(field)).toBe(true);
    expect(typed.isIn(field.ownerDocument.body)).toBe(false);
  });

  it.each(['change', 'focusout'])('is saved at %s', (name) => {
    happens('input');
    happens(name);
    expect(typed.isIn(field)).toBe(false);
  });

  it.each([['Enter', false], ['Escape', false], ['a', true]])('after %s: %s', (key, still) => {
    happens('input');
    press(key);
    expect(typed.isIn(field)).toBe(still);
  });

  it('stays in a field whose text was not taken', () => {
    field.setAttribute('aria-invalid', 'true');
    happens('input');
    press('Enter');
    expect(typed.isIn(field)).toBe(true);
  });
});
