import { type Permission, rolesAllow } from '#contract';
import type { Context } from './context.ts';
import { NotAllowed } from './problems.ts';

/** What a route demands. `public` is for what comes before sign-in. */
export type RoutePermission = Permission | 'public';

/** @throws {NotAllowed} where none of the person's roles includes the permission */
export function requirePermission(context: Context, permission: Permission): void {
  if (!rolesAllow(context.roles, permission)) throw new NotAllowed();
}
