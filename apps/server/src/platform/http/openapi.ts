import { Problem } from '#contract';
import type { TSchema } from 'typebox';
import type { Route } from './route.ts';

interface Operation {
  readonly [key: string]: unknown;
}

const problem = { description: 'A problem document (RFC 9457)', content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } } };

/** The OpenAPI 3.1 document, read from the same table that the server is built from. */
export function openApiDocument(routes: readonly Route[]): object {
  const paths: Record<string, Record<string, Operation>> = {};
  for (const route of routes) {
    const path = `/api/v1${route.path.replace(/:(\w+)/g, '{$1}')}`;
    (paths[path] ??= {})[route.method] = operationOf(route);
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Lanewright', version: '1', description: 'Rows carry a version; a change names the version it read in If-Match.' },
    servers: [{ url: '/' }],
    paths,
    components: {
      schemas: { Problem },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'lw_access' } },
    },
  };
}

function operationOf(route: Route): Operation {
  return {
    operationId: `${route.method}${route.path.replace(/[/:-]+(\w)/g, (_, letter: string) => letter.toUpperCase())}`,
    summary: route.summary,
    tags: [tagOf(route.path)],
    security: route.permission === 'public' ? [] : [{ session: [] }],
    'x-permission': route.permission,
    parameters: parametersOf(route),
    ...(requestBodyOf(route)),
    responses: responsesOf(route),
  };
}

const tagOf = (path: string): string => path.split('/').filter((part) => part && !part.startsWith(':')).at(path.startsWith('/projects') ? -1 : 0) ?? 'api';

function parametersOf(route: Route): object[] {
  const inPath = [...route.path.matchAll(/:(\w+)/g)].map(([, name = '']) => ({
    name, in: 'path', required: true, schema: { type: 'string', ...(/id$/i.test(name) ? { format: 'uuid' } : {}) },
  }));
  const required = new Set(route.query?.required as string[] | undefined);
  const inQuery = Object.entries(route.query?.properties ?? {}).map(([name, schema]) => ({ name, in: 'query', required: required.has(name), schema }));
  const version = route.ifMatch ? [{ name: 'If-Match', in: 'header', required: true, schema: { type: 'string', pattern: '^"\\d+"$' } }] : [];
  return [...inPath, ...inQuery, ...version];
}

function requestBodyOf(route: Route): object {
  if (route.body) return { requestBody: { required: true, content: { 'application/json': { schema: route.body } } } };
  return route.consumes ? { requestBody: { required: true, content: { [route.consumes]: { schema: { type: 'object' } } } } } : {};
}

function responsesOf(route: Route): object {
  const answers = Object.entries(route.answers).map(([status, schema]) => [status, answerOf(schema, route.produces)]);
  return { ...(Object.fromEntries(answers) as object), default: problem };
}

function answerOf(schema: TSchema | null, type?: string): object {
  if (schema === null && type === undefined) return { description: 'No body' };
  return { description: 'Done', content: { [type ?? 'application/json']: { schema: schema ?? {} } } };
}
