import type { LaneView } from '../shared/lane/lane-view';
import { kept } from './mapping-rows';

/** Each drawing that reads as before is the object that it was before. */
export function keptLanes(made: ReadonlyMap<string, LaneView>, old: ReadonlyMap<string, LaneView> | undefined): ReadonlyMap<string, LaneView> {
  if (!old) return made;
  return new Map([...made].map(([id, lane]) => [id, kept(lane, old.get(id))]));
}
