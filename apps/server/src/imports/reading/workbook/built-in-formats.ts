const DATE = 'yyyy-mm-dd';
const TIME = 'hh:mm';
const TIME_S = 'hh:mm:ss';

/**
 * Codes of the number formats that files name without writing them out (ECMA-376 part 1, 18.8.30), reduced to
 * what matters here: whether a number is a date, a time, a percentage or plain. From 27 on they belong to
 * East Asian editions, which differ in which of them are times; 32 and 33 are times in all.
 */
export const BUILT_IN_FORMATS: ReadonlyMap<number, string> = new Map([
  [9, '0%'],
  [10, '0.00%'],
  [14, DATE],
  [15, DATE],
  [16, DATE],
  [17, DATE],
  [18, TIME],
  [19, TIME_S],
  [20, TIME],
  [21, TIME_S],
  [22, `${DATE} ${TIME}`],
  ...[27, 28, 29, 30, 31].map((id): [number, string] => [id, DATE]),
  [32, TIME],
  [33, TIME_S],
  ...[34, 35, 36, 50, 51, 52, 53, 54, 55, 56, 57, 58].map((id): [number, string] => [id, DATE]),
  [45, TIME_S],
  [46, '[h]:mm:ss'],
  [47, TIME_S],
]);
