import type { Entry } from './fields/field';

const versionOf = (entry: Entry): number => entry.typeVersion ?? 1;
const byName = (a: Entry, b: Entry): number => a.name.localeCompare(b.name, 'en', { numeric: true });

/** The latest version of each name, by name. */
export function latestVersions(entries: readonly Entry[]): readonly Entry[] {
  const latest = new Map<string, Entry>();
  for (const entry of entries) {
    const known = latest.get(entry.name);
    if (!known || versionOf(known) < versionOf(entry)) latest.set(entry.name, entry);
  }
  return [...latest.values()].sort(byName);
}

/** All versions of a name, the latest first. */
export const versionsOf = (entries: readonly Entry[], name: string): readonly Entry[] =>
  entries.filter((entry) => entry.name === name).sort((a, b) => versionOf(b) - versionOf(a));
