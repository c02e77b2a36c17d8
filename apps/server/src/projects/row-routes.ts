import { projectResources, Uuid } from '#contract';
import { type Static, type TObject, Type } from 'typebox';
import type { Row } from '../platform/editing/collection.ts';
import { created, etag, noContent, ok } from '../platform/http/answer.ts';
import { route, type Route } from '../platform/http/route.ts';
import { collectionNamed } from './collections.ts';
import { changeRow, listRows, readRow } from './row-service.ts';

const PageQuery = Type.Object({ after: Type.Optional(Uuid), limit: Type.Integer({ minimum: 1, maximum: 1000, default: 200 }) });
const versionOf = (row: Row | null) => ({ ETag: etag(row?.version ?? 0) });
type Values = Record<string, unknown>;

/** The same five routes for each collection that people edit. */
export const rowRoutes: readonly Route[] = (Object.keys(projectResources) as (keyof typeof projectResources)[]).flatMap((name) => {
  const collection = collectionNamed(name);
  const { path, Row, New, Change } = collection.resource;
  const all = `/projects/:projectId/${path}` as const;
  const one = `/projects/:projectId/${path}/:id` as const;
  return [
    route({
      method: 'get', path: all, permission: 'project:read', summary: `A page of rows, in the order of creation`, query: PageQuery,
      answers: { 200: Type.Object({ rows: Type.Array(Row), next: Type.Union([Uuid, Type.Null()]) }) },
      handle: async ({ context, params, query }) => ok(await listRows(context, collection, params.projectId, query.after, query.limit)),
    }),
    route({
      method: 'post', path: all, permission: 'design:write', summary: `Adds a ${collection.noun}`, body: New, answers: { 201: Row },
      handle: async ({ context, params, body }) => {
        const { id, ...values } = body as Static<TObject> & Values;
        const row = await changeRow(context, collection, params.projectId, { op: 'create', id: String(id).toLowerCase(), values });
        return created(row, versionOf(row));
      },
    }),
    route({
      method: 'get', path: one, permission: 'project:read', summary: `One ${collection.noun}`, answers: { 200: Row },
      handle: async ({ context, params }) => {
        const row = await readRow(context, collection, params.projectId, params.id);
        return ok(row, versionOf(row));
      },
    }),
    route({
      method: 'patch', path: one, permission: 'design:write', summary: `Changes fields of a ${collection.noun}`, ifMatch: true, body: Change, answers: { 200: Row },
      handle: async ({ context, params, body, version }) => {
        const row = await changeRow(context, collection, params.projectId, { op: 'update', id: params.id, version, values: body });
        return ok(row, versionOf(row));
      },
    }),
    route({
      method: 'delete', path: one, permission: 'design:write', summary: `Deletes a ${collection.noun}`, ifMatch: true, answers: { 204: null },
      handle: async ({ context, params, version }) => {
        await changeRow(context, collection, params.projectId, { op: 'delete', id: params.id, version });
        return noContent();
      },
    }),
  ];
});
