import type { Choice } from './choice';

interface TypeVersion {
  readonly id: string;
  readonly name: string;
  readonly typeVersion: number;
}

/** The latest version of each type of the catalogue, and the version in use where that is another; by name. */
export function typeChoices(types: readonly TypeVersion[], inUse: string | null = null): readonly Choice<string>[] {
  const latest = new Map<string, TypeVersion>();
  for (const type of types) if ((latest.get(type.name)?.typeVersion ?? 0) < type.typeVersion) latest.set(type.name, type);
  return types.filter((type) => type.id === inUse || latest.get(type.name) === type)
    .sort((a, b) => a.name.localeCompare(b.name, 'en', { numeric: true }) || b.typeVersion - a.typeVersion)
    .map((type) => ({ value: type.id, label: typeLabel(type) }));
}

const typeLabel = ({ name, typeVersion }: TypeVersion): string => (typeVersion > 1 ? `${name}, version ${typeVersion}` : name);
