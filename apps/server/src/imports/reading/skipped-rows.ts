import { isBlank, trimmed, type GridRow } from './grid.ts';
import type { Headings } from './heading-block.ts';
import { normalHeading } from './heading-text.ts';
import type { SkipReason } from './plan.ts';

const TOTALS =
  /^((grand |sub ?)?totals?|sum|summe|zwischensumme|gesamt|gesamtsumme|totaal|subtotaal|som|total general|totaux|somme|suma|subtotal)$/;
const LONGEST_TOTALS = 30;

/** Tells rows below the headings that are no data. */
export class RowSkipper {
  /** The heading rows, normalised. */
  private readonly headings: readonly (readonly string[])[];

  /**
   * @param tagIndex index of the column that holds the tag
   * @param isKnown whether the project has a point of this tag, which makes every row of it data
   */
  constructor(
    { rows }: Headings,
    private readonly tagIndex: number,
    private readonly isKnown: (tag: string) => boolean,
  ) {
    this.headings = rows.map((cells) => cells.map(normalHeading));
  }

  /**
   * Why a row is no data: it is blank, repeats the headings (as printed lists do on each page), or adds up
   * the rows above.
   *
   * @returns null when the row is data
   */
  reason({ cells }: GridRow): SkipReason | null {
    let first = 0;
    while (first < cells.length && isBlank(cells[first])) first += 1;
    if (first === cells.length) return 'blank';
    const why = this.reasonFrom(cells, first);
    return why !== null && this.isKnown(trimmed(cells[this.tagIndex] ?? '')) ? null : why;
  }

  private reasonFrom(cells: GridRow['cells'], first: number): SkipReason | null {
    for (const each of this.headings) if (repeats(cells, first, each)) return 'repeated-heading';
    return this.isTotals(cells, first) ? 'totals' : null;
  }

  /** The first thing it says is "total", and it has no tag but that. */
  private isTotals(cells: GridRow['cells'], first: number): boolean {
    const tagged = first !== this.tagIndex && !isBlank(cells[this.tagIndex] ?? '');
    if (tagged || cells[first].length > LONGEST_TOTALS) return false;
    return !/\d/.test(cells[first]) && TOTALS.test(normalHeading(cells[first]));
  }
}

function repeats(cells: readonly string[], first: number, headings: readonly string[]): boolean {
  if (differs(cells[first], headings[first] ?? '')) return false;
  let filled = 0;
  for (let i = first; i < cells.length; i += 1) {
    if (isBlank(cells[i])) continue;
    if (differs(cells[i], headings[i] ?? '') || normalHeading(cells[i]) !== headings[i]) return false;
    filled += 1;
  }
  return filled > 1;
}

/** Whether a first glance, at letters and digits only, tells the cell from the heading. */
function differs(cell: string, heading: string): boolean {
  const code = cell.charCodeAt(0) | 32;
  return isLetterOrDigit(code) && code !== (heading.charCodeAt(0) | 32);
}

function isLetterOrDigit(code: number): boolean {
  return (code >= 97 && code <= 122) || (code >= 48 && code <= 57);
}
