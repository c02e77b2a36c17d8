/** `npm start`: from a fresh clone to a running Lanewright. */
import { join } from 'node:path';
import { accountTable } from './accounts.mjs';
import { buildAll } from './build.mjs';
import { claimDataFolder, openDatabase } from './database.mjs';
import { LaunchError } from './launch-error.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { installPackages } from './packages.mjs';
import { main } from './processes.mjs';
import { checkPortIsFree, listenAddress, startServer } from './server.mjs';
import { say } from './steps.mjs';

await main(async () => {
  checkNodeVersion();
  const address = listenAddress();
  const folder = claimDataFolder();
  await checkPortIsFree(address);
  await installPackages();
  const database = await openDatabase(folder);
  await buildAll();
  const log = join(folder, 'server.log');
  const server = await startServer(address, database, log);
  say(`\nLanewright runs at ${server.url}`);
  if (database.accounts.length > 0) say(`\n${accountTable(database.accounts)}`);
  say(`\nIts log is ${log}. Ctrl-C stops it.`);
  throw new LaunchError(await server.ended);
});
