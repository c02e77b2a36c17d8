import type { Assessment, Design, LaneFigures } from '#calc';
import type { LoopBox, LoopProfile, ProfileStation } from '../shared/lane/loop-view';
import type { LaneRows } from './lane-rows';

/** The voltage along the lane; null while it cannot be computed, without voltages where it collapses. */
export function profileOf(design: Design, assessment: Assessment, rows: LaneRows, boxes: readonly LoopBox[]): LoopProfile | null {
  const { dispenser, figures, circuit } = rows;
  if (!figures || (!figures.collapsed && (!figures.worst || figures.profile.length === 0))) return null;
  return {
    stations: figures.collapsed ? collapsedStations(rows, figures, boxes) : figures.profile,
    lowestV: (circuit && assessment.supplies.get(circuit.supplyId)?.lowestV) ?? null,
    tempC: design.project.voltageTempC,
    minV: figures.minV,
    worstSet: worstSetText(design, figures),
    idleV: figures.idle?.volts ?? null,
    allOnV: figures.allOn?.volts ?? null,
    allOnCount: design.dispensers.filter((d) => d.circuitId === dispenser.circuitId).length,
    collapsed: figures.collapsed,
  };
}

/** Where the stations stand, without voltages: only alone, at the device, is there one. */
function collapsedStations({ dispenser }: LaneRows, figures: LaneFigures, boxes: readonly LoopBox[]): readonly ProfileStation[] {
  const dark = (label: string, metres: number, aloneV: number | null = null): ProfileStation => ({ label, metres, worstV: null, aloneV });
  const trunk = boxes.map((b, i) => dark(b.location, boxes.slice(0, i + 1).reduce((sum, box) => sum + box.lengthM, 0)));
  const own = (trunk.at(-1)?.metres ?? 0) + (dispenser.cableLengthM ?? 0);
  return [dark('Supply', 0), dark('Terminals', 0), ...trunk, dark('Device', own, figures.aloneV)];
}

/** `worst set of 3: GC1-L01, GC1-L02, GC1-L03`. */
function worstSetText(design: Design, figures: LaneFigures): string {
  const ids = figures.worst?.worstSet ?? [];
  if (ids.length === 0) return 'no voltage left with the worst permitted set';
  if (ids.length === 1) return 'worst set: this one alone';
  const points = new Map(design.points.map((p) => [p.id, p.tag]));
  const tags = new Map(design.dispensers.map((d) => [d.id, points.get(d.pointId) ?? '']));
  const set = ids.map((id) => tags.get(id) ?? '');
  return `worst set of ${set.length}: ${set.length > 4 ? `${set.slice(0, 4).join(', ')} and ${set.length - 4} more` : set.join(', ')}`;
}
