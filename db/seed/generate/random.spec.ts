import { describe, expect, it } from 'vitest';
import { sizesOf } from './bearings.ts';
import { randomOf } from './random.ts';

describe('randomOf', () => {
  it('gives the same draws for the same text, others for another', () => {
    const draws = (text: string) => {
      const random = randomOf(text);
      return Array.from({ length: 5 }, () => random.next());
    };
    expect(draws('plant 1')).toEqual(draws('plant 1'));
    expect(draws('plant 1')).not.toEqual(draws('plant 2'));
  });

  it('spreads draws evenly and reaches both ends', () => {
    const random = randomOf('even');
    const counts = [0, 0, 0, 0];
    for (let i = 0; i < 10_000; i++) counts[random.whole(0, 3)]++;
    for (const count of counts) expect(Math.abs(count - 2500)).toBeLessThan(250);
  });
});

describe('sizesOf', () => {
  it('knows boundary dimensions of ISO 15', () => {
    expect(sizesOf('22', 100, 110)).toEqual([[100, 180, 46], [110, 200, 53]]);
    expect(sizesOf('02', 40, 40)).toEqual([[40, 80, 18]]);
    expect(sizesOf('03', 60, 60)).toEqual([[60, 130, 31]]);
    expect(sizesOf('23', 160, 200)).toEqual([[160, 340, 114]]);
  });
});
