/** Brings the database to where the server can use it: cluster, roles, migrations, demo. */
import { accessSync, chmodSync, constants, existsSync, mkdirSync, realpathSync } from 'node:fs';
import { startCluster, stopCluster } from './cluster.mjs';
import { clusterFolder } from './cluster-folder.mjs';
import { LaunchError } from './launch-error.mjs';
import { lockFolder } from './lock.mjs';
import { dataFolder } from './paths.mjs';
import { clusterAccount } from './postgres-programs.mjs';
import { runOrFail, whenStopping } from './processes.mjs';
import { loadSecrets } from './secrets.mjs';
import { say, step } from './steps.mjs';

/**
 * @typedef {{ role: string, email: string, password: string }} Account one of the demo's people
 * @typedef {{ appUrl: string, authUrl: string, ownerUrl: string, accounts: Account[] }} Database
 */

/**
 * Makes the data folder if need be and takes it for this launcher.
 *
 * @returns {string} its path
 * @throws {LaunchError} when another launcher has it
 */
export function claimDataFolder() {
  const folder = openDataFolder();
  whenStopping(lockFolder(folder));
  return folder;
}

/**
 * Opens the data folder's database, or the one that DATABASE_URL names.
 *
 * @param {string} folder claimed data folder
 * @returns {Promise<Database & { jwtSecret: string }>}
 */
export async function openDatabase(folder) {
  const secrets = loadSecrets(folder);
  const adminUrl = process.env.DATABASE_URL || (await openCluster(folder, secrets.superuserPassword));
  return { ...(await setUpDatabase(adminUrl, secrets.path)), jwtSecret: secrets.jwtSecret };
}

function openDataFolder() {
  const folder = dataFolder();
  if (!existsSync(folder)) {
    mkdirSync(folder, { recursive: true });
    // Others may pass through (the cluster's user must), not look around.
    chmodSync(folder, 0o711);
  }
  if (!isWritable(folder)) {
    throw new LaunchError(
      `The data folder ${folder} belongs to another user. Run the command as that user, ` +
        'or choose a folder of your own: DATA_DIR=… npm start',
    );
  }
  return realpathSync(folder);
}

function isWritable(folder) {
  try {
    accessSync(folder, constants.R_OK | constants.W_OK | constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

async function openCluster(folder, password) {
  const account = clusterAccount();
  const place = clusterFolder(folder, account);
  if (place.moved) {
    say(`  The user "${account.name}" cannot enter ${folder}; the database lies in ${place.folder} instead.`);
  }
  whenStopping(() => stopCluster(place.folder));
  const isNew = !existsSync(place.folder);
  const title = isNew ? 'Making and starting the database' : 'Starting the database';
  return (await step(title, () => startCluster({ dir: place.folder, password }))).adminUrl;
}

/**
 * Makes roles and tables and, in a new database, the demo.
 *
 * @param {string} adminUrl a superuser's connection URL
 * @param {string} secretsPath file with the passwords of the three roles
 * @returns {Promise<Database>}
 */
export function setUpDatabase(adminUrl, secretsPath) {
  return step('Setting up roles, tables and demo', async (detail) => {
    const { stdout } = await runOrFail(
      'Setting up the database',
      process.execPath,
      ['--import', 'tsx', 'db/setup.ts', '--demo'],
      { env: { DATABASE_ADMIN_URL: adminUrl, LANEWRIGHT_SECRETS: secretsPath }, onLine: detail },
    );
    return readAnswer(stdout);
  });
}

/**
 * @param {string} stdout of db/setup.ts; its last line is JSON
 * @returns {Database}
 */
export function readAnswer(stdout) {
  try {
    const answer = JSON.parse(stdout.trimEnd().split('\n').at(-1) ?? '');
    if (answer.appUrl && answer.authUrl) return { ...answer, accounts: answer.accounts ?? [] };
  } catch {
    // Said below.
  }
  throw new LaunchError(`db/setup.ts did not end with the connection URLs as JSON:\n\n${stdout}`);
}
