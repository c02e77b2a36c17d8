import assert from 'node:assert/strict';
import { test } from 'node:test';
import { seedArguments } from './seed-arguments.mjs';

test('what is left out has a default', () => {
  assert.deepEqual(seedArguments(['--lanes', '100']), { lanes: 100, seed: 1, organisation: 'Brackwater' });
});

test('all can be told', () => {
  const args = ['--lanes=50000', '--seed', '0', '--name', ' Large plant ', '--org', 'hollin'];
  assert.deepEqual(seedArguments(args), { lanes: 50_000, seed: 0, name: 'Large plant', organisation: 'hollin' });
});

for (const [args, why] of [
  [[], /how many lanes, from 100 to 50000/],
  [['--lanes', '99'], /--lanes 99 is not a whole number from 100 to 50000/],
  [['--lanes', '50001'], /--lanes 50001 is not/],
  [['--lanes', '1e3'], /--lanes 1e3 is not/],
  [['--lanes', '200', '--seed', '-1'], /seed/],
  [['--lanes', '200', '--name', '  '], /--name needs 1 to 200/],
  [['--lanes', '200', '--much'], /much/],
  [['200'], /200/],
]) {
  test(`${args.join(' ') || 'nothing'} is refused with the usage`, () => {
    assert.throws(() => seedArguments(args), (error) => why.test(error.message) && error.message.includes('Usage: npm run seed'));
  });
}
