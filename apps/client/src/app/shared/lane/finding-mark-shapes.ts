import type { Severity } from '#calc';
import { circle, group, type Mark, path } from '../drawing/mark';

/** A finding's mark inside a drawing, in 11 px, with its centre at (x, y): octagon, triangle, ring. */
export function findingMark(x: number, y: number, severity: Severity): Mark {
  return group('small-mark', ...MARKS[severity](x, y));
}

const MARKS: Readonly<Record<Severity, (x: number, y: number) => readonly Mark[]>> = {
  error: (x, y) => [path('octagon', `M${x - 2.2} ${y - 5.1}h4.4l2.9 2.9v4.4l-2.9 2.9h-4.4l-2.9 -2.9v-4.4z`), path('bang', `M${x} ${y - 3}v3.6M${x} ${y + 2.2}v.8`)],
  warning: (x, y) => [path('triangle', `M${x} ${y - 4.4}L${x + 4.9} ${y + 4.4}H${x - 4.9}z`), path('stroke', `M${x} ${y - 1.4}v2.8M${x} ${y + 2.4}v.8`)],
  note: (x, y) => [circle('note', x, y, 4.6), path('note', `M${x} ${y - 0.4}v2.9M${x} ${y - 2.6}v.9`)],
};
