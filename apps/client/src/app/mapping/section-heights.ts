import type { GroupSection } from './mapping-rows';

const HEAD_PX = 39;
const FINDING_PX = 66;

/** How high a group will be, px, before the browser has drawn it. */
export const estimatedPx = (section: GroupSection, rowPx: number): number =>
  HEAD_PX + section.findings.length * FINDING_PX + section.channels.length * rowPx;

/** Nothing to lay out anew. */
export const sameHeights = (a: readonly number[], b: readonly number[]): boolean => a.length === b.length && a.every((px, i) => px === b[i]);

/** Where each of these begins, px, and where the last ends. */
export function offsetsOf(heights: readonly number[]): readonly number[] {
  const offsets = [0];
  for (const height of heights) offsets.push(offsets[offsets.length - 1] + height);
  return offsets;
}

/** Which of them meet a window of so many px from `top`, with a margin at both ends. `end` is the first that does not. */
export function rangeIn(offsets: readonly number[], top: number, height: number, margin: number): { readonly start: number; readonly end: number } {
  const count = offsets.length - 1;
  const start = Math.max(0, firstEndingAfter(offsets, top - margin));
  let end = start;
  while (end < count && offsets[end] < top + height + margin) end++;
  return { start: Math.min(start, count), end };
}

/** The first item that ends after a place, by halving. */
function firstEndingAfter(offsets: readonly number[], place: number): number {
  let low = 0;
  let high = offsets.length - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (offsets[middle + 1] > place) high = middle;
    else low = middle + 1;
  }
  return low;
}
