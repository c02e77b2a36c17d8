/** Up to so many, sorting each into its place is quicker than a heap. */
const FEW = 24;

/**
 * The `count` largest positive values, largest first; of equal ones the lower index first, so that the
 * same design always names the same set.
 *
 * @returns their indices
 */
export function largestPositive(values: Float64Array, count: number): Int32Array {
  const into = new Int32Array(Math.max(0, Math.min(count, values.length)));
  return into.subarray(0, selectLargest(values, values.length, count, into));
}

/**
 * The same of the first `size` values, written into a buffer: O(n·count) for a few, else O(n·log count) by a
 * bounded heap.
 *
 * @returns how many there are
 */
export function selectLargest(values: Float64Array, size: number, count: number, into: Int32Array): number {
  if (count <= 0) return 0;
  return count <= FEW ? selectFew(values, size, count, into) : selectMany(values, size, count, into);
}

/** Every positive value's index, ascending: what `largestPositive` gives where all are taken, unsorted. */
export function allPositive(values: Float64Array): Int32Array {
  const indices: number[] = [];
  for (let i = 0; i < values.length; i++) if (values[i] > 0) indices.push(i);
  return Int32Array.from(indices);
}

function selectFew(values: Float64Array, size: number, count: number, into: Int32Array): number {
  let found = 0;
  for (let i = 0; i < size; i++) {
    const value = values[i];
    if (!(value > 0) || (found === count && !(value > values[into[found - 1]]))) continue;
    let at = found === count ? found - 1 : found++;
    for (; at > 0 && value > values[into[at - 1]]; at--) into[at] = into[at - 1];
    into[at] = i;
  }
  return found;
}

function selectMany(values: Float64Array, size: number, count: number, into: Int32Array): number {
  const heap: number[] = [];
  for (let i = 0; i < size; i++) {
    if (!(values[i] > 0)) continue;
    if (heap.length < count) {
      heap.push(i);
      siftUp(heap, values);
    } else if (values[i] > values[heap[0]]) {
      heap[0] = i;
      siftDown(heap, values);
    }
  }
  heap.sort((a, b) => values[b] - values[a] || a - b);
  for (let i = 0; i < heap.length; i++) into[i] = heap[i];
  return heap.length;
}

/** Whether a leaves the heap before b: smaller, or equal and later. */
function worse(values: Float64Array, a: number, b: number): boolean {
  return values[a] < values[b] || (values[a] === values[b] && a > b);
}

function siftUp(heap: number[], values: Float64Array): void {
  let at = heap.length - 1;
  while (at > 0) {
    const up = (at - 1) >> 1;
    if (!worse(values, heap[at], heap[up])) return;
    [heap[at], heap[up]] = [heap[up], heap[at]];
    at = up;
  }
}

function siftDown(heap: number[], values: Float64Array): void {
  let at = 0;
  for (;;) {
    const left = 2 * at + 1;
    const right = left + 1;
    let least = at;
    if (left < heap.length && worse(values, heap[left], heap[least])) least = left;
    if (right < heap.length && worse(values, heap[right], heap[least])) least = right;
    if (least === at) return;
    [heap[at], heap[least]] = [heap[least], heap[at]];
    at = least;
  }
}
