/** One thing done to the bytes of a file. The place is a share of its length, so that it fits every file. */
export interface Mutation {
  readonly kind: 'flip' | 'overwrite' | 'cut' | 'remove' | 'insert' | 'repeat' | 'splice';
  readonly millionths: number;
  /** Bytes overwritten, removed, inserted or repeated. */
  readonly length: number;
  /** The bit that a flip turns, 0 to 7. */
  readonly bit: number;
  /** What is written over or put in, again and again up to the length; put in once by a splice. */
  readonly filler: number | string;
}

/** The bytes with one thing done to them: a bit turned, bytes written over, taken out, put in, repeated, or the rest cut off. */
export function mutated(bytes: Buffer, { kind, millionths, length, bit, filler }: Mutation): Buffer {
  const place = Math.floor((millionths * bytes.length) / 1_000_000);
  const [head, rest] = [bytes.subarray(0, place), bytes.subarray(place)];
  const parts: Readonly<Record<Mutation['kind'], () => Buffer[]>> = {
    flip: () => [head, Buffer.of((rest[0] ?? 0) ^ (1 << bit)), rest.subarray(1)],
    overwrite: () => [head, Buffer.alloc(Math.min(length, rest.length), filler), rest.subarray(length)],
    cut: () => [head],
    remove: () => [head, rest.subarray(length)],
    insert: () => [head, Buffer.alloc(length, filler), rest],
    repeat: () => [head, rest.subarray(0, length), rest],
    splice: () => [head, Buffer.from(String(filler)), rest],
  };
  return Buffer.concat(parts[kind]());
}
