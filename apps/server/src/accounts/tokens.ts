import { type Role, roles } from '#contract';
import jwt from 'jsonwebtoken';
import { createHash, randomBytes, timingSafeEqual } from 'node:crypto';

export const ACCESS_SECONDS = 600;
const ISSUER = 'lanewright';

export interface Claims {
  readonly personId: string;
  readonly orgId: string;
  readonly sessionId: string;
  readonly roles: readonly Role[];
}

export const signAccess = (secret: string, claims: Claims): string =>
  jwt.sign({ org: claims.orgId, sid: claims.sessionId, roles: claims.roles }, secret, {
    algorithm: 'HS256', issuer: ISSUER, subject: claims.personId, expiresIn: ACCESS_SECONDS,
  });

/** The claims of a token that is ours and has not expired, else null. */
export function readAccess(secret: string, token: string): Claims | null {
  try {
    const claims = jwt.verify(token, secret, { algorithms: ['HS256'], issuer: ISSUER }) as jwt.JwtPayload;
    const held = (claims['roles'] as string[]).filter((r): r is Role => (roles as readonly string[]).includes(r));
    return { personId: claims.sub ?? '', orgId: String(claims['org']), sessionId: String(claims['sid']), roles: held };
  } catch {
    return null;
  }
}

/** A refresh token names its session, so that an old one can be told from one that never was. */
export interface RefreshToken {
  readonly sessionId: string;
  readonly text: string;
  readonly hash: string;
}

export const newRefreshToken = (sessionId: string): RefreshToken => describe(sessionId, randomBytes(32).toString('base64url'));

export function parseRefreshToken(text: unknown): RefreshToken | null {
  const parts = typeof text === 'string' ? /^([0-9a-f-]{36})\.([\w-]{43})$/.exec(text) : null;
  return parts ? describe(parts[1] ?? '', parts[2] ?? '') : null;
}

const describe = (sessionId: string, secret: string): RefreshToken => ({
  sessionId, text: `${sessionId}.${secret}`, hash: createHash('sha256').update(secret).digest('hex'),
});

export const sameHash = (a: string, b: string): boolean =>
  a.length === b.length && timingSafeEqual(Buffer.from(a), Buffer.from(b));
