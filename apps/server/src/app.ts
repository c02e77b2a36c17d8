import cookieParser from 'cookie-parser';
import express, { type Express, Router } from 'express';
import { pinoHttp } from 'pino-http';
import { authenticator } from './accounts/authenticate.ts';
import type { Config } from './platform/config.ts';
import { ByteCache } from './platform/byte-cache.ts';
import { Database } from './platform/database.ts';
import { Announcements } from './platform/events.ts';
import { type ClientFiles, clientFiles } from './platform/http/client-files.ts';
import { sameOriginWrites } from './platform/http/cross-site.ts';
import { errorHandler } from './platform/http/error-handler.ts';
import { securityHeaders } from './platform/http/headers.ts';
import { mount } from './platform/http/mount.ts';
import { openApiDocument } from './platform/http/openapi.ts';
import type { Logger } from './platform/log.ts';
import { NotFound, ProblemError } from './platform/problems.ts';
import type { Services } from './platform/services.ts';
import { TaskThread } from './platform/tasks/task-thread.ts';
import { routes } from './routes.ts';

const CACHE_BYTES = 200_000_000;
/** Beside this file, both as sources and as built. */
const TASK_WORKER = new URL(import.meta.url.endsWith('.ts') ? './task-worker.ts' : './task-worker.js', import.meta.url);

/** One instance of the server, without a port. */
export interface App {
  readonly express: Express;
  close(): Promise<void>;
}

/** Joins the features to one server. Connects to the database; throws where that cannot be reached. */
export async function createApp(config: Config, log: Logger): Promise<App> {
  const urls = { appUrl: config.databaseAppUrl, authUrl: config.databaseAuthUrl };
  const database = new Database(urls);
  const tasks = new TaskThread(TASK_WORKER, urls);
  const announcements = new Announcements(config.databaseAppUrl);
  await announcements.start();
  const authenticate = authenticator(config.jwtSecret, database, announcements);
  const services: Services = { config, database, announcements, log, authenticate, tasks, cache: new ByteCache(CACHE_BYTES) };
  return {
    express: assemble(services, config.clientDir === null ? null : clientFiles(config.clientDir)),
    close: async () => {
      await tasks.close();
      await Promise.all([announcements.close(), database.close()]);
    },
  };
}

function assemble(services: Services, client: ClientFiles | null): Express {
  const app = express();
  app.disable('x-powered-by').disable('etag').set('trust proxy', 'loopback, linklocal, uniquelocal');
  app.use(securityHeaders(client?.styleNonce ?? 'none'), requestLog(services.log));
  app.use('/api', apiRouter(services));
  if (client) app.use(client.files, client.page);
  app.use(() => {
    throw new NotFound('address');
  });
  app.use(errorHandler(services.log));
  return app;
}

function apiRouter(services: Services): Router {
  const api = Router();
  const document = JSON.stringify(openApiDocument(routes));
  api.get('/health', async (_req, res) => {
    await services.database.ready().catch(() => {
      throw new ProblemError(503, 'internal', 'The database does not answer', { detail: 'Try again in a moment.' });
    });
    res.set('Cache-Control', 'no-store').json({ status: 'ready' });
  });
  api.get('/openapi.json', (_req, res) => void res.set('Cache-Control', 'no-cache').type('json').send(document));
  const v1 = Router();
  mount(v1, routes, services);
  api.use('/v1', sameOriginWrites, cookieParser(), v1);
  api.use(() => {
    throw new NotFound('address');
  });
  return api;
}

/** Method, path and result of a request: neither headers nor query strings, which may hold secrets. */
const requestLog = (log: Logger) => pinoHttp({
  logger: log,
  customLogLevel: (_req, res, error) => (error ?? res.statusCode >= 500 ? 'error' : 'debug'),
  serializers: {
    req: (req: { method: string; url: string }) => ({ method: req.method, path: req.url.split('?')[0] }),
    res: (res: { statusCode: number }) => ({ status: res.statusCode }),
  },
});
