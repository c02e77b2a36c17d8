import { describe, expect, it } from 'vitest';
import { all, extended, kept, NONE, picked, toggled } from './selection';

const order = ['a', 'b', 'c', 'd'];
const plain = { shift: false, ctrl: false };
const ids = (selection: { readonly ids: ReadonlySet<string> }): readonly string[] => [...selection.ids];

describe('selection', () => {
  it('replaces what was chosen on a plain click', () => {
    expect(ids(picked(all(order), order, 'c', plain))).toEqual(['c']);
  });

  it('extends from the anchor, also upwards, and keeps the anchor', () => {
    const first = picked(NONE, order, 'c', plain);
    const up = picked(first, order, 'a', { shift: true, ctrl: false });
    expect(ids(up)).toEqual(['a', 'b', 'c']);
    expect(ids(extended(up, order, 'd'))).toEqual(['c', 'd']);
  });

  it('adds and takes out one by one with Ctrl', () => {
    const two = picked(picked(NONE, order, 'a', plain), order, 'd', { shift: false, ctrl: true });
    expect(ids(two)).toEqual(['a', 'd']);
    expect(ids(toggled(two, 'a'))).toEqual(['d']);
  });

  it('begins anew where the anchor has left the list', () => {
    expect(ids(extended({ ids: new Set(['x']), anchor: 'x' }, order, 'b'))).toEqual(['b']);
  });

  it('forgets what has left the list, and is the same object where nothing has', () => {
    const both = all(['a', 'b']);
    expect(kept(both, () => true)).toBe(both);
    expect(kept(both, (id) => id === 'b')).toEqual({ ids: new Set(['b']), anchor: null });
  });
});
