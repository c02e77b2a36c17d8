import { parse } from 'csv-parse/sync';

export const DELIMITERS = [',', ';', '\t', '|'] as const;
export type Delimiter = (typeof DELIMITERS)[number];

const SAMPLE_RECORDS = 60;

/** Both line ends, also mixed: inside quotes they are text. */
export const RECORD_ENDS = ['\r\n', '\n', '\r'];

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
  try {
    const records = parse(text, {
      delimiter,
      record_delimiter: RECORD_ENDS,
      relax_quotes: true,
      relax_column_count: true,
      to: SAMPLE_RECORDS,
    });
    return records.filter((cells) => cells.some((cell) => cell.trim() !== '')).map((cells) => cells.length);
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
