/**
 * Children of the launcher, and the one place that ends them. Each child leads a process group of
 * its own, so that Ctrl-C in a terminal reaches the launcher alone and it stops things in order.
 */
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { pathToFileURL } from 'node:url';
import { LaunchError } from './launch-error.mjs';
import { inRoot, root } from './paths.mjs';
import { say } from './steps.mjs';

const GRACE_MS = 10_000;
const PARENT_CHECK_MS = 500;

/** @type {Array<() => Promise<void> | void>} undone in reverse order */
const undo = [];
/** @type {Map<import('node:child_process').ChildProcess, boolean>} child → may be interrupted */
const passing = new Map();
/** @type {Promise<void> | undefined} */
let stopping;

/**
 * Registers what must be undone when the launcher ends. Register before doing, so that an
 * interruption in between is covered; the function must bear being called with nothing to undo.
 *
 * @param {() => Promise<void> | void} action
 */
export const whenStopping = (action) => void undo.push(action);

/** @returns {boolean} whether the launcher is on its way out */
export const isStopping = () => stopping !== undefined;

/**
 * The environment children get: NODE_ENV would make npm and the builders leave out what we need.
 *
 * @param {Record<string, string | undefined>} extra
 * @returns {NodeJS.ProcessEnv}
 */
export function childEnvironment(extra = {}) {
  const env = { ...process.env, NG_CLI_ANALYTICS: 'false', ...extra };
  delete env.NODE_ENV;
  return env;
}

/**
 * Runs a command to its end.
 *
 * @param {string} command
 * @param {string[]} args
 * @param {object} [options]
 * @param {Record<string, string | undefined>} [options.env] added to the launcher's own
 * @param {NodeJS.ProcessEnv} [options.exactEnv] instead of the launcher's own
 * @param {string} [options.cwd]
 * @param {number} [options.uid]
 * @param {number} [options.gid]
 * @param {boolean} [options.show] pass output straight through instead of keeping it
 * @param {(line: string) => void} [options.onLine] sees each line of stderr (and stdout)
 * @param {boolean} [options.finish] an interruption waits for it instead of ending it
 * @param {boolean} [options.whileStopping] part of the clean-up itself
 * @returns {Promise<{ code: number, stdout: string, output: string }>} code 128 for a signal;
 *   `output` is stdout and stderr as they came
 * @throws {LaunchError} when the command cannot be started, or the launcher is stopping
 */
export async function run(command, args, options = {}) {
  if (isStopping() && !options.whileStopping) throw new LaunchError('Stopped.');
  const child = spawn(command, args, {
    cwd: options.cwd ?? root,
    env: options.exactEnv ?? childEnvironment(options.env),
    uid: options.uid,
    gid: options.gid,
    detached: true,
    stdio: options.show ? ['ignore', 'inherit', 'inherit'] : ['ignore', 'pipe', 'pipe'],
  });
  passing.set(child, !options.finish && !options.whileStopping);
  try {
    return await collect(child, command, options.onLine);
  } finally {
    passing.delete(child);
  }
}

/** Like {@link run}, but a failure throws with the end of the command's output. */
export async function runOrFail(what, command, args, options = {}) {
  const result = await run(command, args, options);
  if (result.code === 0) return result;
  if (isStopping() && !options.whileStopping) throw new LaunchError('Stopped.');
  const tail = result.output.trimEnd().split('\n').slice(-40).join('\n');
  throw new LaunchError(`${what} failed (code ${result.code}).${tail && `\n\n${tail}`}`);
}

async function collect(child, command, onLine) {
  let stdout = '';
  let output = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream?.setEncoding('utf8').on('data', (text) => {
      if (stream === child.stdout) stdout += text;
      output += text;
      for (const line of text.split('\n')) if (line.trim()) onLine?.(line.trim());
    });
  }
  try {
    const [code] = await once(child, 'close');
    return { code: code ?? 128, stdout, output };
  } catch (error) {
    throw new LaunchError(`${command} could not be started: ${error.message}`);
  }
}

/**
 * Starts a long-running Node script that ends with the launcher, even if that is killed.
 *
 * @param {string} name for messages
 * @param {string[]} args script and its arguments
 * @param {{ env?: Record<string, string | undefined>, output?: 'inherit' | 'ignore' | number }} [options]
 * @returns {{ ended: Promise<string>, stop: () => Promise<void> }} `ended` tells how it ended
 */
export function startScript(name, args, { env, output = 'inherit' } = {}) {
  if (isStopping()) throw new LaunchError('Stopped.');
  const preload = pathToFileURL(inRoot('apps', 'launcher', 'end-with-launcher.mjs')).href;
  const child = spawn(process.execPath, ['--import', preload, ...args], {
    cwd: root,
    env: childEnvironment(env),
    detached: true,
    stdio: ['ignore', output, output, 'ipc'],
  });
  const ended = new Promise((resolve) => {
    child.once('error', (error) => resolve(`${name} could not be started: ${error.message}`));
    child.once('exit', (code, signal) => resolve(`${name} ended (${signal ?? `code ${code}`}).`));
  });
  const stop = () => endGroup(child);
  whenStopping(stop);
  return { ended, stop };
}

async function endGroup(child) {
  if (!isAlive(child)) return;
  const gone = once(child, 'exit');
  signalGroup(child, 'SIGTERM');
  const patience = setTimeout(() => signalGroup(child, 'SIGKILL'), GRACE_MS);
  await gone;
  clearTimeout(patience);
}

const isAlive = (child) => child.pid !== undefined && child.exitCode === null && child.signalCode === null;

function signalGroup(child, signal) {
  try {
    process.kill(-child.pid, signal);
  } catch (error) {
    if (error.code !== 'ESRCH') throw error;
  }
}

/** Ends all children and undoes all that was registered, once, last first. */
export function stopAll() {
  stopping ??= (async () => {
    const waits = [...passing].map(([child, mayInterrupt]) =>
      mayInterrupt ? endGroup(child) : isAlive(child) && once(child, 'exit'),
    );
    await Promise.all(waits);
    for (const action of undo.reverse()) {
      try {
        await action();
      } catch (error) {
        say(error instanceof LaunchError ? error.message : String(error.stack));
      }
    }
  })();
  return stopping;
}

/**
 * Runs a launcher command: signals and failures lead to one clean end.
 *
 * @param {() => Promise<number | void>} work its number becomes the exit code
 * @param {{ interruptedCode?: number }} [options] exit code after Ctrl-C
 */
export async function main(work, { interruptedCode = 0 } = {}) {
  const interrupt = () => {
    if (isStopping()) return;
    say('\nStopping …');
    void stopAll().then(() => {
      say('Stopped.');
      process.exit(interruptedCode);
    });
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, interrupt);
  whenNpmEnds(interrupt);
  let code = 1;
  try {
    code = (await work()) ?? 0;
  } catch (error) {
    // After an interruption every pending step fails: the signal handler ends the process.
    if (isStopping()) return;
    say(`\n${error instanceof LaunchError ? error.message : error.stack}`);
  }
  if (isStopping()) return;
  await stopAll();
  process.exit(code);
}

/** `kill` of npm ends npm and its shell, but not what the shell runs: their end is our signal. */
function whenNpmEnds(interrupt) {
  if (!process.env.npm_lifecycle_event) return;
  const parent = process.ppid;
  setInterval(() => process.ppid !== parent && interrupt(), PARENT_CHECK_MS).unref();
}
