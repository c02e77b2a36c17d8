/**
 * The `count` largest positive values, largest first; of equal ones the lower index first, so that the
 * same design always names the same set. O(n·log count) by a bounded heap.
 *
 * @returns their indices
 */
export function largestPositive(values: Float64Array, count: number): Int32Array {
  const heap: number[] = [];
  if (count <= 0) return new Int32Array(0);
  for (let i = 0; i < values.length; i++) {
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
  return Int32Array.from(heap);
}

/** Every positive value's index, ascending: what `largestPositive` gives where all are taken, unsorted. */
export function allPositive(values: Float64Array): Int32Array {
  const indices: number[] = [];
  for (let i = 0; i < values.length; i++) if (values[i] > 0) indices.push(i);
  return Int32Array.from(indices);
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
