/**
 * `npm test`: every check, with nothing running beforehand. For a part of it, name runners:
 * `npm test -- --only libs,integration`.
 */
import { existsSync, mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { delimiter, join } from 'node:path';
import { removeAbandonedClusters } from './cluster.mjs';
import { removeFolder } from './cluster-folder.mjs';
import { installDebian } from './debian.mjs';
import { LaunchError } from './launch-error.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { installPackages } from './packages.mjs';
import { postgresPrograms } from './postgres-programs.mjs';
import { isStopping, main, whenStopping } from './processes.mjs';
import { runners } from './runners.mjs';
import { say } from './steps.mjs';
import { sum, totalsLine } from './totals.mjs';

/** Outside judges: where they cannot be had, tests fall back on recorded results and say so. */
const JUDGES = ['ngspice', 'units'];

/** @param {string[]} args of the command line */
function chosenRunners(args) {
  if (args.length === 0) return runners;
  const names = args[0] === '--only' ? (args[1] ?? '').split(',') : [];
  const chosen = runners.filter((runner) => names.includes(runner.name));
  if (args.length === 2 && chosen.length === names.length) return chosen;
  const known = runners.map((runner) => runner.name).join(', ');
  throw new LaunchError(`Usage: npm test [-- --only NAME[,NAME…]], where NAME is one of: ${known}`);
}

const isInstalled = (program) =>
  (process.env.PATH ?? '').split(delimiter).some((folder) => folder !== '' && existsSync(join(folder, program)));

/** What cannot be installed is said here; the runner that needs it fails by itself. */
async function installPrograms(names) {
  const wants = (...of) => of.some((name) => names.includes(name));
  if (wants('server', 'integration', 'launcher', 'e2e')) await tryTo(postgresPrograms);
  if (wants('e2e') && !existsSync(process.env.CHROMIUM_PATH ?? '/usr/bin/chromium')) {
    await tryTo(() => installDebian('Chromium', ['chromium']));
  }
  if (!wants('reference')) return;
  for (const judge of JUDGES.filter((program) => !isInstalled(program))) {
    await tryTo(() => installDebian(judge, [judge]), `Recorded results stand in for ${judge}.`);
  }
}

async function tryTo(install, consequence = '') {
  try {
    await install();
  } catch (error) {
    if (!(error instanceof LaunchError) || isStopping()) throw error;
    say(`  Note: ${error.message} ${consequence}`);
  }
}

async function runOne(runner, workspace) {
  say(`\n── ${runner.title} ──`);
  const started = Date.now();
  const outcome = await runner.run(workspace).catch((error) => {
    if (isStopping()) throw error;
    say(error instanceof LaunchError ? error.message : error.stack);
    return { passed: 0, failed: 1, skipped: 0, problem: 'could not run' };
  });
  return { ...outcome, title: runner.title, seconds: (Date.now() - started) / 1_000 };
}

function summary(outcomes) {
  const wide = Math.max(...outcomes.map(({ title }) => title.length));
  return outcomes.map((outcome) => {
    const problem = outcome.problem ? ` (${outcome.problem})` : '';
    const mark = outcome.failed > 0 ? '✗' : '✓';
    return `  ${mark} ${outcome.title.padEnd(wide)}  ${totalsLine(outcome)}, ${outcome.seconds.toFixed(1)} s${problem}`;
  });
}

await main(
  async () => {
    checkNodeVersion();
    const chosen = chosenRunners(process.argv.slice(2));
    await installPackages();
    await installPrograms(chosen.map((runner) => runner.name));
    await tryTo(removeAbandonedClusters);
    const folder = mkdtempSync(join(tmpdir(), 'lanewright-test-'));
    whenStopping(() => removeFolder(folder));
    const outcomes = [];
    for (const runner of chosen) outcomes.push(await runOne(runner, { folder }));
    const total = sum(outcomes);
    say(`\n${summary(outcomes).join('\n')}\n\n${totalsLine(total)}`);
    return total.failed > 0 ? 1 : 0;
  },
  { interruptedCode: 130 },
);
