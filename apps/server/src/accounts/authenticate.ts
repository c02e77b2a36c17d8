import type { Request } from 'express';
import type { Context } from '../platform/context.ts';
import type { Database } from '../platform/database.ts';
import type { Announcements } from '../platform/events.ts';
import { NotSignedIn } from '../platform/problems.ts';
import { ACCESS_COOKIE, cookieOf } from './cookies.ts';
import { readAccess } from './tokens.ts';

/** Reads who asks from the access cookie; a session that was ended is out at once, not when its token expires. */
export const authenticator = (secret: string, database: Database, announcements: Announcements) => (req: Request): Context => {
  const claims = readAccess(secret, cookieOf(req, ACCESS_COOKIE) ?? '');
  if (!claims || announcements.hasEnded(claims.sessionId)) throw new NotSignedIn();
  return { ...claims, database };
};
