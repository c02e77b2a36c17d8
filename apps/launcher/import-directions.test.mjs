import assert from 'node:assert/strict';
import { describe, test } from 'node:test';
import { resolveImport, whyForbidden } from './import-directions.mjs';

const server = (path) => `apps/server/src/${path}`;
const client = (path) => `apps/client/src/app/${path}`;

const allowed = [
  ['libs/documents/src/io-list.ts', 'libs/calc/src/index.ts'],
  ['libs/calc/src/wiring/tree.ts', 'libs/calc/src/points/demand.ts'],
  ['libs/calc/src/wiring/tree.spec.ts', 'test/support/designs.ts'],
  ['db/seed/demo.ts', 'db/schema/index.ts'],
  ['test/integration/points.spec.ts', server('app.ts')],
  [server('points/routes.ts'), server('points/service.ts')],
  [server('points/service.ts'), server('points/queries.ts')],
  [server('points/service.ts'), server('mapping/service.ts')],
  [server('points/queries.ts'), 'db/schema/index.ts'],
  [server('points/routes.ts'), server('platform/http.ts')],
  [server('app.ts'), server('points/routes.ts')],
  [server('accounts/cookies.ts'), server('accounts/session-service.ts')],
  [server('points/routes.spec.ts'), server('points/routes.ts')],
  [client('points/points-page'), client('shared/lane')],
  [client('app.routes'), client('points/points-page')],
  [client('points/points-page'), 'libs/calc/src/index.ts'],
];

const forbidden = [
  ['libs/calc/src/assess.ts', 'libs/contract/src/index.ts'],
  ['libs/calc/src/assess.ts', 'db/schema/index.ts'],
  ['libs/contract/src/points.ts', 'libs/calc/src/index.ts'],
  ['db/schema/points.ts', 'libs/calc/src/index.ts'],
  ['db/seed/demo.ts', server('platform/password.ts')],
  [server('points/service.ts'), server('mapping/queries.ts')],
  [server('points/service.ts'), server('points/routes.ts')],
  [server('points/queries.ts'), server('points/service.ts')],
  [server('accounts/cookies.ts'), server('accounts/routes.ts')],
  [server('platform/http.ts'), server('points/service.ts')],
  [server('points/service.ts'), server('app.ts')],
  [server('points/service.ts'), client('points/points-page')],
  [client('points/points-page'), client('mapping/mapping-page')],
  [client('shared/lane'), client('points/points-page')],
  [client('core/session'), client('app.routes')],
  [client('points/points-page'), 'libs/documents/src/index.ts'],
  [client('points/points-page'), server('points/service.ts')],
];

describe('imports run one way', () => {
  for (const [from, to] of allowed) {
    test(`${from} may import ${to}`, () => assert.equal(whyForbidden(from, to, false), undefined));
  }
  for (const [from, to] of forbidden) {
    test(`${from} may not import ${to}`, () => assert.equal(typeof whyForbidden(from, to, false), 'string'));
  }

  test('the contract may use types of the calculation', () => {
    assert.equal(whyForbidden('libs/contract/src/points.ts', 'libs/calc/src/index.ts', true), undefined);
  });

  test('relative and short names lead to the same place', () => {
    assert.equal(resolveImport('#calc', 'libs/documents/src/io-list.ts'), 'libs/calc/src/index.ts');
    assert.equal(resolveImport('../../calc/src/index.ts', 'libs/documents/src/io-list.ts'), 'libs/calc/src/index.ts');
    assert.equal(resolveImport('express', 'apps/server/src/app.ts'), undefined);
  });
});
