import { TimeLeft } from './time-left';

/** Feeds a sample each half second; `doneAt` gives how far it is after some milliseconds. */
function watch(left: TimeLeft, fromMs: number, toMs: number, total: number | null, doneAt: (ms: number) => number): number | null {
  let last: number | null = null;
  for (let atMs = fromMs; atMs <= toMs; atMs += 500) last = left.next({ atMs, done: doneAt(atMs) }, total);
  return last;
}

describe('TimeLeft', () => {
  it('says nothing before it has watched long enough', () => {
    expect(watch(new TimeLeft(), 0, 1000, 10_000, (ms) => ms)).toBeNull();
  });

  it('says nothing where the size is not known, or nothing moves', () => {
    expect(watch(new TimeLeft(), 0, 4000, null, (ms) => ms)).toBeNull();
    expect(watch(new TimeLeft(), 0, 4000, 10_000, () => 0)).toBeNull();
  });

  it('is the rest at the rate of the last seconds', () => {
    expect(watch(new TimeLeft(), 0, 4000, 10_000, (ms) => ms)).toBeCloseTo(6000, 0);
  });

  it('follows another rate step by step instead of jumping', () => {
    const left = new TimeLeft();
    watch(left, 0, 4000, 40_000, (ms) => ms * 4);
    const slower = (ms: number) => 16_000 + (ms - 4000) * 2;
    const soon = watch(left, 4500, 4500, 40_000, slower);
    expect(soon).toBeLessThan(8000);
    expect(watch(left, 5000, 12_000, 40_000, slower)).toBeGreaterThan(3500);
    expect(watch(left, 12_500, 12_500, 40_000, slower)).toBeLessThan(6000);
  });

  it('begins anew where the count goes back, as at another stage', () => {
    const left = new TimeLeft();
    watch(left, 0, 4000, 10_000, (ms) => ms);
    expect(left.next({ atMs: 4500, done: 10 }, 10_000)).toBeNull();
  });
});
