import { once } from 'node:events';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import postgres from 'postgres';
import { type App, createApp } from '../../apps/server/src/app.ts';
import { createLog } from '../../apps/server/src/platform/log.ts';
import { seedGeneratedProject } from '../../db/seed/generate/seed-project.ts';
import { demoAccounts, demoOrgId, seedDemo } from '../../db/seed/demo.ts';
import { type DatabaseUrls, prepareDatabase } from '../../db/setup.ts';

/** The product on a database of its own, with the demo and somebody signed in. */
export interface BenchServer extends DatabaseUrls {
  /** Address of the API, ending in /api/v1. */
  readonly api: string;
  readonly orgId: string;
  /** Sent along, they make a request the engineer's, over a connection of its own: the server closes idle ones while a floor runs. */
  readonly headers: Readonly<Record<string, string>>;
  readonly owner: postgres.Sql;
  /** As the server connects for requests. */
  readonly app: postgres.Sql;
  close(): Promise<void>;
}

const ORGANISATION = 'Brackwater Terminal';
export const BENCH_JWT_SECRET = 'only for benches: thirty-two characters and more';
const SECRETS = { ownerPassword: 'bench', appPassword: 'bench', authPassword: 'bench' };
let running: Promise<BenchServer> | undefined;
const projects = new Map<number, Promise<string>>();

/** The one server of a run, started when first asked for. */
export const benchServer = (): Promise<BenchServer> => (running ??= start());

/** Id of a generated project of so many lanes, made when first asked for. */
export function benchProject(lanes: number): Promise<string> {
  const known = projects.get(lanes);
  if (known) return known;
  const made = benchServer().then(({ owner, orgId }) => seedGeneratedProject(owner, orgId, { lanes, seed: 1 })).then(({ id }) => id);
  projects.set(lanes, made);
  return made;
}

/** Stops the server, if it was started. */
export async function closeBenchServer(): Promise<void> {
  await (await running)?.close();
}

/** Runs statements with the organisation named, as the server does. */
export const asBenchOrganisation = <T>(sql: postgres.Sql, orgId: string, work: (tx: postgres.TransactionSql) => Promise<T>): Promise<T> =>
  sql.begin(async (tx) => {
    await tx`select set_config('lanewright.org_id', ${orgId}, true)`;
    return work(tx);
  }) as Promise<T>;

async function start(): Promise<BenchServer> {
  const adminUrl = process.env['BENCH_ADMIN_URL'];
  if (!adminUrl) throw new Error('BENCH_ADMIN_URL is not set: start the benches with npm run bench.');
  const urls = await prepareDatabase({ adminUrl, secrets: SECRETS, databaseName: 'lanewright_bench' });
  const [owner, app] = [urls.ownerUrl, urls.appUrl].map((url) => postgres(url, { max: 2, onnotice: () => undefined }));
  await seedDemo(owner);
  const product = await createApp(configOf(urls), createLog('silent'));
  const { origin, stop } = await listen(product);
  return {
    ...urls, api: `${origin}/api/v1`, orgId: demoOrgId(ORGANISATION), headers: { cookie: await signIn(origin), connection: 'close' }, owner, app,
    close: async () => {
      await stop();
      await Promise.all([product.close(), owner.end(), app.end()]);
    },
  };
}

const configOf = ({ appUrl, authUrl }: DatabaseUrls) => ({
  port: 0, host: '127.0.0.1', databaseAppUrl: appUrl, databaseAuthUrl: authUrl, jwtSecret: BENCH_JWT_SECRET, clientDir: null,
});

async function listen({ express }: App): Promise<{ origin: string; stop: () => Promise<void> }> {
  const server = createServer(express).listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  const stop = async () => {
    server.closeAllConnections();
    server.close();
    await once(server, 'close');
  };
  return { origin: `http://127.0.0.1:${port}`, stop };
}

async function signIn(origin: string): Promise<string> {
  const { email, password } = demoAccounts.find(({ role, organisation }) => role === 'engineer' && organisation === ORGANISATION)!;
  const answer = await fetch(`${origin}/api/v1/auth/sign-in`, { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify({ email, password }) });
  if (!answer.ok) throw new Error(`The engineer could not sign in: ${answer.status}`);
  return answer.headers.getSetCookie().map((cookie) => cookie.split(';')[0]).join('; ');
}
