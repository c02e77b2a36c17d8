import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { Session, SignIn } from '#contract';
import type { Observable } from 'rxjs';

@Injectable({ providedIn: 'root' })
export class SessionApi {
  private readonly http = inject(HttpClient);

  /** Who is signed in on this device; answers 401 when nobody is. */
  current(): Observable<Session> {
    return this.http.get<Session>('/api/v1/auth/session');
  }

  signIn(credentials: SignIn): Observable<Session> {
    return this.http.post<Session>('/api/v1/auth/sign-in', credentials);
  }

  refresh(): Observable<Session> {
    return this.http.post<Session>('/api/v1/auth/refresh', {});
  }

  signOut(): Observable<void> {
    return this.http.post<void>('/api/v1/auth/sign-out', {});
  }
}
