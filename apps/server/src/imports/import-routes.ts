import { ImportPreview, ImportResult, ImportSettings } from '#contract';
import multer, { MulterError } from 'multer';
import type { RequestHandler } from 'express';
import { created, ok } from '../platform/http/answer.ts';
import { route, type Route } from '../platform/http/route.ts';
import { BadRequest, TooLarge } from '../platform/problems.ts';
import { commitImport, previewImport, uploadImport } from './import-service.ts';
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

export const importRoutes: readonly Route[] = [
  route({
    method: 'post', path: '/projects/:projectId/imports', permission: 'design:write', summary: 'Uploads a tag list and says what importing it would do',
    before: [oneFile], consumes: 'multipart/form-data', answers: { 201: ImportPreview },
    handle: async ({ context, params, req }) => {
      if (!req.file) throw new BadRequest('No file was sent', 'Send one file as multipart/form-data, in the part "file".');
      // The browser sends UTF-8 names, which the multipart parser reads as Latin-1.
      const name = Buffer.from(req.file.originalname, 'latin1').toString('utf8').slice(0, 200);
      return created(await uploadImport(context, params.projectId, { name, bytes: req.file.buffer }));
    },
  }),
  route({
    method: 'post', path: '/projects/:projectId/imports/:importId/preview', permission: 'design:write', summary: 'The same with other settings; changes nothing',
    body: ImportSettings, answers: { 200: ImportPreview },
    handle: async ({ context, params, body }) => ok(await previewImport(context, params.projectId, params.importId, body)),
  }),
  route({
    method: 'post', path: '/projects/:projectId/imports/:importId/commit', permission: 'design:write', summary: 'Imports the uploaded list in one transaction',
    body: ImportSettings, answers: { 200: ImportResult },
    handle: async ({ context, params, body }) => ok(await commitImport(context, params.projectId, params.importId, body)),
  }),
];
