interface Versioned {
  readonly name: string;
  /** Greases have no versions. */
  readonly typeVersion?: number;
}

/** The latest version of each name of the catalogue, by name. */
export function latestVersions<T extends Versioned>(types: readonly T[]): readonly T[] {
  const latest = new Map<string, T>();
  for (const type of types) {
    const known = latest.get(type.name);
    if (!known || versionOf(known) < versionOf(type)) latest.set(type.name, type);
  }
  return [...latest.values()].sort(byName);
}

export const versionOf = (type: Versioned): number => type.typeVersion ?? 1;
export const byName = (a: Versioned, b: Versioned): number => a.name.localeCompare(b.name, 'en', { numeric: true });
