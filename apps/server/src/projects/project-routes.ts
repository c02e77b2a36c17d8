import { ChangeNotice, DesignDocument, HistoryEntry, NewChangeSet, NewProject, NewUndo, projects as projectResource, ProjectSummary } from '#contract';
import { Type } from 'typebox';
import { withOrg } from '../platform/context.ts';
import { created, etag, notModified, ok } from '../platform/http/answer.ts';
import { route, type Route } from '../platform/http/route.ts';
import { applyChangeSet } from './change-sets/apply-change-set.ts';
import { undoChangeSet } from './change-sets/undo/undo-change-set.ts';
import { projectCollection } from './collections.ts';
import { readDesign } from './design-service.ts';
import { findChangesSince, findHistory } from './history-queries.ts';
import { createProject, listProjects, readProject } from './project-service.ts';
import { changeRow } from './row-service.ts';

const Sequence = Type.Integer({ minimum: 0 });

export const projectRoutes: readonly Route[] = [
  route({
    method: 'get', path: '/projects', permission: 'project:read', summary: 'The organisation\'s projects', answers: { 200: Type.Array(ProjectSummary) },
    handle: async ({ context }) => ok(await listProjects(context)),
  }),
  route({
    method: 'post', path: '/projects', permission: 'project:create', summary: 'Makes a project, with the hardware of another if wanted',
    body: NewProject, answers: { 201: projectResource.Row },
    handle: async ({ context, body }) => {
      const project = await createProject(context, body);
      return created(project, { ETag: etag(project.version) });
    },
  }),
  route({
    method: 'get', path: '/projects/:projectId', permission: 'project:read', summary: 'One project with its policies', answers: { 200: projectResource.Row },
    handle: async ({ context, params }) => {
      const project = await readProject(context, params.projectId);
      return ok(project, { ETag: etag(project.version) });
    },
  }),
  route({
    method: 'patch', path: '/projects/:projectId', permission: 'design:write', summary: 'Changes name or policies of a project',
    ifMatch: true, body: projectResource.Change, answers: { 200: projectResource.Row },
    handle: async ({ context, params, body, version }) => {
      const change = { op: 'update', id: params.projectId, version, values: body as Record<string, unknown> } as const;
      const project = await changeRow(context, projectCollection, params.projectId, change);
      return ok(project, { ETag: etag(project?.version ?? 0) });
    },
  }),
  route({
    method: 'get', path: '/projects/:projectId/design', permission: 'project:read', summary: 'The whole design at one instant',
    answers: { 200: DesignDocument, 304: null },
    handle: async ({ context, params, req, services }) => {
      const design = await readDesign(context, services.cache, params.projectId, req.header('if-none-match'));
      return design.body === null ? notModified({ ETag: design.etag }) : ok(design.body, { ETag: design.etag });
    },
  }),
  route({
    method: 'get', path: '/projects/:projectId/changes', permission: 'project:read', summary: 'What changed after a sequence number',
    query: Type.Object({ since: Sequence }), answers: { 200: ChangeNotice },
    handle: async ({ context, params, query }) => ok(await withOrg(context, (tx) => findChangesSince(tx, params.projectId, query.since))),
  }),
  route({
    method: 'post', path: '/projects/:projectId/change-sets', permission: 'design:write', summary: 'Changes several rows: all or none',
    body: NewChangeSet, bodyLimit: '64mb', answers: { 200: ChangeNotice },
    handle: async ({ context, params, body }) => ok(await applyChangeSet(context, params.projectId, body)),
  }),
  route({
    method: 'post', path: '/projects/:projectId/change-sets/:changeSetId/undo', permission: 'design:write',
    summary: 'Takes a change set back; the undo of an undo makes it again', body: NewUndo, answers: { 200: ChangeNotice },
    handle: async ({ context, params, body }) => ok(await undoChangeSet(context, params.projectId, params.changeSetId, body.id)),
  }),
  route({
    method: 'get', path: '/projects/:projectId/history', permission: 'project:read', summary: 'Who changed what, latest first',
    query: Type.Object({ before: Type.Optional(Sequence), limit: Type.Integer({ minimum: 1, maximum: 200, default: 50 }) }),
    answers: { 200: Type.Array(HistoryEntry) },
    handle: async ({ context, params, query }) => ok(await withOrg(context, (tx) => findHistory(tx, params.projectId, query.before, query.limit))),
  }),
];
