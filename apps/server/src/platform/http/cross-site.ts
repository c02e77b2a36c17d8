import type { RequestHandler } from 'express';
import { NotAllowed } from '../problems.ts';

const READS = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Writes come from our own pages only. SameSite cookies keep other sites out already; this is the second lock, and
 * it also holds for sister sites. Programs that are no browsers send neither header.
 */
export const sameOriginWrites: RequestHandler = (req, _res, next) => {
  if (READS.has(req.method)) return next();
  const site = req.header('sec-fetch-site');
  const allowed = site === undefined ? originMatches(req.header('origin'), req.header('host')) : site === 'same-origin' || site === 'none';
  if (!allowed) throw new NotAllowed('Changes are accepted from this server\'s own pages only.');
  next();
};

function originMatches(origin: string | undefined, host: string | undefined): boolean {
  if (origin === undefined) return true;
  return URL.canParse(origin) && new URL(origin).host === host;
}
