/** Bore, outside diameter and width, mm. */
export type Size = readonly [bore: number, outside: number, width: number];

/** Dimension series of ISO 15: width series and diameter series in one word. */
export type Series = '02' | '03' | '22' | '23';

/**
 * Boundary dimensions by bore: outside diameter of diameter series 2 with the widths of series 02 and 22,
 * then outside diameter of diameter series 3 with the widths of 03 and 23, all mm (ISO 15).
 */
const DIMENSIONS: readonly (readonly [bore: number, D2: number, B02: number, B22: number, D3: number, B03: number, B23: number])[] = [
  [40, 80, 18, 23, 90, 23, 33],
  [45, 85, 19, 23, 100, 25, 36],
  [50, 90, 20, 23, 110, 27, 40],
  [55, 100, 21, 25, 120, 29, 43],
  [60, 110, 22, 28, 130, 31, 46],
  [65, 120, 23, 31, 140, 33, 48],
  [70, 125, 24, 31, 150, 35, 51],
  [75, 130, 25, 31, 160, 37, 55],
  [80, 140, 26, 33, 170, 39, 58],
  [85, 150, 28, 36, 180, 41, 60],
  [90, 160, 30, 40, 190, 43, 64],
  [95, 170, 32, 43, 200, 45, 67],
  [100, 180, 34, 46, 215, 47, 73],
  [110, 200, 38, 53, 240, 50, 80],
  [120, 215, 40, 58, 260, 55, 86],
  [130, 230, 40, 64, 280, 58, 93],
  [140, 250, 42, 68, 300, 62, 102],
  [150, 270, 45, 73, 320, 65, 108],
  [160, 290, 48, 80, 340, 68, 114],
];

/** Sizes of a series whose bore lies between two, both included, mm. */
export function sizesOf(series: Series, leastBore: number, mostBore: number): Size[] {
  return DIMENSIONS.filter(([bore]) => bore >= leastBore && bore <= mostBore).map((row) => sizeOf(series, row));
}

function sizeOf(series: Series, [bore, d2, b02, b22, d3, b03, b23]: (typeof DIMENSIONS)[number]): Size {
  switch (series) {
    case '02': return [bore, d2, b02];
    case '03': return [bore, d3, b03];
    case '22': return [bore, d2, b22];
    case '23': return [bore, d3, b23];
  }
}
