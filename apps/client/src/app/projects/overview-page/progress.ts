import type { Assessment, Design, Dispenser, Finding } from '#calc';
import type { LaneMark } from '../../shared/lane/lane-marks';
import { LANE_STATES, type LaneState, type LaneView } from '../../shared/lane/lane-view';

export type StateCounts = Readonly<Record<LaneState, number>>;

/** One machine or area: its dispensers in the order of their tags. */
export interface AreaProgress {
  readonly key: string;
  /** Function designation, `=T1.GL1`; empty when the points have none. */
  readonly designation: string;
  readonly name: string;
  readonly lanes: readonly LaneMark[];
  readonly counts: StateCounts;
}

/** One cabinet, or those that belong to none yet. */
export interface CabinetProgress {
  readonly location: string;
  readonly about: string;
  readonly areas: readonly AreaProgress[];
  readonly counts: StateCounts;
}

/** How far the dispensers are, by cabinet and area. */
export function progressOf(design: Design, assessment: Assessment, views: ReadonlyMap<string, LaneView>): readonly CabinetProgress[] {
  const cabinetOf = new Map(design.controllers.map((c) => [c.id, c.cabinetId]));
  const byCabinet = groupBy(design.dispensers, (d) => (d.controllerId === null ? null : cabinetOf.get(d.controllerId) ?? null));
  const inOrder = [...design.cabinets].sort((a, b) => a.location.localeCompare(b.location));
  return [...inOrder.map((c) => ({ id: c.id, location: c.location })), { id: null, location: '' }].flatMap(({ id, location }) => {
    const dispensers = byCabinet.get(id);
    if (!dispensers) return [];
    const areas = areasOf(design, assessment, views, dispensers);
    return [{ location, about: aboutCabinet(design, dispensers), areas, counts: sum(areas.map((a) => a.counts)) }];
  });
}

function areasOf(design: Design, assessment: Assessment, views: ReadonlyMap<string, LaneView>, dispensers: readonly Dispenser[]): readonly AreaProgress[] {
  const points = new Map(design.points.map((p) => [p.id, p]));
  const groups = groupBy(dispensers, (d) => {
    const point = points.get(d.pointId);
    return point?.machine ?? point?.function ?? '';
  });
  return [...groups].map(([key, members]): AreaProgress => {
    const lanes = members
      .map((d) => ({ tag: points.get(d.pointId)?.tag ?? '', mark: markOf(d, views, assessment.findingsByLane.get(d.id) ?? []) }))
      .sort((a, b) => a.tag.localeCompare(b.tag, 'en', { numeric: true }))
      .map((l) => l.mark);
    const designation = points.get(members[0].pointId)?.function ?? '';
    return { key, designation, name: key === designation ? '' : key || 'No machine named', lanes, counts: countsOf(lanes) };
  }).sort((a, b) => (a.designation || a.name).localeCompare(b.designation || b.name, 'en', { numeric: true }));
}

const markOf = (dispenser: Dispenser, views: ReadonlyMap<string, LaneView>, findings: readonly Finding[]): LaneMark => ({
  id: dispenser.id,
  state: views.get(dispenser.id)?.state ?? 'unmapped',
  severity: ownFindings(findings, dispenser).some((f) => f.severity === 'error') ? 'error'
    : ownFindings(findings, dispenser).some((f) => f.severity === 'warning') ? 'warning' : null,
});

/** What many lanes share stands in the list of findings once; over a mark stands what is the lane's own. An open output shows as dots. */
const ownFindings = (findings: readonly Finding[], dispenser: Dispenser): readonly Finding[] =>
  findings.filter((f) => f.dispenserIds.length === 1 && f.dispenserIds[0] === dispenser.id && !['MP-01', 'MP-02'].includes(f.code));

function aboutCabinet(design: Design, dispensers: readonly Dispenser[]): string {
  const ids = new Set(dispensers.map((d) => d.circuitId));
  const circuits = design.circuits.filter((c) => ids.has(c.id))
    .map((c) => `circuit ${c.name}, ${c.concurrencyLimit === null ? 'all at once' : `k = ${c.concurrencyLimit}`}`);
  return [`${dispensers.length} ${dispensers.length === 1 ? 'dispenser' : 'dispensers'}`, ...circuits].join(', ');
}

const countsOf = (lanes: readonly LaneMark[]): StateCounts =>
  Object.fromEntries(LANE_STATES.map((s) => [s, lanes.filter((l) => l.state === s).length])) as Record<LaneState, number>;

export const sum = (all: readonly StateCounts[]): StateCounts =>
  Object.fromEntries(LANE_STATES.map((s) => [s, all.reduce((n, c) => n + c[s], 0)])) as Record<LaneState, number>;

function groupBy<T, K>(items: readonly T[], keyOf: (item: T) => K): Map<K, T[]> {
  const groups = new Map<K, T[]>();
  for (const item of items) {
    const key = keyOf(item);
    const group = groups.get(key);
    if (group) group.push(item);
    else groups.set(key, [item]);
  }
  return groups;
}
