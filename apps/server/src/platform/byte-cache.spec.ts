import { describe, expect, it } from 'vitest';
import { ByteCache } from './byte-cache.ts';

describe('ByteCache', () => {
  it('gives up the value longest unused when room ends', () => {
    const cache = new ByteCache(10);
    cache.put('a', 'A', 4);
    cache.put('b', 'B', 4);
    expect(cache.get('a')).toBe('A');
    cache.put('c', 'C', 4);
    expect([cache.get('a'), cache.get('b'), cache.get('c')]).toEqual(['A', undefined, 'C']);
  });

  it('keeps the latest value even where it alone is too large, and counts a replaced one once', () => {
    const cache = new ByteCache(10);
    cache.put('a', 'A', 4);
    cache.put('a', 'A2', 4);
    cache.put('b', 'B', 5);
    expect([cache.get('a'), cache.get('b')]).toEqual(['A2', 'B']);
    cache.put('c', 'C', 50);
    expect([cache.get('a'), cache.get('b'), cache.get('c')]).toEqual([undefined, undefined, 'C']);
    cache.drop('c');
    expect(cache.get('c')).toBeUndefined();
  });
});
