import { projects } from '#schema';
import { eq } from 'drizzle-orm';
import express, { type Request, type RequestHandler, type Response, type Router } from 'express';
import { type Context, withOrg } from '../context.ts';
import { requirePermission } from '../permissions.ts';
import { BadRequest, NotFound, VersionMissing } from '../problems.ts';
import type { Services } from '../services.ts';
import { validated, validatedQuery } from '../validated.ts';
import type { Call, Route } from './route.ts';
import { send } from './send.ts';

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;

/** Registers the routes. The order of checks: signed in, allowed, project known, body well-formed, version named. */
export function mount(router: Router, routes: readonly Route[], services: Services): void {
  for (const route of routes) router[route.method](route.path, handlerOf(route, services));
}

function handlerOf(route: Route, services: Services): RequestHandler {
  const middleware = [...(route.before ?? []), ...(route.body ? [jsonBody(route.bodyLimit)] : [])];
  return async (req, res) => {
    const context = route.permission === 'public' ? null : services.authenticate(req);
    if (context && route.permission !== 'public') requirePermission(context, route.permission);
    const params = checkedParams(req);
    if (context && params['projectId']) await requireProject(context, params['projectId']);
    for (const one of middleware) await run(one, req, res);
    const answer = await route.handle(callOf(route, services, context, params, req, res));
    if (answer) await send(req, res, answer);
  };
}

function callOf(route: Route, services: Services, context: Context | null, params: Record<string, string>, req: Request, res: Response): Call<Record<string, string>, unknown, unknown> {
  return {
    get context(): Context {
      if (!context) throw new Error(`${route.path} is public: nobody is known there`);
      return context;
    },
    params,
    body: route.body && validated(route.body, req.body as unknown),
    query: route.query && validatedQuery(route.query, req.query),
    version: route.ifMatch ? versionOf(req) : 0,
    services, req, res,
  };
}

function checkedParams(req: Request): Record<string, string> {
  const params: Record<string, string> = {};
  for (const [name, value] of Object.entries(req.params)) {
    if (typeof value !== 'string') continue;
    if (/id$/i.test(name) && !UUID.test(value)) throw new NotFound(name === 'projectId' ? 'project' : 'row');
    params[name] = /id$/i.test(name) ? value.toLowerCase() : value;
  }
  return params;
}

/** Whose project it is decides before any body is read. */
async function requireProject(context: Context, projectId: string): Promise<void> {
  const found = await withOrg(context, (tx) => tx.select({ id: projects.id }).from(projects).where(eq(projects.id, projectId)));
  if (found.length === 0) throw new NotFound('project');
}

function versionOf(req: Request): number {
  const named = req.header('if-match');
  if (named === undefined) throw new VersionMissing();
  const version = /^"(\d{1,9})"$/.exec(named.trim());
  if (!version) throw new BadRequest('If-Match must hold one version', 'For instance If-Match: "3".');
  return Number(version[1]);
}

const parsers = new Map<string, RequestHandler>();

function jsonBody(limit = '1mb'): RequestHandler {
  const known = parsers.get(limit);
  if (known) return known;
  const parse = express.json({ limit, strict: false });
  const parser: RequestHandler = (req, res, next) => {
    if (!req.is('application/json')) next(new BadRequest('The body must be JSON', 'Send it with Content-Type: application/json.'));
    else parse(req, res, next);
  };
  parsers.set(limit, parser);
  return parser;
}

const run = (handler: RequestHandler, req: Request, res: Response): Promise<void> =>
  new Promise((resolve, reject) => {
    void handler(req, res, (error?: unknown) => {
      if (error) reject(error instanceof Error ? error : new Error('A middleware failed', { cause: error }));
      else resolve();
    });
  });
