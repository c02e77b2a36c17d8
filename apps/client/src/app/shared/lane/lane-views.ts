import type { Assessment, Design, Dispenser, LaneFigures } from '#calc';
import type { LaneState, LaneView } from './lane-view';

/** Every dispenser's line, by dispenser id; one pass, for lists of thousands. */
export function laneViewsOf(design: Design, assessment: Assessment): ReadonlyMap<string, LaneView> {
  const tags = new Map(design.points.map((p) => [p.id, p.tag]));
  const boxes = new Map(design.cableNodes.map((n) => [n.id, n.location]));
  const places = new Map(design.cabinets.map((c) => [c.id, c.location]));
  const cabinets = new Map(design.controllers.map((c) => [c.id, places.get(c.cabinetId) ?? null]));
  return new Map(design.dispensers.map((d) => {
    const from = (d.nodeId === null ? null : boxes.get(d.nodeId)) ?? (d.controllerId === null ? null : cabinets.get(d.controllerId)) ?? null;
    return [d.id, keptView(d, laneViewOf(d, assessment.lanes.get(d.id), tags.get(d.pointId) ?? '', from))];
  }));
}

/** One dispenser's line. `from`: where its own cable begins, as a location designation. */
export function laneViewOf(dispenser: Dispenser, figures: LaneFigures | undefined, tag: string, from: string | null): LaneView {
  const output = figures?.outputAddress ?? null;
  const status = figures?.statusAddress ?? null;
  return {
    tag, wiring: dispenser.wiring, output, status, from,
    state: stateOf(dispenser.method === 'timed' ? status : output),
    statusState: stateOf(status),
    lengthM: figures?.runLengthM ?? dispenser.cableLengthM,
    sectionMm2: dispenser.crossSectionMm2,
    worstV: figures?.worst?.volts ?? null,
    minV: figures?.minV ?? null,
    intervalMs: figures?.plan?.intervalMs ?? null,
    method: dispenser.method,
    planned: Boolean(figures?.plan ?? figures?.timed),
    collapsed: figures?.collapsed ?? false,
  };
}

/** A dispenser on its own clock has no output: its status channel is what maps it. */
const stateOf = (address: string | null): LaneState => (address === null ? 'unmapped' : 'mapped');

const kept = new WeakMap<Dispenser, LaneView>();

/** The view made before where nothing in it moved: an edit elsewhere then draws no row again. */
function keptView(dispenser: Dispenser, view: LaneView): LaneView {
  const before = kept.get(dispenser);
  if (before && (Object.keys(view) as (keyof LaneView)[]).every((key) => before[key] === view[key])) return before;
  kept.set(dispenser, view);
  return view;
}
