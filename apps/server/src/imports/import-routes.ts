import { ImportPreview, ImportResult, ImportRowPage, ImportRowsQuery, ImportSettings, ImportWork } from '#contract';
import multer, { MulterError } from 'multer';
import type { Request, RequestHandler } from 'express';
import { v7 as newId, validate as isUuid } from 'uuid';
import { created, JsonText, noContent, ok } from '../platform/http/answer.ts';
import { route, type Route } from '../platform/http/route.ts';
import { BadRequest, Invalid, TooLarge } from '../platform/problems.ts';
import { commitImport, previewImport, readRows, readWork, stopWork, uploadImport } from './import-service.ts';
import type { ImportKey } from './import-work.ts';
import { LIMITS } from './reading/index.ts';

const receive = multer({ storage: multer.memoryStorage(), limits: { fileSize: LIMITS.bytes, files: 1, fields: 5, parts: 6 } }).single('file');

/** Takes one file, and refuses one that is too large with what to do. */
const oneFile: RequestHandler = (req, res, next) => {
  receive(req, res, (error: unknown) => {
    if (error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE') {
      next(new TooLarge('The file is too large', `A tag list may have ${LIMITS.bytes / 1_000_000} MB. Export only the rows and columns that are needed, or split the list.`));
    } else if (error instanceof MulterError) {
      next(new BadRequest('The upload is not in the right form', 'Send one file as multipart/form-data, in the part "file".'));
    } else next(error);
  });
};

/** A file, and before it its identifier where the client makes one. */
const requireFile = (req: Request): { name: string; bytes: Buffer; id: string } => {
  if (!req.file) throw new BadRequest('No file was sent', 'Send one file as multipart/form-data, in the part "file".');
  const { id } = (req.body ?? {}) as { id?: unknown };
  if (id !== undefined && !(typeof id === 'string' && isUuid(id))) throw new Invalid([{ field: 'id', message: 'This is no UUID.' }]);
  // The browser sends UTF-8 names, which the multipart parser reads as Latin-1.
  const name = Buffer.from(req.file.originalname, 'latin1').toString('utf8').slice(0, 200);
  return { name, bytes: req.file.buffer, id: id?.toLowerCase() ?? newId() };
};

const keyOf = ({ projectId, importId }: { readonly projectId: string; readonly importId: string }): ImportKey => ({ projectId, importId });

export const importRoutes: readonly Route[] = [
  route({
    method: 'post', path: '/projects/:projectId/imports', permission: 'design:write', summary: 'Uploads a tag list and says what importing it would do',
    before: [oneFile], consumes: 'multipart/form-data', answers: { 201: ImportPreview },
    handle: async ({ context, params, req, services }) => {
      const { id, ...file } = requireFile(req);
      return created(await uploadImport(services, context, { projectId: params.projectId, importId: id }, file));
    },
  }),
  route({
    method: 'post', path: '/projects/:projectId/imports/:importId/preview', permission: 'design:write', summary: 'The same with other settings; changes nothing',
    body: ImportSettings, answers: { 200: ImportPreview },
    handle: async ({ context, params, body, services }) => ok(await previewImport(services, context, keyOf(params), body)),
  }),
  route({
    method: 'get', path: '/projects/:projectId/imports/:importId/rows', permission: 'design:write', summary: 'A page of the rows of the last preview',
    query: ImportRowsQuery, answers: { 200: ImportRowPage },
    handle: async ({ context, params, query, services }) => {
      const { show = 'all', offset = 0, limit = 100 } = query;
      return ok(new JsonText(await readRows(services, context, keyOf(params), { show, offset, limit })));
    },
  }),
  route({
    method: 'post', path: '/projects/:projectId/imports/:importId/commit', permission: 'design:write', summary: 'Imports the uploaded list in one transaction',
    body: ImportSettings, answers: { 200: ImportResult },
    handle: async ({ context, params, body, services }) => ok(await commitImport(services, context, keyOf(params), body)),
  }),
  route({
    method: 'get', path: '/projects/:projectId/imports/:importId/work', permission: 'design:write', summary: 'How far an import is that is being read or written',
    answers: { 200: ImportWork, 204: null },
    handle: async ({ context, params }) => {
      const work = await readWork(context, keyOf(params));
      return work ? ok(work) : noContent();
    },
  }),
  route({
    method: 'delete', path: '/projects/:projectId/imports/:importId/work', permission: 'design:write', summary: 'Stops reading or writing; nothing is changed then',
    answers: { 204: null },
    handle: async ({ context, params, services }) => {
      await stopWork(services, context, keyOf(params));
      return noContent();
    },
  }),
];
