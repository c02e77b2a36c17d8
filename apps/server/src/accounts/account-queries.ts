import { memberships, organisations, people, sessions } from '#schema';
import { and, asc, eq, sql } from 'drizzle-orm';
import type { Role, Session } from '#contract';
import type { Database, Tx } from '../platform/database.ts';

type Auth = Database['auth'];
type AuthTx = Parameters<Parameters<Auth['transaction']>[0]>[0];

export async function findPersonByEmail(auth: Auth, email: string) {
  const [person] = await auth.select({ id: people.id, passwordHash: people.passwordHash }).from(people)
    .where(sql`lower(${people.email}) = lower(${email})`);
  return person;
}

/** The organisation that a person joined first. */
export async function findFirstMembership(auth: Auth, personId: string) {
  const [membership] = await auth.select().from(memberships).where(eq(memberships.personId, personId))
    .orderBy(asc(memberships.createdAt), asc(memberships.orgId)).limit(1);
  return membership;
}

export async function insertSession(auth: Auth, row: typeof sessions.$inferInsert): Promise<void> {
  await auth.insert(sessions).values(row);
}

/** Locked until the transaction ends: two refreshes of one session come one after the other. */
export async function lockSession(tx: AuthTx, id: string) {
  const [session] = await tx.select().from(sessions).where(eq(sessions.id, id)).for('update');
  return session;
}

export async function findRoles(tx: AuthTx, orgId: string, personId: string): Promise<readonly Role[]> {
  const [row] = await tx.select({ roles: memberships.roles }).from(memberships)
    .where(and(eq(memberships.orgId, orgId), eq(memberships.personId, personId)));
  return (row?.roles ?? []) as Role[];
}

export async function rotateSession(tx: AuthTx, id: string, newHash: string, previousHash: string, expiresAt: Date): Promise<void> {
  await tx.update(sessions).set({ refreshHash: newHash, previousHash, rotatedAt: sql`now()`, expiresAt }).where(eq(sessions.id, id));
}

export async function revokeSession(auth: Auth | AuthTx, id: string): Promise<void> {
  await auth.update(sessions).set({ revokedAt: sql`now()` }).where(and(eq(sessions.id, id), sql`${sessions.revokedAt} is null`));
}

/** Whether the session still stands, and until when. */
export async function sessionStands(auth: Auth, id: string): Promise<boolean> {
  const [row] = await auth.select({ id: sessions.id }).from(sessions)
    .where(and(eq(sessions.id, id), sql`${sessions.revokedAt} is null and ${sessions.expiresAt} > now()`));
  return row !== undefined;
}

export async function findSessionView(tx: Tx, orgId: string, personId: string): Promise<Session | undefined> {
  const [row] = await tx.select({
    person: { id: people.id, name: people.name, email: people.email },
    organisation: { id: organisations.id, name: organisations.name },
    roles: memberships.roles,
  }).from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .innerJoin(organisations, eq(organisations.id, memberships.orgId))
    .where(and(eq(memberships.orgId, orgId), eq(memberships.personId, personId)));
  return row as Session | undefined;
}
