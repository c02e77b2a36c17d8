interface Spot {
  readonly x: number;
  readonly y: number;
}

const MOUSE_PX = 5;
const TOUCH_PX = 10;
const EDGE_PX = 44;
const FASTEST_PX = 18;

/** Whether a press has become a drag; a finger trembles more than a mouse. */
export const farEnough = (from: Spot, to: Spot, touch: boolean): boolean => Math.hypot(to.x - from.x, to.y - from.y) > (touch ? TOUCH_PX : MOUSE_PX);

/** Pixels a frame that something from `start` to `end` scrolls with the pointer at `at`: faster the nearer to an edge. */
export function edgeSpeed(at: number, start: number, end: number): number {
  const edge = Math.min(EDGE_PX, (end - start) / 4);
  if (at < start + edge) return -Math.ceil((FASTEST_PX * Math.min(edge, start + edge - at)) / edge);
  if (at > end - edge) return Math.ceil((FASTEST_PX * Math.min(edge, at - end + edge)) / edge);
  return 0;
}
