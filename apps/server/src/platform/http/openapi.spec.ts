import { Type } from 'typebox';
import { describe, expect, it } from 'vitest';
import { noContent } from './answer.ts';
import { openApiDocument } from './openapi.ts';
import { route } from './route.ts';

describe('openApiDocument', () => {
  it('reads path, parameters, permission and answers from the route table', () => {
    const routes = [route({
      method: 'delete', path: '/projects/:projectId/points/:id', permission: 'design:write', summary: 'Deletes a point', ifMatch: true,
      query: Type.Object({ why: Type.Optional(Type.String()) }), answers: { 204: null }, handle: () => noContent(),
    })];
    const document = openApiDocument(routes) as { paths: Record<string, Record<string, unknown>> };
    expect(document.paths['/api/v1/projects/{projectId}/points/{id}']?.['delete']).toMatchObject({
      operationId: 'deleteProjectsProjectIdPointsId', tags: ['points'], 'x-permission': 'design:write', security: [{ session: [] }],
      parameters: [
        { name: 'projectId', in: 'path', schema: { format: 'uuid' } }, { name: 'id', in: 'path' }, { name: 'why', in: 'query', required: false }, { name: 'If-Match', in: 'header' },
      ],
      responses: { 204: { description: 'No body' }, default: {} },
    });
  });
});
