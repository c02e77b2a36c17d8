import type { HttpErrorResponse, HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { Router } from '@angular/router';
import { catchError, defer, from, switchMap, throwError } from 'rxjs';
import { SessionApi } from './session-api';
import { SessionStore } from './session-store';
import { refreshOnce } from './refresh-once';

/** Renews a short-lived sign-in behind the scenes: a refused request refreshes once and is repeated. */
export const sessionInterceptor: HttpInterceptorFn = (request, next) => {
  const api = inject(SessionApi);
  const store = inject(SessionStore);
  const router = inject(Router);
  if (/\/auth\/(sign-in|refresh|sign-out)$/.test(request.url)) return next(request);
  return next(request).pipe(
    catchError((refused: HttpErrorResponse) => {
      if (refused.status !== 401) return throwError(() => refused);
      return defer(() => from(refreshOnce(api))).pipe(
        catchError(() => {
          const wasSignedIn = store.session() !== null;
          store.expire();
          if (wasSignedIn) void router.navigate(['/sign-in'], { queryParams: { from: router.url } });
          return throwError(() => refused);
        }),
        switchMap(() => next(request)),
      );
    }),
  );
};
