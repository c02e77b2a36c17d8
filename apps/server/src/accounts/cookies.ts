import type { CookieOptions, Request, Response } from 'express';
import { REFRESH_DAYS, type SignedIn } from './session-service.ts';
import { ACCESS_SECONDS, signAccess } from './tokens.ts';

export const ACCESS_COOKIE = 'lw_access';
export const REFRESH_COOKIE = 'lw_refresh';
const REFRESH_PATH = '/api/v1/auth';

const options = (req: Request, path: string): CookieOptions => ({ httpOnly: true, sameSite: 'strict', secure: req.secure, path });

export function setCookies(req: Request, res: Response, secret: string, { claims, refresh }: SignedIn): void {
  res.cookie(ACCESS_COOKIE, signAccess(secret, claims), { ...options(req, '/'), maxAge: ACCESS_SECONDS * 1000 });
  if (refresh) res.cookie(REFRESH_COOKIE, refresh.text, { ...options(req, REFRESH_PATH), maxAge: REFRESH_DAYS * 86_400_000 });
}

export function clearCookies(req: Request, res: Response): void {
  res.clearCookie(ACCESS_COOKIE, options(req, '/'));
  res.clearCookie(REFRESH_COOKIE, options(req, REFRESH_PATH));
}

/** The value of one of our cookies. */
export function cookieOf(req: Request, name: string): string | undefined {
  const value = (req.cookies as Record<string, unknown>)[name];
  return typeof value === 'string' ? value : undefined;
}
