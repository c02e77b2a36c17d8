import { inject } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { Router } from '@angular/router';
import { SessionStore } from './session-store';

/** Sends a stranger to the sign-in page and back to where they wanted to go. The server still decides. */
export const signedInGuard: CanActivateFn = async (_route, state) => {
  const store = inject(SessionStore);
  const router = inject(Router);
  const session = await store.restore();
  return session ? true : router.createUrlTree(['/sign-in'], { queryParams: { from: state.url } });
};
