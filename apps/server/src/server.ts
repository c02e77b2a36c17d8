import { createServer } from 'node:http';
import { createApp } from './app.ts';
import { readConfig } from './platform/config.ts';
import { createLog } from './platform/log.ts';

const log = createLog(process.env['LOG_LEVEL'] || 'info');

try {
  const config = readConfig(process.env);
  const app = await createApp(config, log);
  const server = createServer(app.express);
  server.listen(config.port, config.host, () => log.info({ host: config.host, port: config.port }, 'listening'));
  server.once('error', (error) => {
    log.fatal({ err: error }, 'cannot listen');
    process.exit(1);
  });
  const stop = () => {
    server.close(() => void app.close().then(() => process.exit(0)));
    // Event streams stay open until they are told.
    server.closeAllConnections();
  };
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, stop);
} catch (error) {
  log.fatal(error instanceof Error ? error.message : String(error));
  process.exit(1);
}
