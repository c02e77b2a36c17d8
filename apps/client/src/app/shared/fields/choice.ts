/** One of a list, with the words that stand for it. */
export interface Choice<V> {
  readonly value: V;
  readonly label: string;
}
