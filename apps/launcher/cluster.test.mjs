import assert from 'node:assert/strict';
import { chmodSync, existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { after, before, describe, test } from 'node:test';
import { setTimeout as sleep } from 'node:timers/promises';
import { removeAbandonedClusters, startCluster } from './cluster.mjs';
import { clusterFolder, removeFolder, temporaryFolder } from './cluster-folder.mjs';
import { isRunning } from './lock.mjs';
import { clusterAccount, postgresPrograms } from './postgres-programs.mjs';
import { run } from './processes.mjs';

const account = clusterAccount();
const password = 'an-invented-password';
const dir = temporaryFolder(account);
/** Tests need no durable disk; that one starts durable is looked at once. */
const options = { dir, password, durable: false };

async function ask(url, sql) {
  const psql = join(await postgresPrograms(), 'psql');
  const { code, output } = await run(psql, ['-w', url, '-AtXc', sql]);
  return { code, text: output.trim() };
}

const serverPid = () => Number.parseInt(readFileSync(join(dir, 'data', 'postmaster.pid'), 'utf8'), 10);

async function killServer() {
  const pid = serverPid();
  process.kill(pid, 'SIGKILL');
  while (isRunning(pid)) await sleep(20);
}

describe('cluster', () => {
  /** @type {Awaited<ReturnType<typeof startCluster>>} */
  let cluster;
  before(async () => (cluster = await startCluster(options)));
  after(async () => {
    await cluster.stop();
    removeFolder(dir);
  });

  test('listens on loopback only and asks for the password', async () => {
    const settings = "select current_setting('listen_addresses') || current_setting('unix_socket_directories')";
    assert.deepEqual(await ask(cluster.adminUrl, settings), { code: 0, text: '127.0.0.1' });
    const refused = await ask(cluster.adminUrl.replace(password, 'wrong'), 'select 1');
    assert.match(refused.text, /password authentication failed/);
    const rules = 'select count(*) from pg_hba_file_rules where auth_method is distinct from $$scram-sha-256$$';
    assert.equal((await ask(cluster.adminUrl, rules)).text, '0');
    assert.equal(statSync(dir).mode & 0o777, 0o700);
    assert.equal(existsSync(join(dir, 'password')), false);
  });

  test('keeps data and port from start to start', async () => {
    await ask(cluster.adminUrl, 'create table kept as select 42 as answer');
    const { port } = cluster;
    await cluster.stop();
    cluster = await startCluster({ ...options, durable: true });
    assert.equal(cluster.port, port);
    assert.equal((await ask(cluster.adminUrl, 'table kept')).text, '42');
    assert.equal((await ask(cluster.adminUrl, 'show fsync')).text, 'on');
  });

  test('moves to another port when somebody has taken its own', async () => {
    await cluster.stop();
    const other = createServer().listen(cluster.port, '127.0.0.1');
    const moved = await startCluster(options);
    other.close();
    assert.notEqual(moved.port, cluster.port);
    cluster = moved;
    assert.equal((await ask(cluster.adminUrl, 'table kept')).text, '42');
  });

  test('recovers after its server was killed', async () => {
    await killServer();
    cluster = await startCluster(options);
    assert.equal((await ask(cluster.adminUrl, 'table kept')).text, '42');
  });

  test('takes over from a server that a killed launcher left running', async () => {
    const former = serverPid();
    cluster = await startCluster(options);
    assert.equal(isRunning(former), false);
    assert.equal((await ask(cluster.adminUrl, 'table kept')).text, '42');
  });

  test("is not kept from starting by a stranger with the dead server's number", async () => {
    await killServer();
    const mark = join(dir, 'data', 'postmaster.pid');
    const [, ...rest] = readFileSync(mark, 'utf8').split('\n');
    writeFileSync(mark, [String(process.pid), ...rest].join('\n'));
    cluster = await startCluster(options);
    assert.equal((await ask(cluster.adminUrl, 'table kept')).text, '42');
  });

  test('is stopped twice without complaint', async () => {
    const pid = serverPid();
    await cluster.stop();
    await cluster.stop();
    assert.equal(isRunning(pid), false);
  });

  test('half a cluster, left by an interrupted start, is made anew', async () => {
    const other = temporaryFolder(account);
    mkdirSync(join(other, 'data.new'));
    writeFileSync(join(other, 'data.new', 'PG_VERSION'), '15\n');
    const made = await startCluster({ ...options, dir: other });
    assert.equal((await ask(made.adminUrl, 'select 1')).text, '1');
    await made.stop();
    removeFolder(other);
  });
});

test('a throw-away cluster leaves nothing behind', async () => {
  const cluster = await startCluster({ durable: false });
  assert.equal(existsSync(cluster.dir), true);
  await cluster.stop();
  assert.equal(existsSync(cluster.dir), false);
});

test('what a killed test run left behind is stopped and removed by the next', async () => {
  const script = `import { startCluster } from ${JSON.stringify(new URL('cluster.mjs', import.meta.url).href)};
    console.log((await startCluster({ durable: false })).dir);`;
  const left = (await run(process.execPath, ['--input-type=module', '-e', script])).stdout.trim();
  const pid = Number.parseInt(readFileSync(join(left, 'data', 'postmaster.pid'), 'utf8'), 10);
  await removeAbandonedClusters();
  assert.equal(existsSync(left), false);
  assert.equal(isRunning(pid), false);
});

test('below a folder that only root may enter, the cluster lies elsewhere', { skip: account.uid === undefined }, () => {
  const closed = temporaryFolder({});
  chmodSync(closed, 0o700);
  const data = join(closed, 'clone', '.data');
  mkdirSync(data, { recursive: true });
  const place = clusterFolder(data, account);
  assert.equal(place.moved, true);
  assert.match(place.folder, /^\/var\/lib\/lanewright\/clone-[0-9a-f]{12}$/);
  assert.deepEqual(clusterFolder(data, account), place);
  chmodSync(closed, 0o711);
  assert.deepEqual(clusterFolder(data, account), { folder: join(data, 'postgres'), moved: false });
  removeFolder(closed);
});
