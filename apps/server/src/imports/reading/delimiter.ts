import { CsvRecords } from './csv-records.ts';
import { isBlank } from './grid.ts';

export const DELIMITERS = [',', ';', '\t', '|'] as const;
export type Delimiter = (typeof DELIMITERS)[number];

const SAMPLE_RECORDS = 60;

/**
 * Finds the delimiter by reading the first records with each candidate: the right one gives many columns,
 * and the same number in nearly every record. Signs inside quotes thus do not count.
 *
 * @param text the decoded file
 * @returns the delimiter; a comma when the file has one column only
 */
export function detectDelimiter(text: string): Delimiter {
  let best: { delimiter: Delimiter; score: number } = { delimiter: ',', score: 0 };
  for (const delimiter of DELIMITERS) {
    const score = evenness(widths(text, delimiter));
    if (score > best.score) best = { delimiter, score };
  }
  return best.delimiter;
}

function widths(text: string, delimiter: Delimiter): number[] {
  const records = new CsvRecords(text, delimiter);
  const found: number[] = [];
  try {
    for (let i = 0; i < SAMPLE_RECORDS; i += 1) {
      const cells = records.next();
      if (!cells) break;
      if (!cells.every(isBlank)) found.push(cells.length);
    }
    return found;
  } catch {
    return [];
  }
}

/** Columns of the commonest width, less one, weighed by the square of its share of the records. */
function evenness(found: readonly number[]): number {
  const tally = new Map<number, number>();
  for (const width of found) tally.set(width, (tally.get(width) ?? 0) + 1);
  return Math.max(0, ...[...tally].map(([width, count]) => (width - 1) * (count / found.length) ** 2));
}
