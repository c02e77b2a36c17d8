/** Starts the built server and waits until it is ready to serve. */
import { closeSync, openSync, renameSync, statSync } from 'node:fs';
import { readIfThere } from './files.mjs';
import { LaunchError } from './launch-error.mjs';
import { clientOutput, serverOutput } from './paths.mjs';
import { isFree } from './ports.mjs';
import { isStopping, startScript } from './processes.mjs';
import { step } from './steps.mjs';

const READY_WITHIN_MS = 60_000;
const PORT_FREE_WITHIN_MS = 3_000;
const POLL_MS = 150;
const LOG_LIMIT_BYTES = 10_000_000;

/**
 * @param {NodeJS.ProcessEnv} [env]
 * @returns {{ host: string, port: number }} where the server shall listen
 * @throws {LaunchError} when PORT is no port
 */
export function listenAddress(env = process.env) {
  const port = Number(env.PORT || 4200);
  if (Number.isInteger(port) && port > 0 && port < 65_536) return { host: env.HOST || '127.0.0.1', port };
  throw new LaunchError(`PORT is "${env.PORT}"; give a number from 1 to 65535, for instance PORT=4200.`);
}

/**
 * @param {{ host: string, port: number }} address
 * @throws {LaunchError} when somebody else listens there
 */
export async function checkPortIsFree({ host, port }) {
  // The server of a launcher that was killed a moment ago may still be on its way out.
  const deadline = Date.now() + PORT_FREE_WITHIN_MS;
  while (Date.now() < deadline) {
    if (await isFree(port, host)) return;
    await new Promise((resolve) => setTimeout(resolve, POLL_MS));
  }
  throw new LaunchError(
    `Port ${port} on ${host} is not to be had: another program listens there, or it is not allowed.\n` +
      `Stop that program, or choose another port: PORT=${port === 65_535 ? 4200 : port + 1} npm start`,
  );
}

/**
 * What the server reads from its environment.
 *
 * @param {{ host: string, port: number }} address
 * @param {{ appUrl: string, authUrl: string, jwtSecret: string }} database
 */
export const serverEnvironment = ({ host, port }, { appUrl, authUrl, jwtSecret }) => ({
  PORT: String(port),
  HOST: host,
  DATABASE_APP_URL: appUrl,
  DATABASE_AUTH_URL: authUrl,
  JWT_SECRET: jwtSecret,
  CLIENT_DIR: clientOutput,
});

/** @returns {string} the address for a browser on this machine */
export function browserAddress({ host, port }) {
  const name = host === '0.0.0.0' || host === '::' ? 'localhost' : host;
  return `http://${name.includes(':') ? `[${name}]` : name}:${port}`;
}

/**
 * @param {{ host: string, port: number }} address
 * @param {{ appUrl: string, authUrl: string, jwtSecret: string }} database
 * @param {string} logPath file that takes the server's log
 * @returns {Promise<{ url: string, ended: Promise<string>, stop: () => Promise<void> }>} `ended`
 *   tells how it ended, with the end of the log
 */
export async function startServer(address, database, logPath) {
  const url = browserAddress(address);
  const env = serverEnvironment(address, database);
  return step('Starting the server', async () => {
    const log = openLog(logPath);
    const child = startScript('The server', ['--enable-source-maps', serverOutput], { env, output: log });
    closeSync(log);
    const ended = child.ended.then((how) => `${how} The end of ${logPath}:\n\n${endOf(logPath)}`);
    await waitUntilReady(url, ended);
    return { url, ended, stop: child.stop };
  });
}

/** A log grown large makes room for a new one; the one before it is kept. */
function openLog(path) {
  if ((statSync(path, { throwIfNoEntry: false })?.size ?? 0) > LOG_LIMIT_BYTES) renameSync(path, `${path}.1`);
  return openSync(path, 'a', 0o600);
}

const endOf = (path) => (readIfThere(path) ?? '').trimEnd().split('\n').slice(-20).join('\n');

/**
 * @param {string} url the server's address
 * @param {Promise<string>} ended tells that it ended, and how
 * @throws {LaunchError} when it ends, or is not ready in time
 */
export async function waitUntilReady(url, ended) {
  let end;
  void ended.then((how) => (end = how));
  const deadline = Date.now() + READY_WITHIN_MS;
  while (!(await isHealthy(url))) {
    if (end !== undefined || isStopping()) throw new LaunchError(end ?? 'Stopped.');
    if (Date.now() > deadline) throw new LaunchError(`${url} was not ready within ${READY_WITHIN_MS / 1_000} s.`);
    await new Promise((resolve) => setTimeout(resolve, POLL_MS));
  }
}

async function isHealthy(url) {
  try {
    const answer = await fetch(`${url}/api/health`, { signal: AbortSignal.timeout(2_000) });
    return answer.status === 200;
  } catch {
    return false;
  }
}
