import { type Assessment, type Design, type Dispenser, formatNumber, NOTHING } from '#calc';
import type { LaneView } from '../shared/lane/lane-view';
import { laneViewsOf } from '../shared/lane/lane-views';
import type { LaneRows } from './lane-rows';

/** A lane whose own cable begins at the same place. */
export interface NeighbourLane {
  readonly id: string;
  readonly view: LaneView;
  readonly description: string;
  /** Worst voltage less the lowest that the dispenser allows, V. */
  readonly margin: string;
  readonly low: boolean;
  /** Runs in the set that makes this lane's worst voltage. */
  readonly inWorstSet: boolean;
}

export interface Neighbours {
  /** The box or cabinet, `+JB1`. */
  readonly place: string;
  readonly count: number;
  /** At most `MOST` of them: the nearest by tag. */
  readonly lanes: readonly NeighbourLane[];
}

const MOST = 24;

/** The lanes of the same box, this one among them, by tag; of one circuit where the cable begins at the cabinet. */
export function neighboursOf(design: Design, assessment: Assessment, { dispenser, circuit, figures }: LaneRows): Neighbours | null {
  if (circuit === null) return null;
  const views = laneViewsOf(design, assessment);
  const worstSet = new Set(figures?.worst?.worstSet);
  const points = new Map(design.points.map((p) => [p.id, p]));
  const laneOf = (d: Dispenser): NeighbourLane[] => {
    const view = views.get(d.id);
    return view ? [{ id: d.id, view, description: points.get(d.pointId)?.description ?? '', inWorstSet: worstSet.has(d.id), ...marginOf(view) }] : [];
  };
  const all = design.dispensers.filter((d) => d.circuitId === circuit.id && d.nodeId === dispenser.nodeId).flatMap(laneOf)
    .sort((a, b) => a.view.tag.localeCompare(b.view.tag, 'en', { numeric: true }));
  const from = Math.max(0, Math.min(all.findIndex((l) => l.id === dispenser.id) - MOST / 2, all.length - MOST));
  return {
    place: design.cableNodes.find((n) => n.id === dispenser.nodeId)?.location ?? `the cabinet, circuit ${circuit.name}`,
    count: all.length, lanes: all.slice(from, from + MOST),
  };
}

function marginOf({ worstV, minV }: LaneView): { readonly margin: string; readonly low: boolean } {
  if (worstV === null || minV === null) return { margin: NOTHING, low: false };
  return { margin: formatNumber(worstV - minV, 1, 'down'), low: worstV < minV };
}
