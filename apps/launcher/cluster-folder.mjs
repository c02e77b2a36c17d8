/** Where a cluster may lie: its unprivileged user must be able to enter every folder above. */
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { chmodSync, chownSync, existsSync, lstatSync, mkdirSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { basename, dirname, join } from 'node:path';
import { LaunchError } from './launch-error.mjs';
import { isRunning } from './lock.mjs';

const TEMPORARY = 'lanewright-temporary-';
/** Holds the clusters of root's installations that lie where nobody else may go. */
const ELSEWHERE = '/var/lib/lanewright';

/**
 * @param {string} folder must exist
 * @param {{ uid?: number, gid?: number }} account
 * @returns {boolean} whether the account can enter the folder
 */
export function canEnter(folder, { uid, gid }) {
  return spawnSync('test', ['-x', folder], { uid, gid, cwd: '/' }).status === 0;
}

/**
 * @param {string} dataFolder must exist
 * @param {{ uid?: number, gid?: number }} account
 * @returns {{ folder: string, moved: boolean }} where this data folder's cluster lies; `moved`
 *   when not below the data folder itself
 */
export function clusterFolder(dataFolder, account) {
  if (canEnter(dataFolder, account)) return { folder: join(dataFolder, 'postgres'), moved: false };
  const mark = createHash('sha256').update(dataFolder).digest('hex').slice(0, 12);
  const name = `${basename(dirname(dataFolder)) || 'data'}-${mark}`;
  return { folder: join(ELSEWHERE, name), moved: true };
}

/**
 * Makes a cluster's folder and gives it to the account alone.
 *
 * @param {string} folder
 * @param {{ uid?: number, gid?: number, name?: string }} account
 * @throws {LaunchError} when the account cannot get there
 */
export function prepareFolder(folder, account) {
  mkdirSync(folder, { recursive: true, mode: 0o755 });
  if (account.uid !== undefined && account.gid !== undefined) chownSync(folder, account.uid, account.gid);
  chmodSync(folder, 0o700);
  if (canEnter(folder, account)) return;
  throw new LaunchError(
    `The user "${account.name}", who runs PostgreSQL, cannot reach ${folder}. ` +
      'Choose a data folder below one that everybody may enter: DATA_DIR=/srv/lanewright npm start',
  );
}

/**
 * A fresh folder for a throw-away cluster. Its name holds our process number, so that what a
 * killed run left behind can be told from what is in use.
 *
 * @param {{ uid?: number, gid?: number }} account
 * @returns {string}
 */
export function temporaryFolder(account) {
  const parent = [tmpdir(), '/tmp', '/var/tmp'].find((place) => existsSync(place) && canEnter(place, account));
  if (!parent) throw new LaunchError('No folder for temporary files can be entered. Set TMPDIR to one.');
  return mkdtempSync(join(parent, `${TEMPORARY}${process.pid}-`));
}

/**
 * @param {{ uid?: number }} account
 * @returns {string[]} folders of throw-away clusters, ours or the account's, whose makers are gone
 */
export function abandonedFolders(account) {
  const places = [...new Set([tmpdir(), '/tmp', '/var/tmp'])].filter((place) => existsSync(place));
  const owners = [process.getuid?.(), account.uid];
  return places
    .flatMap((place) => readdirSync(place).map((name) => ({ name, path: join(place, name) })))
    .filter(({ name }) => name.startsWith(TEMPORARY) && !isRunning(Number.parseInt(name.slice(TEMPORARY.length), 10)))
    .map(({ path }) => path)
    .filter((path) => {
      // Others may have put anything of that name there, links included.
      const found = lstatSync(path, { throwIfNoEntry: false });
      return found?.isDirectory() && owners.includes(found.uid);
    });
}

/** @param {string} folder removed with all it holds */
export const removeFolder = (folder) => rmSync(folder, { recursive: true, force: true, maxRetries: 3 });
