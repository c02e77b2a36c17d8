/** Where things are in this clone. */
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The repository's root folder. */
export const root = resolve(dirname(fileURLToPath(import.meta.url)), '..', '..');

/**
 * @param {...string} parts path below the repository's root
 * @returns {string} absolute path
 */
export const inRoot = (...parts) => join(root, ...parts);

/** Built client, as the server hands it out. */
export const clientOutput = inRoot('dist', 'client', 'browser');

/** Built server; the entry of its thread for long work stands beside it. */
export const serverOutput = inRoot('dist', 'server', 'server.js');

/** Scripts of installed tools, to be run with `process.execPath`. */
export const tools = {
  eslint: inRoot('node_modules', 'eslint', 'bin', 'eslint.js'),
  ng: inRoot('node_modules', '@angular', 'cli', 'bin', 'ng.js'),
  playwright: inRoot('node_modules', '@playwright', 'test', 'cli.js'),
  tsc: inRoot('node_modules', 'typescript', 'bin', 'tsc'),
  tsx: inRoot('node_modules', 'tsx', 'dist', 'cli.mjs'),
  vitest: inRoot('node_modules', 'vitest', 'vitest.mjs'),
};

/**
 * The folder that holds this installation's database and secrets.
 *
 * @param {NodeJS.ProcessEnv} env
 * @returns {string} absolute path
 */
export function dataFolder(env = process.env) {
  return resolve(root, env.DATA_DIR || '.data');
}
