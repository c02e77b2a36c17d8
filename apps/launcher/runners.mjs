/** The runners of `npm test`, in order. Each gives its totals; none minds how the others fared. */
import { mkdirSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { buildAll } from './build.mjs';
import { startCluster } from './cluster.mjs';
import { setUpDatabase } from './database.mjs';
import { readIfThere } from './files.mjs';
import { inRoot, tools } from './paths.mjs';
import { freePort } from './ports.mjs';
import { run, whenStopping } from './processes.mjs';
import { loadSecrets } from './secrets.mjs';
import { startServer } from './server.mjs';
import { say } from './steps.mjs';
import { fromPlaywright, fromTap, fromVitest, judge } from './totals.mjs';

/**
 * @typedef {{ folder: string }} Workspace holds a temporary folder for reports and secrets
 * @typedef {import('./totals.mjs').Totals & { problem?: string }} Outcome
 * @typedef {{ name: string, title: string, run: (workspace: Workspace) => Promise<Outcome> }} Runner
 */

/** Runs a Node script that writes a report. */
async function withReport(args, report, parse, env) {
  const { code } = await run(process.execPath, args, { show: true, env });
  const text = readIfThere(report);
  return judge(text === undefined ? undefined : parse(text), code);
}

/** A check without tests of its own counts as one. */
const asOne = (ok) => ({ passed: ok ? 1 : 0, failed: ok ? 0 : 1, skipped: 0 });

async function lint() {
  return asOne((await run(process.execPath, [tools.eslint, '.'], { show: true })).code === 0);
}

/** The client's types and templates are checked by building it. */
async function types() {
  const { code } = await run(process.execPath, [tools.tsc, '-p', 'tsconfig.json'], { show: true });
  await buildAll();
  return asOne(code === 0);
}

function client({ folder }) {
  const report = join(folder, 'client.json');
  // The output file belongs to the reporter named first.
  const args = ['test', '--progress=false', '--reporters=json', `--output-file=${report}`, '--reporters=default'];
  return withReport([tools.ng, ...args], report, (text) => fromVitest(JSON.parse(text)));
}

/** @param {string} project of vitest.config.ts */
const vitest = (project, env) => (workspace) => {
  const report = join(workspace.folder, `${project}.json`);
  const args = ['run', `--project=${project}`, '--reporter=dot', '--reporter=json', `--outputFile.json=${report}`];
  return withReport([tools.vitest, ...args], report, (text) => fromVitest(JSON.parse(text)), env?.());
};

/** Runs a Vitest project against a cluster of its own. */
const vitestWithDatabase = (project) => (workspace) =>
  withCluster((adminUrl) => vitest(project, () => ({ TEST_ADMIN_URL: adminUrl }))(workspace));

async function withCluster(work) {
  const cluster = await startCluster({ durable: false });
  whenStopping(cluster.stop);
  try {
    return await work(cluster.adminUrl);
  } finally {
    await cluster.stop();
  }
}

async function launcher({ folder }) {
  const report = join(folder, 'launcher.tap');
  const here = inRoot('apps', 'launcher');
  const files = readdirSync(here).filter((name) => name.endsWith('.test.mjs'));
  // Given no file, Node would look for some itself, and take test.mjs, which runs us, for one.
  if (files.length === 0) return judge(fromTap(''), 0);
  const reporters = ['spec', 'stdout', 'tap', report].map((value, i) =>
    i % 2 === 0 ? `--test-reporter=${value}` : `--test-reporter-destination=${value}`,
  );
  return withReport(['--test', ...reporters, ...files.map((name) => join(here, name))], report, fromTap);
}

/** The built server with the demo, in a cluster of its own, as `npm start` would run it. */
async function endToEnd({ folder }) {
  await buildAll();
  return withCluster(async (adminUrl) => {
    const secrets = loadSecrets(folder);
    const database = await setUpDatabase(adminUrl, secrets.path);
    const address = { host: '127.0.0.1', port: await freePort() };
    mkdirSync(inRoot('test-results'), { recursive: true });
    const log = inRoot('test-results', 'server.log');
    rmSync(log, { force: true });
    const server = await startServer(address, { ...database, jwtSecret: secrets.jwtSecret }, log);
    try {
      return await playwright(folder, server.url, database.accounts);
    } finally {
      await server.stop();
      say(`  The server's log: ${log}`);
    }
  });
}

function playwright(folder, url, accounts) {
  const report = join(folder, 'e2e.json');
  const env = { BASE_URL: url, E2E_ACCOUNTS: JSON.stringify(accounts), PLAYWRIGHT_JSON_OUTPUT_NAME: report };
  // A part of them for those who work on it, for instance E2E_FILES=guide.
  const files = (process.env.E2E_FILES ?? '').split(' ').filter(Boolean);
  const args = [tools.playwright, 'test', ...files, '--reporter=list,json'];
  return withReport(args, report, (text) => fromPlaywright(JSON.parse(text)), env);
}

/** @type {readonly Runner[]} */
export const runners = [
  { name: 'lint', title: 'Lint', run: lint },
  { name: 'types', title: 'Type check and build', run: types },
  { name: 'client', title: 'Client unit tests', run: client },
  { name: 'libs', title: 'Library unit tests', run: vitest('libs') },
  { name: 'server', title: 'Server unit tests', run: vitestWithDatabase('server') },
  { name: 'reference', title: 'Reference tests', run: vitest('reference') },
  { name: 'integration', title: 'Integration tests', run: vitestWithDatabase('integration') },
  { name: 'launcher', title: 'Launcher tests', run: launcher },
  { name: 'e2e', title: 'End-to-end tests', run: endToEnd },
];
