import { createHash } from 'node:crypto';
import { existsSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { readIfThere, writeWhole } from './files.mjs';
import { root } from './paths.mjs';
import { runOrFail } from './processes.mjs';
import { step } from './steps.mjs';

/** Says which lock file (and kind of Node) the installed packages belong to. */
const stampPath = (base) => join(base, 'node_modules', '.lanewright-packages');

/**
 * @param {string} [base] repository root
 * @returns {string} what the stamp must say for the packages to be up to date
 */
export function packagesWanted(base = root) {
  const lock = createHash('sha256')
    .update(readFileSync(join(base, 'package-lock.json')))
    .digest('hex');
  return `${lock} ${process.platform} ${process.arch} node-abi-${process.versions.modules}\n`;
}

/**
 * @param {string} [base] repository root
 * @returns {boolean}
 */
export const packagesUpToDate = (base = root) => readIfThere(stampPath(base)) === packagesWanted(base);

/** Installs the npm packages when the lock file, the platform or Node's binary interface changed. */
export async function installPackages() {
  if (packagesUpToDate()) return;
  await step('Installing npm packages', async (detail) => {
    // The stamp goes first: an interrupted installation must not look like a complete one.
    if (existsSync(stampPath(root))) rmSync(stampPath(root));
    const args = ['ci', '--include=dev', '--no-audit', '--no-fund', '--no-progress'];
    await runOrFail('npm ci', 'npm', args, { onLine: detail });
    writeWhole(stampPath(root), packagesWanted());
  });
}
