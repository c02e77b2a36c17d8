import type { ImportPreview, ImportResult } from '#contract';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ImportProject, seedTerminal } from '#support/import-project.ts';
import { type MutatedFile, mutatedFiles } from '#support/mutated-files.ts';
import { runs } from '#support/property-runs.ts';
import { type TestApp, testApp } from '#support/test-app.ts';

/** A quarter in every test run, all of them in `npm run verify`. */
const FILES = Math.min(2000, runs(500));
const AT_ONCE = 4;
const COMMIT_EVERY = 10;
const SEED = 20_261_201;
/** Far below what 2,000 leaks of a file's size would take, above what a collector may leave lying about. */
const MOST_MB = 600;

let app: TestApp;
let project: ImportProject;

beforeAll(async () => {
  app = await testApp();
  project = await ImportProject.create(await app.as('engineer'), (await seedTerminal(app)).project.id);
});
afterAll(() => app.close());

/** Uploads one file; what can be read is committed now and then. Gives what went wrong. */
async function faultOf({ name, bytes }: MutatedFile, index: number): Promise<string[]> {
  const answer = await project.engineer.post(`${project.url}/imports`).attach('file', bytes, name.replace(/^.*\//, ''));
  if (![201, 413, 422].includes(answer.status)) return [`${index} ${name}: ${answer.status}`];
  if (answer.status !== 201 || index % COMMIT_EVERY !== 0) return [];
  const { id, counts } = answer.body as ImportPreview;
  const commit = await project.engineer.post(`${project.url}/imports/${id}/commit`).send({});
  if (![200, 409, 412, 422].includes(commit.status)) return [`${index} ${name}: commit ${commit.status}`];
  const { created } = commit.body as ImportResult;
  if (commit.status === 200) pointsCreated += created;
  return commit.status === 200 && created > counts.toCreate ? [`${index} ${name}: created ${created} of ${counts.toCreate}`] : [];
}
let pointsCreated = 0;

describe(`${FILES} broken files`, () => {
  it('are each read or refused, never half imported, in bounded memory, while others are answered', async () => {
    const files = mutatedFiles(FILES, SEED);
    const faults: string[] = [];
    let index = 0;
    let done = false;
    const worker = async () => {
      for (;;) {
        const next = await files.next();
        if (next.done) return;
        faults.push(...(await faultOf(next.value, index++)));
      }
    };
    const other = app.stranger();
    let answered = 0;
    const pings = (async () => {
      while (!done) {
        if ((await other.get('/api/v1/auth/session')).status === 401) answered += 1;
        await new Promise((resolve) => setTimeout(resolve, 50));
      }
    })();
    const before = process.memoryUsage().rss;
    await Promise.all(Array.from({ length: AT_ONCE }, worker)).finally(() => { done = true; });
    await pings;
    expect(faults).toEqual([]);
    expect(index).toBe(FILES);
    expect(answered).toBeGreaterThan(index / 50);
    expect((process.memoryUsage().rss - before) / 1e6).toBeLessThan(MOST_MB);
    // Whole imports or none: every point has its dispenser, and there are as many as the answers said.
    const { points, dispensers } = await project.design();
    expect([points.length, dispensers.length]).toEqual([pointsCreated, pointsCreated]);
  }, FILES * 1000);
});
