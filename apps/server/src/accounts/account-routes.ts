import { Session, SignIn } from '#contract';
import { noContent, ok } from '../platform/http/answer.ts';
import { route } from '../platform/http/route.ts';
import { NotSignedIn } from '../platform/problems.ts';
import { ACCESS_COOKIE, clearCookies, cookieOf, REFRESH_COOKIE, setCookies } from './cookies.ts';
import { refresh, sessionOf, signIn, signOut } from './session-service.ts';
import { parseRefreshToken, readAccess } from './tokens.ts';

export const accountRoutes = [
  route({
    method: 'post', path: '/auth/sign-in', permission: 'public', summary: 'Signs in and sets the cookies of the session',
    body: SignIn, bodyLimit: '10kb', answers: { 200: Session },
    handle: async ({ body, services: { config, database }, req, res }) => {
      const signedIn = await signIn(database, body.email, body.password, req.header('user-agent') ?? '');
      setCookies(req, res, config.jwtSecret, signedIn);
      return ok(await sessionOf({ ...signedIn.claims, database }));
    },
  }),
  route({
    method: 'post', path: '/auth/refresh', permission: 'public', summary: 'Renews the session with the refresh cookie',
    answers: { 200: Session },
    handle: async ({ services: { config, database }, req, res }) => {
      try {
        const signedIn = await refresh(database, parseRefreshToken(cookieOf(req, REFRESH_COOKIE)));
        setCookies(req, res, config.jwtSecret, signedIn);
        return ok(await sessionOf({ ...signedIn.claims, database }));
      } catch (error) {
        if (error instanceof NotSignedIn) clearCookies(req, res);
        throw error;
      }
    },
  }),
  route({
    method: 'post', path: '/auth/sign-out', permission: 'public', summary: 'Ends the session everywhere', answers: { 204: null },
    handle: async ({ services: { config, database }, req, res }) => {
      // Once the access token has expired, the refresh token still says which session ends.
      const sessionId = readAccess(config.jwtSecret, cookieOf(req, ACCESS_COOKIE) ?? '')?.sessionId
        ?? parseRefreshToken(cookieOf(req, REFRESH_COOKIE))?.sessionId;
      if (sessionId) await signOut(database, sessionId);
      clearCookies(req, res);
      return noContent();
    },
  }),
  route({
    method: 'get', path: '/auth/session', permission: 'session', summary: 'Who is signed in', answers: { 200: Session },
    handle: async ({ context }) => ok(await sessionOf(context)),
  }),
];
