import { projects } from '#schema';
import { eq } from 'drizzle-orm';
import { Type } from 'typebox';
import { standsStill } from '../accounts/session-service.ts';
import { type Context, withOrg } from '../platform/context.ts';
import { openStream } from '../platform/http/event-stream.ts';
import { route, type Route } from '../platform/http/route.ts';

export const eventRoutes: readonly Route[] = [
  route({
    method: 'get', path: '/projects/:projectId/events', permission: 'project:read', produces: 'text/event-stream',
    summary: 'Server-sent events: "change" with the project\'s sequence number, until the session ends',
    answers: { 200: Type.String() },
    handle: async ({ context, params, services, req, res }) => {
      const stream = openStream(req, res, { stillAllowed: () => standsStill(context) });
      const tell = (sequence: number) => stream.send('change', { sequence }, sequence);
      // The number as it is now: what passed by while nobody listened is noticed at once.
      const tellCurrent = () => void currentSequence(context, params.projectId).then(tell, () => stream.end());
      stream.whenClosed(services.announcements.subscribe(params.projectId, context.sessionId, {
        change: tell, missed: tellCurrent, ended: () => stream.end(),
      }));
      tellCurrent();
      return Promise.resolve();
    },
  }),
];

async function currentSequence(context: Context, projectId: string): Promise<number> {
  const [project] = await withOrg(context, (tx) => tx.select({ sequence: projects.sequence }).from(projects).where(eq(projects.id, projectId)));
  return project?.sequence ?? 0;
}
