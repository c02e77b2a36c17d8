import assert from 'node:assert/strict';
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, test } from 'node:test';
import { holderOf, lockFolder } from './lock.mjs';

let folder = '';
beforeEach(() => (folder = mkdtempSync(join(tmpdir(), 'lanewright-lock-'))));
afterEach(() => rmSync(folder, { recursive: true, force: true }));

test('a second launcher is told the process that runs', () => {
  const release = lockFolder(folder);
  assert.throws(() => lockFolder(folder), new RegExp(`runs already .*process ${process.pid}`));
  release();
  lockFolder(folder)();
  assert.deepEqual(readdirSync(folder), []);
});

test('who holds a folder can be asked', () => {
  assert.equal(holderOf(folder), undefined);
  const release = lockFolder(folder);
  assert.equal(holderOf(folder), process.pid);
  release();
  assert.equal(holderOf(folder), undefined);
});

test('the lock of a process that is gone is replaced', () => {
  const gone = spawnSync(process.execPath, ['--version']).pid;
  writeFileSync(join(folder, 'launcher.lock'), JSON.stringify({ pid: gone, born: '1' }));
  lockFolder(folder)();
});

test(
  'a process that got the number of a dead launcher does not hold its lock',
  { skip: !existsSync('/proc/self/stat') },
  () => {
    writeFileSync(join(folder, 'launcher.lock'), JSON.stringify({ pid: process.pid, born: '1' }));
    lockFolder(folder)();
  },
);

test('half a lock file is replaced', () => {
  writeFileSync(join(folder, 'launcher.lock'), '{"pi');
  lockFolder(folder)();
});
