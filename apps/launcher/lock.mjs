import { linkSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { readIfThere } from './files.mjs';
import { LaunchError } from './launch-error.mjs';

/**
 * Takes the data folder for this process. A lock left behind by a killed launcher is replaced.
 *
 * @param {string} folder data folder; must exist
 * @returns {() => void} gives the folder free again
 * @throws {LaunchError} when another launcher works on the folder
 */
export function lockFolder(folder) {
  const path = join(folder, 'launcher.lock');
  const draft = `${path}.${process.pid}`;
  writeFileSync(draft, JSON.stringify({ pid: process.pid, born: birthOf(process.pid) }));
  try {
    if (!claim(draft, path)) {
      refuseIfHeld(path, folder);
      rmSync(path, { force: true });
      if (!claim(draft, path)) refuseIfHeld(path, folder);
    }
  } finally {
    rmSync(draft, { force: true });
  }
  return () => rmSync(path, { force: true });
}

/** A link appears with its content, in one step; a file written in place would not. */
function claim(draft, path) {
  try {
    linkSync(draft, path);
    return true;
  } catch (error) {
    if (error.code === 'EEXIST') return false;
    throw error;
  }
}

/**
 * @param {string} folder data folder
 * @returns {number | undefined} the process of the launcher that works on the folder, if one does
 */
export const holderOf = (folder) => holderBy(join(folder, 'launcher.lock'));

function holderBy(path) {
  let holder;
  try {
    holder = JSON.parse(readIfThere(path) ?? 'null');
  } catch {
    return undefined;
  }
  return holder && isRunning(holder.pid) && holder.born === birthOf(holder.pid) ? holder.pid : undefined;
}

function refuseIfHeld(path, folder) {
  const pid = holderBy(path);
  if (pid === undefined) return;
  throw new LaunchError(
    `Lanewright runs already on this data folder (process ${pid}): ${folder}\n` +
      `Use the one that runs, stop it with Ctrl-C (or: kill ${pid}), ` +
      'or give this one a folder of its own: DATA_DIR=… PORT=… npm start',
  );
}

/**
 * @param {number} pid
 * @returns {boolean} whether a process has this number, whoever owns it; one that has ended, but
 *   whose parent has not yet taken note, does not count
 */
export function isRunning(pid) {
  try {
    process.kill(pid, 0);
  } catch (error) {
    return error.code === 'EPERM';
  }
  return statOf(pid)[0] !== 'Z';
}

/**
 * Process numbers are used again; number and time of birth together are not.
 *
 * @param {number} pid
 * @returns {string | null} clock ticks since boot, where the system tells them (/proc)
 */
const birthOf = (pid) => statOf(pid)[19] ?? null;

/** @returns {string[]} what /proc says of a process, from its state on; empty where there is none */
function statOf(pid) {
  const stat = readIfThere(`/proc/${pid}/stat`) ?? '';
  // The field before, the name, may hold blanks and brackets: begin behind its end.
  return stat === '' ? [] : stat.slice(stat.lastIndexOf(')') + 2).split(' ');
}
