/** An interval's text taken apart, so that its unit is drawn quietly: `4 h 20` is 4, h and 20; `55 min` is 55, min and nothing. */
export function intervalParts(text: string): readonly [figure: string, unit: string, rest: string] {
  const [figure = '', unit = '', rest = ''] = text.split('\u2009');
  return [figure, unit, rest];
}
