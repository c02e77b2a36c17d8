/** Progress lines: what the launcher does, and how long it took. */

const FIRST_NOTICE_MS = 1_000;
const NEXT_NOTICES_MS = 10_000;

/** @param {string} line */
export const say = (line) => process.stdout.write(`${line}\n`);

/**
 * Runs a piece of work under a title. A long one announces itself and then gives a sign of life
 * every ten seconds, so that nobody takes a slow machine for a hung one.
 *
 * @template T
 * @param {string} title such as `Building the client`
 * @param {(detail: (text: string) => void) => Promise<T> | T} work may report what it is at
 * @returns {Promise<T>}
 */
export async function step(title, work) {
  const started = Date.now();
  const seconds = () => `${((Date.now() - started) / 1_000).toFixed(1)} s`;
  let latest = '';
  const first = setTimeout(() => say(`  … ${title}`), FIRST_NOTICE_MS);
  const next = setInterval(() => say(`    ${seconds()}${latest && `: ${latest}`}`), NEXT_NOTICES_MS);
  try {
    const result = await work((text) => (latest = text));
    say(`  ✓ ${title} (${seconds()})`);
    return result;
  } catch (error) {
    say(`  ✗ ${title} (${seconds()})`);
    throw error;
  } finally {
    clearTimeout(first);
    clearInterval(next);
  }
}
