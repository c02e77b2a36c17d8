import type { DispenserType, Point, ProtectionLevel, Zone } from '../design.ts';
import type { DesignIndex } from '../design-index.ts';
import { makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';

/** Protection levels that suit a zone, least demanding first (IEC 60079-14): a higher level suits a lower demand. */
const SUITABLE: Readonly<Record<Exclude<Zone, 'none'>, readonly ProtectionLevel[]>> = {
  '0': ['Ga'],
  '1': ['Gb', 'Ga'],
  '2': ['Gc', 'Gb', 'Ga'],
  '20': ['Da'],
  '21': ['Db', 'Da'],
  '22': ['Dc', 'Db', 'Da'],
};

export type Suitability = 'suitable' | 'unsuitable' | 'unknown';

/** Levels that suit a zone; empty outside classified areas. */
export function suitableLevels(zone: Zone): readonly ProtectionLevel[] {
  return zone === 'none' ? [] : SUITABLE[zone];
}

/** Whether a type's protection levels suit a zone; unknown where the type states none. */
export function suitability(zone: Zone, levels: readonly ProtectionLevel[]): Suitability {
  if (zone === 'none') return 'suitable';
  if (levels.length === 0) return 'unknown';
  return levels.some((level) => SUITABLE[zone].includes(level)) ? 'suitable' : 'unsuitable';
}

/** Zone against type of one point. A screening aid: the plant's responsible person decides. */
export function zoneFinding(point: Point, dispenserId: string, type: DispenserType | null): Finding | null {
  const zone = point.zone;
  if (zone === null || zone === 'none' || !type) return null;
  const wanted = SUITABLE[zone].join(', ');
  const fits = suitability(zone, type.protectionLevels);
  if (fits === 'suitable') return null;
  const known = fits === 'unsuitable';
  return makeFinding(known ? 'AR-01' : 'AR-02', 'point', point.id, point.tag, {
    title: known
      ? `Zone ${zone} asks for ${wanted}, the type has ${type.protectionLevels.join(', ')}`
      : `Zone ${zone} asks for ${wanted}, the type states no protection level`,
    detail: 'A screening aid. The plant’s responsible person decides.',
    remedy: known ? `Choose a type with level ${wanted}, or move the device out of the zone.` : 'Enter the protection level from the type’s certificate.',
    dispenserIds: [dispenserId],
  });
}

/** Notes a type whose surface temperature nobody can compare with the area's gas or dust; the comparison itself is not made. */
export function surfaceFinding(point: Point, dispenserId: string, type: DispenserType | null): Finding | null {
  if (point.zone === null || point.zone === 'none' || !type || type.maxSurfaceC !== null) return null;
  return makeFinding('AR-04', 'point', point.id, point.tag, {
    title: `Zone ${point.zone}, and the type states no surface temperature`,
    detail: 'It cannot be compared with the ignition temperature of the gas or dust.',
    remedy: 'Enter the highest surface temperature from the type’s certificate.',
    dispenserIds: [dispenserId],
    mark: dispenserId,
  });
}

/** One note for all points whose zone nobody has stated. */
export function unstatedZones(index: DesignIndex): Finding[] {
  const { project, points } = index.design;
  const blank = points.filter((point) => point.zone === null);
  if (blank.length === 0) return [];
  const dispenserIds = blank.flatMap((point) => (index.dispensersByPoint.get(point.id) ?? []).map((d) => d.id));
  return [
    makeFinding('AR-03', 'project', project.id, project.name, {
      title: `${blank.length} ${blank.length === 1 ? 'point has' : 'points have'} no zone stated`,
      detail: 'Whether the types suit the area is not checked there.',
      remedy: 'State the zone of each point, or “none”.',
      compared: [{ name: 'points without zone', value: blank.length, limit: 0, unit: '' }],
      dispenserIds,
    }),
  ];
}
