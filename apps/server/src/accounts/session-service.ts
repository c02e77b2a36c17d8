import type { Session } from '#contract';
import { v7 as newId } from 'uuid';
import type { Context } from '../platform/context.ts';
import { withOrg } from '../platform/context.ts';
import type { Database } from '../platform/database.ts';
import { announceEndOfSession } from '../platform/events.ts';
import { NotSignedIn, SignInFailed } from '../platform/problems.ts';
import {
  findFirstMembership, findPersonByEmail, findRoles, findSessionView, insertSession, lockSession, revokeSession, rotateSession, sessionStands,
} from './account-queries.ts';
import { verifyPassword } from './password.ts';
import { type Claims, newRefreshToken, type RefreshToken, sameHash } from './tokens.ts';

export const REFRESH_DAYS = 30;
/** Two tabs may send the same refresh token at nearly the same time. */
const PREVIOUS_ACCEPTED_MS = 10_000;

/** A sign-in that holds: what the cookies are made of. */
export interface SignedIn {
  readonly claims: Claims;
  /** Null: the token that the browser got a moment ago stays. */
  readonly refresh: RefreshToken | null;
}

const inThirtyDays = (): Date => new Date(Date.now() + REFRESH_DAYS * 86_400_000);

/** @throws {SignInFailed} the same for an unknown address, a wrong password and a person without an organisation */
export async function signIn(database: Database, email: string, password: string, userAgent: string): Promise<SignedIn> {
  const person = await findPersonByEmail(database.auth, email.trim());
  const matches = await verifyPassword(person?.passwordHash, password);
  const membership = person && matches ? await findFirstMembership(database.auth, person.id) : undefined;
  if (!person || !membership) throw new SignInFailed();
  const sessionId = newId();
  const refresh = newRefreshToken(sessionId);
  await insertSession(database.auth, {
    id: sessionId, orgId: membership.orgId, personId: person.id, refreshHash: refresh.hash,
    expiresAt: inThirtyDays(), userAgent: userAgent.slice(0, 300),
  });
  return { claims: { personId: person.id, orgId: membership.orgId, sessionId, roles: membership.roles as Claims['roles'] }, refresh };
}

/**
 * Exchanges a refresh token for a new one. The token before is accepted for a few seconds; any older one means that
 * somebody copied it: the session ends for everybody.
 *
 * @throws {NotSignedIn}
 */
export async function refresh(database: Database, token: RefreshToken | null): Promise<SignedIn> {
  if (!token) throw new NotSignedIn();
  const outcome = await database.auth.transaction(async (tx) => {
    const session = await lockSession(tx, token.sessionId);
    if (!session || session.revokedAt || session.expiresAt <= new Date()) return 'gone';
    const current = sameHash(session.refreshHash, token.hash);
    const inGrace = Date.now() - session.rotatedAt.getTime() <= PREVIOUS_ACCEPTED_MS;
    if (!current && !(inGrace && session.previousHash && sameHash(session.previousHash, token.hash))) {
      await revokeSession(tx, session.id);
      return 'reused';
    }
    const roles = await findRoles(tx, session.orgId, session.personId);
    const next = current ? newRefreshToken(session.id) : null;
    if (next) await rotateSession(tx, session.id, next.hash, token.hash, inThirtyDays());
    return { claims: { personId: session.personId, orgId: session.orgId, sessionId: session.id, roles }, refresh: next };
  });
  if (outcome === 'reused') await announceEndOfSession(database.auth, token.sessionId);
  if (typeof outcome === 'string') throw new NotSignedIn();
  return outcome;
}

/** Ends a session on all its tabs and server instances. */
export async function signOut(database: Database, sessionId: string): Promise<void> {
  await revokeSession(database.auth, sessionId);
  await announceEndOfSession(database.auth, sessionId);
}

/** @throws {NotSignedIn} where the person is no member any more */
export async function sessionOf(context: Pick<Context, 'orgId' | 'personId' | 'database'>): Promise<Session> {
  const view = await withOrg(context as Context, (tx) => findSessionView(tx, context.orgId, context.personId));
  if (!view) throw new NotSignedIn();
  return view;
}

/** Whether the session has neither ended nor expired. */
export const standsStill = ({ database, sessionId }: Context): Promise<boolean> => sessionStands(database.auth, sessionId);
