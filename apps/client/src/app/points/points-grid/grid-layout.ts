import type { GridLine } from '../point-rows';

/** Width of the tick box's column, px. */
const TICK_PX = 44;
const DESCRIPTION_PX = 164;
/** From, hours, demand, dose, cartridge, interval, pulses, life, over. */
const FIXED_PX = [54, 38, 84, 38, 60, 58, 46, 46, 36] as const;
const FINDINGS_PX = 124;
/** A character of the tag's face at 12.5 px. */
const CHARACTER_PX = 7.4;

export interface GridLayout {
  /** `grid-template-columns` of head and rows. */
  readonly template: string;
  readonly minPx: number;
  /** What stays at the left while the rest scrolls, px. */
  readonly frozenPx: number;
}

/** Fixed widths, save that the tag's column fits the longest tag (up to a limit) and description and findings share what is left. */
export function columnTemplate(tags: readonly string[]): GridLayout {
  const longest = tags.reduce((most, tag) => Math.max(most, tag.length), 0);
  const tagPx = Math.round(Math.min(190, Math.max(70, longest * CHARACTER_PX + 14)));
  const figures = FIXED_PX.map((px) => `${px}px`).join(' ');
  return {
    template: `${TICK_PX}px ${tagPx}px minmax(${DESCRIPTION_PX}px, 1fr) ${figures} minmax(${FINDINGS_PX}px, 1fr)`,
    minPx: [TICK_PX, tagPx, DESCRIPTION_PX, FINDINGS_PX, ...FIXED_PX].reduce((sum, px) => sum + px, 0),
    frozenPx: TICK_PX + tagPx,
  };
}

/** The first and last point (counted from 1, group heads left out) whose rows are in view. */
export function rowsInView(lines: readonly GridLine[], view: { readonly top: number; readonly height: number }, rowPx: number): { readonly first: number; readonly last: number } {
  const points = (from: number, to: number) => lines.slice(from, to).filter((line) => line.kind === 'point').length;
  const start = Math.ceil(view.top / rowPx);
  const end = Math.min(lines.length, Math.floor((view.top + view.height) / rowPx));
  const before = points(0, start);
  const within = points(start, end);
  return { first: within > 0 ? before + 1 : 0, last: before + within };
}
