import assert from 'node:assert/strict';
import { createServer } from 'node:net';
import { once } from 'node:events';
import { test } from 'node:test';
import { accountTable } from './accounts.mjs';
import { readAnswer } from './database.mjs';
import { browserAddress, checkPortIsFree, listenAddress } from './server.mjs';

test('listens on port 4200 of this machine when nothing else is said', () => {
  assert.deepEqual(listenAddress({}), { host: '127.0.0.1', port: 4200 });
  assert.deepEqual(listenAddress({ PORT: '8080', HOST: '0.0.0.0' }), { host: '0.0.0.0', port: 8080 });
});

test('refuses a port that is none', () => {
  for (const PORT of ['http', '-1', '70000', '1.5']) {
    assert.throws(() => listenAddress({ PORT }), /give a number from 1 to 65535/);
  }
});

test('a taken port is reported with another one to try', async () => {
  const other = createServer().listen(0, '127.0.0.1');
  await once(other, 'listening');
  const { port } = other.address();
  await assert.rejects(checkPortIsFree({ host: '127.0.0.1', port }), new RegExp(`PORT=${port + 1} npm start`));
  other.close();
});

test('names an address that a browser on this machine can open', () => {
  assert.equal(browserAddress({ host: '0.0.0.0', port: 1 }), 'http://localhost:1');
  assert.equal(browserAddress({ host: '::1', port: 2 }), 'http://[::1]:2');
});

test('reads the last line of the set-up as its answer', () => {
  const answer = { appUrl: 'a', authUrl: 'b', ownerUrl: 'c', accounts: [] };
  assert.deepEqual(readAnswer(`something else\n${JSON.stringify(answer)}\n`), answer);
  assert.throws(() => readAnswer('nothing'), /did not end with the connection URLs/);
});

test('lists the accounts in columns', () => {
  const accounts = [
    { role: 'engineer', email: 'e@one.example', password: 'p' },
    { role: 'viewer', email: 'v@one.example', password: 'q' },
  ];
  assert.match(accountTable(accounts), /\n {4}engineer {2}e@one\.example {2}p\n {4}viewer {4}v@one\.example {2}q$/);
});
