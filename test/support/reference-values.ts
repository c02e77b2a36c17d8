import { readFileSync } from 'node:fs';

interface ReferenceValue {
  readonly id: string;
  readonly quantity: string;
  readonly value: number | string;
  readonly unit: string;
  readonly source: string;
  readonly provenance: 'seen' | 'computed' | 'memory';
}

const file = new URL('../fixtures/reference-values.json', import.meta.url);
const values = new Map(
  (JSON.parse(readFileSync(file, 'utf8')) as { values: ReferenceValue[] }).values.map((value) => [value.id, value]),
);

/** A published value by its id, with a title for the test that names source and provenance. */
export function reference(id: string): ReferenceValue & { readonly number: number; readonly title: string } {
  const value = values.get(id);
  if (!value) throw new Error(`No reference value ${id}`);
  return { ...value, number: Number(value.value), title: `${id} ${value.quantity} (${value.source}, ${value.provenance})` };
}

/** Ids `1-001` to `1-018` and the like. */
export function idRange(chapter: number, first: number, last: number): string[] {
  return Array.from({ length: last - first + 1 }, (_, i) => `${chapter}-${String(first + i).padStart(3, '0')}`);
}
