import assert from 'node:assert/strict';
import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, test } from 'node:test';
import { loadSecrets } from './secrets.mjs';

let folder = '';
beforeEach(() => (folder = mkdtempSync(join(tmpdir(), 'lanewright-secrets-'))));
afterEach(() => rmSync(folder, { recursive: true, force: true }));

test('secrets are made once and kept, readable by their owner only', () => {
  const first = loadSecrets(folder);
  assert.deepEqual(loadSecrets(folder), first);
  const { path, ...values } = first;
  assert.equal(statSync(path).mode & 0o777, 0o600);
  assert.equal(new Set(Object.values(values)).size, 5);
  for (const value of Object.values(values)) assert.match(value, /^[0-9a-f]{64}$/);
});

test('a secret that is missing is added; the others stay', () => {
  writeFileSync(join(folder, 'secrets.json'), JSON.stringify({ appPassword: 'kept' }));
  const secrets = loadSecrets(folder);
  assert.equal(secrets.appPassword, 'kept');
  assert.equal(JSON.parse(readFileSync(secrets.path, 'utf8')).jwtSecret, secrets.jwtSecret);
});

test('a damaged file is reported, never replaced', () => {
  const path = join(folder, 'secrets.json');
  writeFileSync(path, '{"appPassword": "ha');
  assert.throws(() => loadSecrets(folder), /cannot be read as JSON. Put back a good copy/);
  assert.equal(readFileSync(path, 'utf8'), '{"appPassword": "ha');
});
