/** `npm run seed -- --lanes N`: makes a generated project in the database of `npm start`, whether that runs or not. */
import { existsSync } from 'node:fs';
import { runningCluster } from './cluster.mjs';
import { clusterFolder } from './cluster-folder.mjs';
import { claimDataFolder, openDatabase, readAnswer } from './database.mjs';
import { LaunchError } from './launch-error.mjs';
import { holderOf } from './lock.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { installPackages } from './packages.mjs';
import { dataFolder } from './paths.mjs';
import { clusterAccount } from './postgres-programs.mjs';
import { main, runOrFail } from './processes.mjs';
import { loadSecrets } from './secrets.mjs';
import { seedArguments } from './seed-arguments.mjs';
import { say, step } from './steps.mjs';

/** The database of the launcher that works on the folder; else the folder is claimed and its database started. */
async function openAny() {
  const folder = dataFolder();
  const holder = existsSync(folder) ? holderOf(folder) : undefined;
  return holder === undefined ? openDatabase(claimDataFolder()) : openRunning(folder, holder);
}

function openRunning(folder, holder) {
  const secrets = loadSecrets(folder);
  const cluster = () => runningCluster(clusterFolder(folder, clusterAccount()).folder, secrets.superuserPassword);
  const adminUrl = process.env.DATABASE_URL || cluster();
  if (!adminUrl) {
    throw new LaunchError(`Lanewright (process ${holder}) is starting or stopping, and its database does not run. Try again in a moment.`);
  }
  return step('Opening the database that runs', () => connectionUrls(adminUrl, secrets.path));
}

/** The demo is the running launcher's business: two must not fill the same database at once. */
async function connectionUrls(adminUrl, secretsPath) {
  const env = { DATABASE_ADMIN_URL: adminUrl, LANEWRIGHT_SECRETS: secretsPath };
  const { stdout } = await runOrFail('Opening the database', process.execPath, ['--import', 'tsx', 'db/setup.ts'], { env });
  return readAnswer(stdout);
}

async function seed({ ownerUrl, authUrl }, { lanes, seed: number, organisation, name }) {
  const args = [String(lanes), String(number), organisation, ...(name === undefined ? [] : [name])];
  const env = { DATABASE_OWNER_URL: ownerUrl, DATABASE_AUTH_URL: authUrl };
  const { stdout } = await step(`Generating ${lanes} lanes`, () =>
    runOrFail('Generating the project', process.execPath, ['--import', 'tsx', 'db/seed/generate/main.ts', ...args], { env }),
  );
  return JSON.parse(stdout.trimEnd().split('\n').at(-1));
}

await main(
  async () => {
    checkNodeVersion();
    const wanted = seedArguments(process.argv.slice(2));
    await installPackages();
    const project = await seed(await openAny(), wanted);
    say(`\n${project.organisation} has the project “${project.name}” with ${project.lanes} lanes.`);
  },
  { interruptedCode: 130 },
);
