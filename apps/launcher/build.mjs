/** Builds client and server, each only when its sources differ from those of the last build. */
import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fingerprint, readIfThere, writeWhole } from './files.mjs';
import { clientOutput, inRoot, root, serverOutput, tools } from './paths.mjs';
import { runOrFail } from './processes.mjs';
import { step } from './steps.mjs';

const SHARED = ['libs', 'package.json', 'package-lock.json', 'tsconfig.base.json', 'tsconfig.json'];

const client = {
  title: 'Building the client',
  sources: ['apps/client', 'angular.json', ...SHARED],
  output: join(clientOutput, 'index.html'),
  stamp: join(dirname(clientOutput), 'sources.sha256'),
  /** @param {(line: string) => void} detail */
  build: (detail) =>
    runOrFail('ng build', process.execPath, [tools.ng, 'build', '--progress=false'], { onLine: detail }),
};

const server = {
  title: 'Building the server',
  sources: ['apps/server', 'db/schema', ...SHARED],
  output: serverOutput,
  stamp: join(dirname(serverOutput), 'sources.sha256'),
  build: () =>
    runOrFail('esbuild', inRoot('node_modules', '.bin', 'esbuild'), [
      'apps/server/src/server.ts',
      'apps/server/src/task-worker.ts',
      '--bundle',
      '--platform=node',
      '--format=esm',
      '--target=node20',
      '--packages=external',
      '--sourcemap',
      '--log-level=warning',
      `--outdir=${dirname(serverOutput)}`,
    ]),
};

/**
 * @param {{ sources: readonly string[], output: string, stamp: string }} part
 * @param {string} [base] repository root
 * @returns {boolean} whether the output exists and was built from these very sources
 */
export function isFresh(part, base = root) {
  return existsSync(part.output) && readIfThere(part.stamp) === fingerprint(base, part.sources);
}

/** Builds what is out of date. */
export async function buildAll() {
  for (const part of [client, server]) {
    // Taken before the build: what is edited meanwhile counts as newer.
    const sources = fingerprint(root, part.sources);
    if (existsSync(part.output) && readIfThere(part.stamp) === sources) continue;
    await step(part.title, part.build);
    writeWhole(part.stamp, sources);
  }
}
