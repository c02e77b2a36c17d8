import assert from 'node:assert/strict';
import { mkdirSync, mkdtempSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, test } from 'node:test';
import { isFresh } from './build.mjs';
import { fingerprint } from './files.mjs';
import { packagesUpToDate, packagesWanted } from './packages.mjs';

let base = '';
const write = (path, text) => {
  mkdirSync(join(base, path, '..'), { recursive: true });
  writeFileSync(join(base, path), text);
};

beforeEach(() => {
  base = mkdtempSync(join(tmpdir(), 'lanewright-files-'));
  write('src/a.ts', 'a');
  write('src/deep/b.ts', 'b');
});
afterEach(() => rmSync(base, { recursive: true, force: true }));

describe('fingerprint', () => {
  test('does not change with the time of a file', () => {
    const before = fingerprint(base, ['src']);
    utimesSync(join(base, 'src/a.ts'), 1, 1);
    assert.equal(fingerprint(base, ['src']), before);
  });

  test('changes with content, name and number of files', () => {
    const seen = new Set([fingerprint(base, ['src'])]);
    write('src/deep/b.ts', 'B');
    seen.add(fingerprint(base, ['src']));
    write('src/c.ts', '');
    seen.add(fingerprint(base, ['src']));
    rmSync(join(base, 'src/c.ts'));
    write('src/d.ts', '');
    seen.add(fingerprint(base, ['src']));
    assert.equal(seen.size, 4);
  });

  test('takes a missing source as missing', () => {
    assert.equal(fingerprint(base, ['src', 'not-there']), fingerprint(base, ['src']));
  });
});

describe('a built part', () => {
  test('is fresh when its output exists and its stamp fits the sources', () => {
    const part = { sources: ['src'], output: join(base, 'out.js'), stamp: join(base, 'stamp') };
    write('stamp', fingerprint(base, ['src']));
    assert.equal(isFresh(part, base), false, 'no output');
    write('out.js', '');
    assert.equal(isFresh(part, base), true);
    write('src/a.ts', 'edited');
    assert.equal(isFresh(part, base), false, 'edited');
  });
});

describe('npm packages', () => {
  test('are up to date while the stamp fits the lock file', () => {
    write('package-lock.json', '{}');
    assert.equal(packagesUpToDate(base), false, 'never installed');
    write('node_modules/.lanewright-packages', packagesWanted(base));
    assert.equal(packagesUpToDate(base), true);
    write('package-lock.json', '{ "packages": {} }');
    assert.equal(packagesUpToDate(base), false, 'lock file changed');
  });
});
