import { describe, expect, it } from 'vitest';
import { offsetsOf, rangeIn } from './section-heights';

const offsets = offsetsOf([100, 200, 50, 400]);

describe('items of different heights', () => {
  it('begin where those before them end', () => {
    expect(offsets).toEqual([0, 100, 300, 350, 750]);
  });

  it('are drawn where they meet the window, with its margin', () => {
    expect(rangeIn(offsets, 110, 100, 0)).toEqual({ start: 1, end: 2 });
    expect(rangeIn(offsets, 110, 100, 20)).toEqual({ start: 0, end: 2 });
    expect(rangeIn(offsets, 320, 100, 0)).toEqual({ start: 2, end: 4 });
  });

  it('are drawn all with an endless margin, and none where there are none', () => {
    expect(rangeIn(offsets, 500, 100, Infinity)).toEqual({ start: 0, end: 4 });
    expect(rangeIn([0], 0, 100, 0)).toEqual({ start: 0, end: 0 });
  });
});
