/** One element of an SVG drawing; pure data, so that a drawing can be computed and tested without a screen. */
export interface Mark {
  readonly tag: 'path' | 'circle' | 'rect' | 'text' | 'tspan' | 'g' | 'title';
  readonly attrs: Readonly<Record<string, string>>;
  readonly text?: string;
  readonly children?: readonly Mark[];
}

/** At most two decimals: shorter, and no pixel can tell. */
export const round = (n: number): number => Math.round(n * 100) / 100;

export const path = (cls: string, d: string): Mark => ({ tag: 'path', attrs: { class: cls, d } });

export const circle = (cls: string, cx: number, cy: number, r: number): Mark => ({
  tag: 'circle', attrs: { class: cls, cx: String(round(cx)), cy: String(round(cy)), r: String(round(r)) },
});

export const rect = (cls: string, x: number, y: number, width: number, height: number, rx = 0): Mark => ({
  tag: 'rect',
  attrs: { class: cls, x: String(round(x)), y: String(round(y)), width: String(round(width)), height: String(round(height)), rx: String(rx) },
});

export const group = (cls: string, ...children: readonly Mark[]): Mark => ({ tag: 'g', attrs: { class: cls }, children });

/** What a pointer that rests on the group reads. */
export const title = (words: string): Mark => ({ tag: 'title', attrs: {}, text: words });

/** A stretch of text in a class of its own, for instance a quiet unit. */
export interface Words {
  readonly cls: string;
  readonly text: string;
}

export type Anchor = 'start' | 'middle' | 'end';

/** Text with its baseline at y; a list of stretches where one of them is drawn otherwise. */
export function text(cls: string, x: number, y: number, words: string | readonly (string | Words)[], anchor: Anchor = 'start'): Mark {
  const attrs = { class: cls, x: String(round(x)), y: String(round(y)), 'text-anchor': anchor };
  if (typeof words === 'string') return { tag: 'text', attrs, text: words };
  return { tag: 'text', attrs, children: words.map(stretch) };
}

const stretch = (words: string | Words): Mark =>
  typeof words === 'string' ? { tag: 'tspan', attrs: {}, text: words } : { tag: 'tspan', attrs: { class: words.cls }, text: words.text };

/** A narrow space before a unit inside a drawing. */
export const unit = (name: string): Words => ({ cls: 'unit', text: `\u202f${name}` });
