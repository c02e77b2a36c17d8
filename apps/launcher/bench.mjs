/**
 * `npm run bench`: figures beside their limits, on a cluster of its own; `-- --only TEXT` for some of them,
 * `-- --json FILE` for a file of results. A limit that is missed is reported; only a bench that breaks fails.
 */
import { existsSync } from 'node:fs';
import { removeAbandonedClusters } from './cluster.mjs';
import { installDebian } from './debian.mjs';
import { LaunchError } from './launch-error.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { installPackages } from './packages.mjs';
import { inRoot } from './paths.mjs';
import { postgresPrograms } from './postgres-programs.mjs';
import { isStopping, main, run } from './processes.mjs';
import { say } from './steps.mjs';

/** The spreadsheet that the product is compared with. Without it that bench is skipped, and says so. */
async function installSpreadsheet() {
  if (existsSync('/usr/bin/soffice')) return;
  try {
    await installDebian('LibreOffice Calc', ['libreoffice-calc-nogui']);
  } catch (error) {
    if (!(error instanceof LaunchError) || isStopping()) throw error;
    say(`  Note: ${error.message} The comparison with a spreadsheet is skipped.`);
  }
}

await main(
  async () => {
    checkNodeVersion();
    await installPackages();
    await postgresPrograms();
    await installSpreadsheet();
    await removeAbandonedClusters();
    const args = ['--import', 'tsx', inRoot('test', 'bench', 'run.ts'), ...process.argv.slice(2)];
    return (await run(process.execPath, args, { show: true })).code;
  },
  { interruptedCode: 130 },
);
