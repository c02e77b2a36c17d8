import { randomBytes } from 'node:crypto';
import { chmodSync } from 'node:fs';
import { join } from 'node:path';
import { readIfThere, writeWhole } from './files.mjs';
import { LaunchError } from './launch-error.mjs';

const NAMES = ['superuserPassword', 'ownerPassword', 'appPassword', 'authPassword', 'jwtSecret'];

/** @returns {string} 256 random bits that need no quoting in a URL or in SQL */
export const newSecret = () => randomBytes(32).toString('hex');

/**
 * The installation's secrets: made once, then kept. A secret that a newer version adds is added.
 *
 * @param {string} folder data folder; must exist
 * @returns {{ path: string, superuserPassword: string, ownerPassword: string, appPassword: string,
 *   authPassword: string, jwtSecret: string }} `path` is the file, readable by its owner only
 * @throws {LaunchError} when the file cannot be understood: new passwords would lock us out
 */
export function loadSecrets(folder) {
  const path = join(folder, 'secrets.json');
  const text = readIfThere(path);
  const known = text === undefined ? {} : parse(text, path);
  const missing = NAMES.filter((name) => typeof known[name] !== 'string');
  const secrets = { ...known, ...Object.fromEntries(missing.map((name) => [name, newSecret()])) };
  if (missing.length > 0) writeWhole(path, `${JSON.stringify(secrets, null, 2)}\n`, 0o600);
  chmodSync(path, 0o600);
  return { ...secrets, path };
}

function parse(text, path) {
  try {
    const value = JSON.parse(text);
    if (value !== null && typeof value === 'object') return value;
  } catch {
    // Said below.
  }
  throw new LaunchError(
    `${path} cannot be read as JSON. Put back a good copy of it; ` +
      'or, to begin with an empty database, move the whole data folder away.',
  );
}
