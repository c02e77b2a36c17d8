import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { basename, join } from 'node:path';
import { v7 as newId } from 'uuid';
import { benchServer, type BenchServer } from './bench-server.ts';
import { type Bench, type BenchResult, interleaved, peakMemory, resultOf } from './harness.ts';
import { importRows, writeCsv, writeXlsx } from './import-files.ts';
import { csvFloor, xlsxFloor } from './import-floors.ts';

const ROWS = 50_000;
const ROUNDS = 3;
const MOST_MB = 200;
const FORMATS = [
  { format: 'CSV', extension: 'csv', write: writeCsv, floor: csvFloor, limit: 2, unit: '× csv-parse + COPY + upsert' },
  { format: 'XLSX', extension: 'xlsx', write: writeXlsx, floor: xlsxFloor, limit: 1.5, unit: '× exceljs stream + COPY + upsert' },
] as const;

const folder = mkdtempSync(join(tmpdir(), 'lanewright-imports-'));
process.on('exit', () => rmSync(folder, { recursive: true, force: true }));

async function freshProject({ api, headers }: BenchServer): Promise<string> {
  const id = newId();
  const answer = await fetch(`${api}/projects`, { method: 'POST', headers: { ...headers, 'content-type': 'application/json' }, body: JSON.stringify({ id, name: id }) });
  if (!answer.ok) throw new Error(`A project could not be made: ${answer.status}`);
  return id;
}

/** Uploads and previews a list; gives where to commit it. */
async function upload({ api, headers }: BenchServer, projectId: string, path: string): Promise<string> {
  const form = new FormData();
  form.append('file', new Blob([readFileSync(path)]), basename(path));
  const answer = await fetch(`${api}/projects/${projectId}/imports`, { method: 'POST', headers, body: form });
  const { id, counts } = (await answer.json()) as { id: string; counts: { toCreate: number; problems: number } };
  if (answer.status !== 201 || counts.toCreate !== ROWS || counts.problems > 0) throw new Error(`The list was not read as it should be: ${answer.status} ${JSON.stringify(counts)}`);
  return `${api}/projects/${projectId}/imports/${id}/commit`;
}

async function commit({ headers }: BenchServer, url: string): Promise<void> {
  const answer = await fetch(url, { method: 'POST', headers: { ...headers, 'content-type': 'application/json' }, body: '{}' });
  if (!answer.ok) throw new Error(`The import failed: ${answer.status} ${await answer.text()}`);
}

/** From the kept file to every point and dispenser with its history, every row validated; the upload shows the preview before. */
async function importTimes(): Promise<BenchResult[]> {
  const server = await benchServer();
  const rows = importRows(ROWS);
  const results: BenchResult[] = [];
  for (const { format, extension, write, floor, limit, unit } of FORMATS) {
    const path = join(folder, `list.${extension}`);
    await write(rows, path);
    let prepared = await upload(server, await freshProject(server), path);
    results.push(await interleaved({
      name: `Import of ${ROWS} rows as ${format}, validated and with history`, unit, limit, rounds: ROUNDS,
      floor: async () => floor(server, await freshProject(server), path),
      before: async () => { prepared = await upload(server, await freshProject(server), path); },
      subject: () => commit(server, prepared),
    }));
  }
  return results;
}

/** What reading, checking and writing a list take in a server process of their own, beside what it takes idle. */
async function importMemory(): Promise<BenchResult[]> {
  const server = await benchServer();
  const script = join(import.meta.dirname, 'import-process.ts');
  const env = { DATABASE_APP_URL: server.appUrl, DATABASE_AUTH_URL: server.authUrl, COOKIE: server.headers['cookie'] };
  const idleMb = await peakMemory(script, [], env);
  const results: BenchResult[] = [];
  for (const { format, extension, write } of FORMATS) {
    const path = join(folder, `list.${extension}`);
    await write(importRows(ROWS), path);
    const mb = await peakMemory(script, [path, await freshProject(server)], env);
    const note = `${mb.toFixed(0)} MB with the server itself, ${idleMb.toFixed(0)} MB for that alone`;
    results.push(resultOf({ name: `Import of ${ROWS} rows as ${format}, memory`, unit: 'MB', limit: MOST_MB }, Math.max(0, mb - idleMb), note));
  }
  return results;
}

export const benches: readonly Bench[] = [importTimes, importMemory];
