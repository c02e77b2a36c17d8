import { computed, inject, Injectable, signal } from '@angular/core';
import type { Permission, Role, Session } from '#contract';
import { rolesAllow } from '#contract/permissions';
import { firstValueFrom } from 'rxjs';
import { refreshOnce } from './refresh-once';
import { SessionApi } from './session-api';

/** Who is signed in on this device, and what the server would let them do. */
@Injectable({ providedIn: 'root' })
export class SessionStore {
  private readonly api = inject(SessionApi);
  private readonly state = signal<Session | null>(null);
  private loaded = false;

  readonly session = this.state.asReadonly();
  readonly roles = computed<readonly Role[]>(() => this.state()?.roles ?? []);

  can(permission: Permission): boolean {
    return rolesAllow(this.roles(), permission);
  }

  /** Asks the server once whether the cookies of this device still hold. */
  async restore(): Promise<Session | null> {
    if (this.loaded) return this.state();
    this.loaded = true;
    try {
      this.state.set(await firstValueFrom(this.api.current()));
    } catch {
      this.state.set(null);
    }
    return this.state();
  }

  /** @throws the server's problem where e-mail or password are wrong */
  async signIn(email: string, password: string): Promise<void> {
    this.state.set(await firstValueFrom(this.api.signIn({ email, password })));
    this.loaded = true;
  }

  async signOut(): Promise<void> {
    await firstValueFrom(this.api.signOut());
    this.state.set(null);
  }

  /** Renews the sign-in of this device. Rejects where it has ended. */
  renew(): Promise<unknown> {
    return refreshOnce(this.api);
  }

  /** The server no longer knows this device: sign-in begins anew. */
  expire(): void {
    this.state.set(null);
  }
}
