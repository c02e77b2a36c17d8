import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, renameSync, statSync, writeFileSync } from 'node:fs';
import { join, relative } from 'node:path';

/**
 * Writes a file whole or not at all: an interruption leaves the former content.
 *
 * @param {string} path
 * @param {string} content
 * @param {number} [mode] permission bits
 */
export function writeWhole(path, content, mode = 0o644) {
  const draft = `${path}.${process.pid}.new`;
  writeFileSync(draft, content, { mode, flush: true });
  renameSync(draft, path);
}

/**
 * @param {string} path
 * @returns {string | undefined} the text, or undefined when there is no such file
 */
export function readIfThere(path) {
  try {
    return readFileSync(path, 'utf8');
  } catch (error) {
    // ESRCH: a file of /proc whose process ended while we read.
    if (error.code === 'ENOENT' || error.code === 'ESRCH') return undefined;
    throw error;
  }
}

/**
 * Fingerprint of files by path and content. Not by time: git, copies and archives change times.
 *
 * @param {string} base folder that paths are relative to
 * @param {readonly string[]} sources files and folders below it; missing ones count as missing
 * @returns {string} SHA-256, hexadecimal
 */
export function fingerprint(base, sources) {
  const hash = createHash('sha256');
  for (const file of sources.flatMap((source) => filesBelow(join(base, source))).sort()) {
    hash.update(`${relative(base, file)}\0`);
    hash.update(createHash('sha256').update(readFileSync(file)).digest());
  }
  return hash.digest('hex');
}

/** @returns {string[]} the file itself, or all files in the folder; links are not followed */
function filesBelow(path) {
  const found = statSync(path, { throwIfNoEntry: false });
  if (!found) return [];
  if (found.isFile()) return [path];
  return readdirSync(path, { withFileTypes: true })
    .filter((entry) => entry.isFile() || entry.isDirectory())
    .flatMap((entry) => filesBelow(join(path, entry.name)));
}
