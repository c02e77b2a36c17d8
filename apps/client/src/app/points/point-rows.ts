import type { Assessment, Design, Dispenser, DispenserType, Finding, Grease, Point, PulsePlan, TimedPlan } from '#calc';
import { findingPlace } from '../shared/findings/finding-place';

/** A point with all that the page shows of it. */
export interface PointRow {
  readonly point: Point;
  readonly dispenser: Dispenser | null;
  readonly type: DispenserType | null;
  readonly grease: Grease | null;
  readonly demandUlPer1000h: number | null;
  /** Why there is no demand, as an instruction. */
  readonly refusal: string | null;
  readonly plan: PulsePlan | null;
  readonly timed: TimedPlan | null;
  /** What is mended here, and errors of this lane alone. */
  readonly findings: readonly Finding[];
  /** All else that its lane shows, such as a circuit's load. */
  readonly laneFindings: readonly Finding[];
  readonly circuit: string | null;
  /** Location of the cabinet that its controller stands in. */
  readonly cabinet: string | null;
  /** What a search looks at, in small letters. */
  readonly text: string;
}

/** Rows of one function designation, with what they have in common. */
export interface PointGroup {
  readonly key: string;
  readonly designation: string;
  readonly machine: string;
  /** Hours and place, `16 h on 6 days a week, +K1, circuit C1`. */
  readonly note: string;
  readonly rows: readonly PointRow[];
}

/** A line of the grid: the head of a group, or a point with its place among all points. */
export type GridLine =
  | { readonly kind: 'group'; readonly key: string; readonly group: PointGroup }
  | { readonly kind: 'point'; readonly key: string; readonly row: PointRow };

const byName = new Intl.Collator('en', { numeric: true }).compare;
const byId = <T extends { readonly id: string }>(rows: readonly T[]) => new Map(rows.map((row) => [row.id, row]));

/** All points of a design with their dispensers, figures and findings, in the order of their tags. */
export function pointRows(design: Design, assessment: Assessment): readonly PointRow[] {
  const dispensers = new Map(design.dispensers.map((d) => [d.pointId, d]));
  const types = byId(design.dispenserTypes);
  const greases = byId(design.greases);
  const circuits = byId(design.circuits);
  const controllers = byId(design.controllers);
  const cabinets = byId(design.cabinets);
  const ownFindings = groupedBy(assessment.findings.filter((f) => f.subject.kind === 'point'), (f) => f.subject.id);
  return design.points.map((point) => {
    const dispenser = dispensers.get(point.id) ?? null;
    const type = types.get(dispenser?.typeId ?? '') ?? null;
    const lane = dispenser ? assessment.lanes.get(dispenser.id) : undefined;
    const figures = assessment.points.get(point.id);
    const all = (dispenser && assessment.findingsByLane.get(dispenser.id)) ?? ownFindings.get(point.id) ?? [];
    const findings = all.filter(isOwn);
    return {
      point, dispenser, type, grease: greases.get(point.greaseId ?? '') ?? null, findings, laneFindings: all.filter((f) => !isOwn(f)),
      demandUlPer1000h: figures?.demandUlPer1000h ?? null, refusal: figures?.refusal ?? null,
      plan: lane?.plan ?? null, timed: lane?.timed ?? null,
      circuit: circuits.get(dispenser?.circuitId ?? '')?.name ?? null,
      cabinet: cabinets.get(controllers.get(dispenser?.controllerId ?? '')?.cabinetId ?? '')?.location ?? null,
      text: [point.tag, point.description, point.machine, point.function, point.location, type?.name, ...findings.map((f) => `${f.code} ${f.title}`)]
        .filter(Boolean).join(' ').toLowerCase(),
    };
  }).sort((a, b) => byName(a.point.tag, b.point.tag));
}

/** Rows that hold every word of the filter, and (if asked) have a finding. */
export function filteredRows(rows: readonly PointRow[], filter: string, onlyFindings: boolean): readonly PointRow[] {
  const wanted = filter.toLowerCase().split(/\s+/).filter(Boolean);
  return rows.filter((row) => (!onlyFindings || row.findings.length > 0) && wanted.every((word) => row.text.includes(word)));
}

/** Rows by function designation; those without one by their machine, at the end. */
export function groupedRows(rows: readonly PointRow[]): readonly PointGroup[] {
  const groups = groupedBy(rows, (row) => row.point.function ?? `~${row.point.machine ?? ''}`);
  return [...groups].sort(([a], [b]) => Number(a.startsWith('~')) - Number(b.startsWith('~')) || byName(a, b)).map(([key, own]) => ({
    key,
    designation: key.startsWith('~') ? '' : key,
    machine: common(own.map((row) => row.point.machine)) ?? (key.startsWith('~') ? 'Without function designation' : ''),
    note: [runningTime(own), placeOf(own)].filter(Boolean).join(', '),
    rows: own,
  }));
}

/** Groups with their rows, one after another. */
export const gridLines = (groups: readonly PointGroup[]): readonly GridLine[] =>
  groups.flatMap((group) => [
    { kind: 'group' as const, key: `group ${group.key}`, group },
    ...group.rows.map((row) => ({ kind: 'point' as const, key: row.point.id, row })),
  ]);

/** Point ids from one row to another, both included, in the order shown. */
export function rangeOf(rows: readonly PointRow[], fromId: string, toId: string): readonly string[] {
  const at = (id: string) => rows.findIndex((row) => row.point.id === id);
  const [first, last] = [at(fromId), at(toId)].sort((a, b) => a - b);
  return first === undefined || last === undefined || first < 0 ? [] : rows.slice(first, last + 1).map((row) => row.point.id);
}

/** The next row below with a finding, round at the end; null when there is none. */
export function nextWithFinding(rows: readonly PointRow[], fromId: string | null): PointRow | null {
  const at = rows.findIndex((row) => row.point.id === fromId);
  return [...rows.slice(at + 1), ...rows.slice(0, at + 1)].find((row) => row.findings.length > 0) ?? null;
}

const isOwn = (finding: Finding): boolean =>
  findingPlace(finding) === 'points' || (finding.severity === 'error' && finding.dispenserIds.length === 1);

function groupedBy<T>(rows: readonly T[], keyOf: (row: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>();
  for (const row of rows) {
    const key = keyOf(row);
    const group = groups.get(key);
    if (group) group.push(row);
    else groups.set(key, [row]);
  }
  return groups;
}

function common<T>(values: readonly T[]): T | null {
  return values.every((value) => value === values[0]) ? (values[0] ?? null) : null;
}

function runningTime(rows: readonly PointRow[]): string {
  const hours = common(rows.map((row) => row.point.hoursPerDay));
  const days = common(rows.map((row) => row.point.daysPerWeek));
  if (hours === null) return rows.some((row) => row.point.hoursPerDay !== null) ? 'hours differ' : 'hours not given';
  return days === null ? `${hours} h a running day` : days === 7 ? `${hours} h every day` : `${hours} h on ${days} days a week`;
}

function placeOf(rows: readonly PointRow[]): string {
  const named = (values: readonly (string | null)[]) => [...new Set(values.filter((value) => value !== null))].sort(byName);
  const cabinets = named(rows.map((row) => row.cabinet));
  const circuits = named(rows.map((row) => row.circuit));
  return [cabinets.join(' and '), circuits.length > 0 ? `circuit${circuits.length > 1 ? 's' : ''} ${circuits.join(' and ')}` : ''].filter(Boolean).join(', ');
}
