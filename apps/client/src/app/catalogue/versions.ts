import { versionOf } from '../shared/fields/latest-versions';
import type { Entry } from './fields/field';

/** All versions of a name, the latest first. */
export const versionsOf = (entries: readonly Entry[], name: string): readonly Entry[] =>
  entries.filter((entry) => entry.name === name).sort((a, b) => versionOf(b) - versionOf(a));
