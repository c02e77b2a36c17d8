/** A server process that imports one list, or none: `import-process.ts [LIST PROJECT]`. */
import { once } from 'node:events';
import { readFileSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { basename } from 'node:path';
import { createApp } from '../../apps/server/src/app.ts';
import { createLog } from '../../apps/server/src/platform/log.ts';
import { BENCH_JWT_SECRET } from './bench-server.ts';

const { DATABASE_APP_URL = '', DATABASE_AUTH_URL = '', COOKIE = '' } = process.env;
const [path, projectId] = process.argv.slice(2);
const product = await createApp({
  port: 0, host: '127.0.0.1', databaseAppUrl: DATABASE_APP_URL, databaseAuthUrl: DATABASE_AUTH_URL, jwtSecret: BENCH_JWT_SECRET, clientDir: null,
}, createLog('silent'));
const server = createServer(product.express).listen(0, '127.0.0.1');
await once(server, 'listening');
if (path !== undefined) {
  const imports = `http://127.0.0.1:${(server.address() as AddressInfo).port}/api/v1/projects/${projectId}/imports`;
  const form = new FormData();
  form.append('file', new Blob([readFileSync(path)]), basename(path));
  const upload = await fetch(imports, { method: 'POST', headers: { cookie: COOKIE }, body: form });
  const { id } = (await upload.json()) as { id: string };
  const commit = await fetch(`${imports}/${id}/commit`, { method: 'POST', headers: { cookie: COOKIE, 'content-type': 'application/json' }, body: '{}' });
  if (!commit.ok) throw new Error(`The import failed: ${upload.status}, ${commit.status}`);
}
server.closeAllConnections();
server.close();
await product.close();
