/**
 * The form in which every feature declares its routes. A route cannot exist without a permission: `route()` is the
 * only way to make one, and `mount` takes nothing else. Its method, path, permission and schemas are also what the
 * OpenAPI document and the test of all roles are read from.
 *
 *   export const pointsRoutes = [
 *     route({
 *       method: 'post', path: '/projects/:projectId/things', permission: 'design:write', summary: 'Adds a thing',
 *       body: NewThing, answers: { 201: Thing },
 *       handle: async ({ context, params, body }) => created(await addThing(context, params.projectId, body)),
 *     }),
 *   ];
 *
 * `context` is who asks (public routes have none). Parameters whose name ends in "id" are UUIDs; a project that the
 * organisation does not have is 404 before anything else is looked at. `before` holds Express middleware that runs
 * after the permission was checked (uploads). A handler that answers by itself (streams) returns nothing.
 */
import type { Request, RequestHandler, Response } from 'express';
import type { Static, TObject, TSchema } from 'typebox';
import type { Context } from '../context.ts';
import type { RoutePermission } from '../permissions.ts';
import type { Services } from '../services.ts';
import type { Answer } from './answer.ts';

export type Method = 'get' | 'post' | 'patch' | 'put' | 'delete';

/** The parameters that a path names, for instance `{ projectId: string }`. */
export type ParamsOf<Path extends string> =
  Path extends `${string}:${infer Name}/${infer Rest}` ? { readonly [K in Name]: string } & ParamsOf<`/${Rest}`>
    : Path extends `${string}:${infer Name}` ? { readonly [K in Name]: string } : unknown;

export interface Call<Params, Body, Query> {
  /** @throws on a public route */
  readonly context: Context;
  readonly params: Params;
  readonly body: Body;
  readonly query: Query;
  /** The version that If-Match names; only where the route demands it. */
  readonly version: number;
  readonly services: Services;
  readonly req: Request;
  readonly res: Response;
}

interface Declaration {
  readonly method: Method;
  /** Below /api/v1, in Express form. */
  readonly path: string;
  readonly permission: RoutePermission;
  readonly summary: string;
  readonly body?: TSchema;
  readonly query?: TObject;
  /** Demands the version of the row that is changed (428 without it). */
  readonly ifMatch?: boolean;
  /** Largest JSON body, as Express writes sizes. */
  readonly bodyLimit?: string;
  readonly before?: readonly RequestHandler[];
  /** Content type of a body that is not JSON, for the OpenAPI document. */
  readonly consumes?: string;
  /** Content type of the answer where it is not JSON; its schema may then be null. */
  readonly produces?: string;
  /** Schema of each status that is no problem; null: no body. */
  readonly answers: Readonly<Record<number, TSchema | null>>;
}

export interface Route extends Declaration {
  readonly handle: (call: Call<Readonly<Record<string, string>>, unknown, unknown>) => Promise<Answer | void>;
}

type Value<S> = S extends TSchema ? Static<S> : undefined;

/** Declares a route with the types that follow from its path and schemas. */
export function route<const Path extends string, B extends TSchema | undefined = undefined, Q extends TObject | undefined = undefined>(
  spec: Omit<Declaration, 'path' | 'body' | 'query'> & {
    readonly path: Path;
    readonly body?: B;
    readonly query?: Q;
    readonly handle: (call: Call<ParamsOf<Path>, Value<B>, Value<Q>>) => Promise<Answer | void> | Answer;
  },
): Route {
  return spec as unknown as Route;
}
