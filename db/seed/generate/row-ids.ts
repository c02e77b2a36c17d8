import { randomOf } from './random.ts';

/** 2026-01-01T00:00:00Z: the time that the first id names; each further one is a millisecond later. */
const FIRST_MS = Date.UTC(2026, 0, 1);

/**
 * Ids in the form of UUIDv7 (RFC 9562), ascending, that follow from a text: the same in every run.
 *
 * @param owner tells apart whatever may meet in one database, for instance organisation, name and seed
 */
export function rowIds(owner: string): () => string {
  const random = randomOf(owner);
  let count = 0;
  return () => {
    const time = hex(FIRST_MS + count++, 12);
    const variant = (8 + random.whole(0, 3)).toString(16);
    const [a, b, c] = [hex(random.whole(0, 0xfff), 3), hex(random.whole(0, 0xfff), 3), hex(random.whole(0, 2 ** 48 - 1), 12)];
    return `${time.slice(0, 8)}-${time.slice(8)}-7${a}-${variant}${b}-${c}`;
  };
}

const hex = (value: number, digits: number): string => value.toString(16).padStart(digits, '0');
