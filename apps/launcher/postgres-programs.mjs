import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { installDebian } from './debian.mjs';
import { LaunchError } from './launch-error.mjs';

const DEBIAN = '/usr/lib/postgresql';

/** Debian 12's version: what we test with; the schema may use all it has. */
const OLDEST_MAJOR = 15;

/** @returns {string | undefined} folder of initdb, pg_ctl and postgres, the newest there is */
function findPrograms() {
  const versions = existsSync(DEBIAN) ? readdirSync(DEBIAN).map(Number).filter(Boolean) : [];
  const debian = versions
    .filter((major) => major >= OLDEST_MAJOR)
    .sort((a, b) => b - a)
    .map((major) => join(DEBIAN, String(major), 'bin'));
  const path = (process.env.PATH ?? '').split(delimiter).filter((folder) => folder.startsWith('/'));
  return [...debian, ...path].find((folder) =>
    ['initdb', 'pg_ctl', 'postgres'].every((program) => existsSync(join(folder, program))),
  );
}

/**
 * Finds PostgreSQL's server programs; installs Debian's package where that is possible.
 *
 * @returns {Promise<string>} their folder
 * @throws {LaunchError} saying the command to run
 */
export async function postgresPrograms() {
  const found = findPrograms();
  if (found) return found;
  await installDebian('PostgreSQL', ['postgresql']);
  const installed = findPrograms();
  if (installed) return installed;
  throw new LaunchError(
    `PostgreSQL ${OLDEST_MAJOR} or newer was not found below ${DEBIAN} or in PATH. Install it, ` +
      "or point DATABASE_URL at a server that runs elsewhere (with a superuser's name and password).",
  );
}

/**
 * PostgreSQL refuses to run as root: root hands it to an unprivileged user.
 *
 * @param {string} [user] name of that user
 * @returns {{ uid?: number, gid?: number, name?: string }} empty when we are not root
 */
export function clusterAccount(user = 'postgres') {
  if (process.getuid?.() !== 0) return {};
  const line = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .find((entry) => entry.startsWith(`${user}:`));
  if (!line) {
    throw new LaunchError(
      `PostgreSQL may not run as root, and there is no user "${user}" to run it as. ` +
        'Run the command as an ordinary user, or make one: adduser --system --group postgres',
    );
  }
  const [, , uid, gid] = line.split(':');
  return { uid: Number(uid), gid: Number(gid), name: user };
}
