import type { Module, Supply } from '../design.ts';
import { type DesignIndex, grouped, pointDesignation } from '../design-index.ts';
import { makeFinding } from '../finding-codes.ts';
import type { Finding, SubjectKind } from '../findings.ts';

interface Named {
  readonly kind: SubjectKind;
  readonly id: string;
  /** What people call the row that bears the name. */
  readonly label: string;
  readonly name: string;
  readonly dispenserIds: readonly string[];
}

/** Cable tags that stand on two cables, and designations that stand on two things. */
export function tagFindings(index: DesignIndex): Finding[] {
  const cableTags = repeated(cableNames(index));
  const things = repeated(designationNames(index));
  return [
    ...doubled(cableTags.size === 0 ? [] : cables(index), cableTags).map((users) =>
      makeFinding('CB-03', 'cable', users[0].id, users[0].name, {
        title: `${users[0].name} is the tag of ${users.length} cables: ${listed(users)}`,
        remedy: 'Give each cable a tag of its own.',
        dispenserIds: users.flatMap((user) => user.dispenserIds),
      }),
    ),
    ...doubled(things.size === 0 ? [] : designations(index), things).map((users) =>
      makeFinding('TG-01', users[0].kind, users[0].id, users[0].label, {
        title: `${users[0].name} designates ${users.length} things: ${listed(users)}`,
        remedy: 'Give each a designation of its own.',
        dispenserIds: users.flatMap((user) => user.dispenserIds),
      }),
    ),
  ];
}

/** Names that occur more than once: most designs have none, and then nothing else is gathered. */
function repeated(names: Iterable<string | null>): ReadonlySet<string> {
  const seen = new Set<string>();
  const again = new Set<string>();
  for (const name of names) {
    if (!name) continue;
    const before = seen.size;
    seen.add(name);
    if (seen.size === before) again.add(name);
  }
  return again;
}

function* cableNames({ design }: DesignIndex): Iterable<string | null> {
  for (const dispenser of design.dispensers) yield dispenser.cableTag;
  for (const node of design.cableNodes) yield node.cableTag;
}

function* designationNames(index: DesignIndex): Iterable<string> {
  const { design } = index;
  yield* index.pointDesignations;
  for (const cabinet of design.cabinets) yield cabinet.location;
  for (const node of design.cableNodes) yield node.location;
  for (const supply of design.supplies) yield supplyName(index, supply);
  for (const module of design.modules) yield moduleName(index, module);
}

function supplyName({ cabinets }: DesignIndex, { cabinetId, name }: Supply): string {
  return `${cabinets.get(cabinetId)?.location ?? ''}${name}`;
}

function moduleName({ controllers }: DesignIndex, { controllerId, name }: Module): string {
  return `${controllers.get(controllerId)?.id ?? ''} ${name}`;
}

function doubled(rows: readonly Named[], names: ReadonlySet<string>): Named[][] {
  return [...grouped(rows, (row) => (names.has(row.name) ? row.name : null)).values()];
}

function listed(users: readonly Named[]): string {
  const names = users.slice(0, 3).map((user) => user.label).join(', ');
  return users.length > 3 ? `${names} and ${users.length - 3} more` : names;
}

function cables({ design, points }: DesignIndex): Named[] {
  const rows: Named[] = [];
  for (const d of design.dispensers) {
    if (!d.cableTag) continue;
    rows.push({ kind: 'cable', id: d.id, label: points.get(d.pointId)?.tag ?? d.id, name: d.cableTag, dispenserIds: [d.id] });
  }
  for (const node of design.cableNodes) {
    if (node.cableTag) rows.push({ kind: 'cable', id: node.id, label: `trunk to ${node.location}`, name: node.cableTag, dispenserIds: [] });
  }
  return rows;
}

/** Only what has a product aspect of its own names one thing; function and location are shared by many. */
function designations(index: DesignIndex): Named[] {
  const { design, dispensersByPoint } = index;
  const rows: Named[] = [];
  for (const p of design.points) {
    if (!p.product) continue;
    const dispenserIds = (dispensersByPoint.get(p.id) ?? []).map((d) => d.id);
    rows.push({ kind: 'point', id: p.id, label: p.tag, name: pointDesignation(p), dispenserIds });
  }
  const place = (kind: SubjectKind, id: string, label: string, name: string): void => {
    rows.push({ kind, id, label, name, dispenserIds: [] });
  };
  for (const c of design.cabinets) place('cabinet', c.id, `cabinet ${c.location}`, c.location);
  for (const n of design.cableNodes) place('cable', n.id, `box ${n.location}`, n.location);
  for (const s of design.supplies) place('supply', s.id, `supply ${s.name}`, supplyName(index, s));
  for (const m of design.modules) place('module', m.id, `module ${m.name}`, moduleName(index, m));
  return rows;
}
