import type { Choice } from './choice';
import { byName, latestVersions } from './latest-versions';

interface TypeVersion {
  readonly id: string;
  readonly name: string;
  readonly typeVersion: number;
}

/** The latest version of each type of the catalogue, and the version in use where that is another; by name. */
export function typeChoices(types: readonly TypeVersion[], inUse: string | null = null): readonly Choice<string>[] {
  const latest = new Set(latestVersions(types));
  return types.filter((type) => type.id === inUse || latest.has(type))
    .sort((a, b) => byName(a, b) || b.typeVersion - a.typeVersion)
    .map((type) => ({ value: type.id, label: typeLabel(type) }));
}

const typeLabel = ({ name, typeVersion }: TypeVersion): string => (typeVersion > 1 ? `${name}, version ${typeVersion}` : name);
