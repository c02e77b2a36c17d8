import { Catalogue } from '#contract';
import { Type } from 'typebox';
import { created, JsonText, ok } from '../platform/http/answer.ts';
import { route, type Route } from '../platform/http/route.ts';
import { addEntry, readCatalogue, readKind } from './catalogue-service.ts';
import { catalogueKinds } from './catalogue-tables.ts';

export const catalogueRoutes: readonly Route[] = [
  route({
    method: 'get', path: '/catalogue', permission: 'catalogue:read', summary: 'The whole catalogue, every version', answers: { 200: Catalogue },
    handle: async ({ context }) => ok(new JsonText(await readCatalogue(context))),
  }),
  ...catalogueKinds.flatMap((kind) => [
    route({
      method: 'get', path: `/catalogue/${kind.path}`, permission: 'catalogue:read', summary: `All ${kind.path} of the catalogue`,
      answers: { 200: Type.Array(kind.Row) },
      handle: async ({ context }) => ok(new JsonText(await readKind(context, kind))),
    }),
    route({
      method: 'post', path: `/catalogue/${kind.path}`, permission: 'catalogue:write',
      summary: 'Adds an entry; a name that exists becomes its next version', body: kind.New, answers: { 201: kind.Row },
      handle: async ({ context, body }) => created(await addEntry(context, kind, body)),
    }),
  ]),
];
