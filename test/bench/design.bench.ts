import { projectResources } from '#contract';
import * as schema from '#schema';
import { getTableColumns } from 'drizzle-orm';
import { request } from 'node:http';
import type postgres from 'postgres';
import { asBenchOrganisation, benchProject, type BenchServer, benchServer } from './bench-server.ts';
import { type Bench, type BenchResult, interleaved } from './harness.ts';

const LANES = 10_000;
const ROUNDS = 5;

/** Columns of a collection as the API names them. */
function columnsOf(name: keyof typeof projectResources): string {
  const columns = getTableColumns(schema[name]) as Record<string, { readonly name: string }>;
  return Object.keys(projectResources[name].Row.properties).map((field) => `"${columns[field].name}" as "${field}"`).join(', ');
}

const snake = (name: string): string => name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);

/** The floor: the same rows by bare `json_agg`, their text in this process. */
async function bareJson({ app, orgId }: BenchServer, projectId: string): Promise<number> {
  let size = 0;
  await asBenchOrganisation(app, orgId, async (tx) => {
    for (const name of Object.keys(projectResources) as (keyof typeof projectResources)[]) {
      const [row] = await tx.unsafe<{ text: string }[]>(
        `select json_agg(r)::text as text from (select ${columnsOf(name)} from ${snake(name)} where project_id = $1) r`, [projectId]);
      size += row.text.length;
    }
  });
  return size;
}

/** Reads an answer to its end as it comes over the wire. */
function fetchBytes(url: string, headers: Readonly<Record<string, string>>): Promise<{ readonly status: number; readonly etag: string; readonly bytes: number }> {
  return new Promise((resolve, reject) => {
    const sent = request(url, { headers }, (answer) => {
      let bytes = 0;
      answer.on('data', (chunk: Buffer) => (bytes += chunk.length));
      answer.on('end', () => resolve({ status: answer.statusCode ?? 0, etag: answer.headers.etag ?? '', bytes }));
    });
    sent.on('error', reject).end();
  });
}

/** As an edit does: what was kept of the design is no longer right. */
const touch = ({ owner, orgId }: BenchServer, projectId: string): Promise<postgres.RowList<postgres.Row[]>> =>
  asBenchOrganisation(owner, orgId, (tx) => tx`update projects set sequence = sequence + 1 where id = ${projectId}`);

async function wholeDesign(): Promise<BenchResult[]> {
  const server = await benchServer();
  const projectId = await benchProject(LANES);
  const url = `${server.api}/projects/${projectId}/design`;
  const read = (encoding: string) => () => fetchBytes(url, { ...server.headers, 'accept-encoding': encoding });
  const floor = () => bareJson(server, projectId);
  const measure = { unit: '× json_agg', limit: 1.3, rounds: ROUNDS, floor };
  const before = () => touch(server, projectId);
  return [
    await interleaved({ ...measure, name: `Design of ${LANES} lanes, uncompressed`, subject: read('identity') }),
    await interleaved({ ...measure, name: `Design of ${LANES} lanes, as served`, subject: read('gzip, br') }),
    await interleaved({ ...measure, name: `Design of ${LANES} lanes, uncompressed, first after an edit`, before, subject: read('identity') }),
    await interleaved({ ...measure, name: `Design of ${LANES} lanes, as served, first after an edit`, before, subject: read('gzip, br') }),
    await unchanged(server, url, projectId),
  ];
}

async function unchanged(server: BenchServer, url: string, projectId: string): Promise<BenchResult> {
  const { etag } = await fetchBytes(url, server.headers);
  return interleaved({
    name: `Design of ${LANES} lanes, unchanged`, unit: '× json_agg', limit: 0.1, rounds: ROUNDS, floor: () => bareJson(server, projectId),
    subject: async () => {
      const { status } = await fetchBytes(url, { ...server.headers, 'if-none-match': etag });
      if (status !== 304) throw new Error(`Answered ${status} to what had not changed`);
    },
  });
}

export const benches: readonly Bench[] = [wholeDesign];
