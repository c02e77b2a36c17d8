/** Debian packages: installed when we are root on a Debian, else the person is told the command. */
import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { LaunchError } from './launch-error.mjs';
import { runOrFail } from './processes.mjs';
import { step } from './steps.mjs';

const OPTIONS = ['-y', '-qq', '--no-install-recommends', '-o', 'DPkg::Lock::Timeout=300'];
/** Read by Debian's PostgreSQL scripts; ours lies there during the installation only. */
const CLUSTER_RULES = '/etc/postgresql-common/createcluster.d';

const isRoot = () => process.getuid?.() === 0;
const hasApt = () => existsSync('/usr/bin/apt-get');

/** The index is fetched once a run, however many packages follow. */
let indexFetched = false;

/**
 * @param {string} purpose for the messages, such as `PostgreSQL`
 * @param {string[]} packages names in Debian
 * @throws {LaunchError} when it may not or cannot be done, with the command to use
 */
export async function installDebian(purpose, packages) {
  if (!isRoot() || !hasApt()) throw new LaunchError(`${purpose} is not installed. ${advice(packages)}`);
  await step(`Installing ${purpose} (Debian: ${packages.join(' ')})`, async (detail) => {
    const env = { DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' };
    if (!indexFetched) {
      const update = ['-qq', '-o', 'DPkg::Lock::Timeout=300', 'update'];
      await runOrFail('apt-get update', 'apt-get', update, { env, onLine: detail });
      indexFetched = true;
    }
    // Not interrupted: half an installation would have to be repaired by hand.
    const options = { env, onLine: detail, finish: true };
    const install = () => runOrFail('apt-get install', 'apt-get', [...OPTIONS, 'install', ...packages], options);
    await (packages.includes('postgresql') ? withoutSystemCluster(install) : install());
  });
}

function advice(packages) {
  if (!hasApt()) return "Install it with the system's package manager, then run the command again.";
  return `Run this once, then the command again:\n  sudo apt-get update && sudo apt-get install -y ${packages.join(' ')}`;
}

/** Keeps Debian's package from making and starting a database cluster of its own on port 5432. */
async function withoutSystemCluster(install) {
  const rule = `${CLUSTER_RULES}/lanewright.conf`;
  mkdirSync(CLUSTER_RULES, { recursive: true });
  writeFileSync(rule, 'create_main_cluster = false\n');
  try {
    return await install();
  } finally {
    rmSync(rule, { force: true });
  }
}
