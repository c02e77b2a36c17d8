/**
 * `npm run dev`: the same database as `npm start`; the server restarts and the browser reloads on
 * each change. The client is served on PORT and passes API calls on to the server.
 */
import { accountTable } from './accounts.mjs';
import { claimDataFolder, openDatabase } from './database.mjs';
import { LaunchError } from './launch-error.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { installPackages } from './packages.mjs';
import { tools } from './paths.mjs';
import { freePort } from './ports.mjs';
import { main, startScript } from './processes.mjs';
import { browserAddress, checkPortIsFree, listenAddress, serverEnvironment, waitUntilReady } from './server.mjs';
import { say, step } from './steps.mjs';

function startApi(port, database) {
  const env = serverEnvironment({ host: '127.0.0.1', port }, database);
  const args = [tools.tsx, 'watch', '--clear-screen=false', 'apps/server/src/server.ts'];
  return startScript('The server', args, { env: { ...env, CLIENT_DIR: undefined } });
}

function startClient({ host, port }, apiPort) {
  const args = [tools.ng, 'serve', `--host=${host}`, `--port=${port}`];
  return startScript("The client's development server", args, { env: { API_PORT: String(apiPort) } });
}

await main(async () => {
  checkNodeVersion();
  const address = listenAddress();
  const folder = claimDataFolder();
  await checkPortIsFree(address);
  await installPackages();
  const database = await openDatabase(folder);
  const apiPort = await freePort();
  const api = startApi(apiPort, database);
  await step('Starting the server', () =>
    waitUntilReady(browserAddress({ host: '127.0.0.1', port: apiPort }), api.ended),
  );
  const client = startClient(address, apiPort);
  // Ready means: the client's server answers and reaches the API behind it.
  await step('Starting the client', () => waitUntilReady(browserAddress(address), client.ended));
  say(`\nLanewright (development) runs at ${browserAddress(address)}, its API at port ${apiPort}.`);
  if (database.accounts.length > 0) say(`\n${accountTable(database.accounts)}`);
  say('\nCtrl-C stops it.');
  throw new LaunchError(await Promise.race([api.ended, client.ended]));
});
