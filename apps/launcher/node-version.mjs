import { LaunchError } from './launch-error.mjs';

/** Oldest Node that every installed package supports. */
export const OLDEST_NODE = '20.19.0';

/**
 * Refuses a Node that is too old, before anything is installed with it.
 *
 * @param {string} version such as `20.19.0`
 * @throws {LaunchError} when older than {@link OLDEST_NODE}
 */
export function checkNodeVersion(version = process.versions.node) {
  if (!isOlder(version, OLDEST_NODE)) return;
  throw new LaunchError(
    `Lanewright needs Node ${OLDEST_NODE} or newer; this is Node ${version}.\n` +
      'Install a newer Node (for instance the current 20 or 22 release) and run the command again.',
  );
}

/**
 * @param {string} version
 * @param {string} than
 * @returns {boolean} whether `version` comes before `than`; a pre-release counts as its release
 */
export function isOlder(version, than) {
  const [left, right] = [version, than].map((text) => text.split(/[.-]/).slice(0, 3).map(Number));
  for (let i = 0; i < 3; i += 1) {
    const difference = (left[i] ?? 0) - (right[i] ?? 0);
    if (difference !== 0) return difference < 0;
  }
  return false;
}
