import assert from 'node:assert/strict';
import { test } from 'node:test';
import { checkNodeVersion, isOlder } from './node-version.mjs';

test('compares versions by number, not by letter', () => {
  assert.equal(isOlder('20.9.0', '20.19.0'), true);
  assert.equal(isOlder('20.19.0', '20.19.0'), false);
  assert.equal(isOlder('22.0.0', '20.19.0'), false);
  assert.equal(isOlder('9.99.99', '20.19.0'), true);
  assert.equal(isOlder('20.19.1-nightly', '20.19.0'), false);
});

test('refuses an old Node and says which one is needed', () => {
  assert.throws(() => checkNodeVersion('18.20.4'), /needs Node 20\.19\.0 or newer; this is Node 18\.20\.4/);
  assert.doesNotThrow(() => checkNodeVersion('20.19.0'));
});
