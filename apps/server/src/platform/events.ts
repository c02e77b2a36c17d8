import { sql } from 'drizzle-orm';
import { EventEmitter } from 'node:events';
import postgres from 'postgres';
import type { Database, Tx } from './database.ts';

const CHANGES = 'lanewright_changes';
const ENDED_SESSIONS = 'lanewright_sessions';
/** As long as an access token lives: after that, a token of an ended session is expired anyway. */
const REMEMBER_ENDED_MS = 15 * 60_000;

/** Tells all instances that a project has a new sequence number; seen when the transaction commits. */
export const announceChange = (tx: Tx, projectId: string, sequence: number) =>
  tx.execute(sql`select pg_notify(${CHANGES}, ${JSON.stringify([projectId, sequence])})`);

/** Tells all instances that a session has ended. */
export const announceEndOfSession = (auth: Database['auth'], sessionId: string) =>
  auth.execute(sql`select pg_notify(${ENDED_SESSIONS}, ${sessionId})`);

/**
 * What other instances (and this one) announce through PostgreSQL. LISTEN holds a direct connection of its own; when
 * that was lost and is back, `missed` is told, since announcements may have passed by.
 */
export class Announcements {
  private readonly emitter = new EventEmitter().setMaxListeners(0);
  private readonly ended = new Map<string, number>();
  private readonly connection: postgres.Sql;

  constructor(listenUrl: string) {
    this.connection = postgres(listenUrl, { max: 1, idle_timeout: 0, onnotice: () => undefined });
  }

  async start(): Promise<void> {
    let started = false;
    await this.connection.listen(CHANGES, (text) => {
      const [projectId, sequence] = JSON.parse(text) as [string, number];
      this.emitter.emit(`change ${projectId}`, sequence);
    }, () => {
      if (started) this.emitter.emit('missed');
      started = true;
    });
    await this.connection.listen(ENDED_SESSIONS, (sessionId) => {
      this.forgetOld();
      this.ended.set(sessionId, Date.now());
      this.emitter.emit(`ended ${sessionId}`);
    });
  }

  /** Whether a session was ended a short while ago, so that its access token must not be taken any more. */
  hasEnded(sessionId: string): boolean {
    return this.ended.has(sessionId);
  }

  /** @returns a function that stops listening */
  subscribe(projectId: string, sessionId: string, on: { change: (sequence: number) => void; missed: () => void; ended: () => void }): () => void {
    const handlers = [[`change ${projectId}`, on.change], ['missed', on.missed], [`ended ${sessionId}`, on.ended]] as const;
    for (const [name, handler] of handlers) this.emitter.on(name, handler);
    return () => {
      for (const [name, handler] of handlers) this.emitter.off(name, handler);
    };
  }

  async close(): Promise<void> {
    await this.connection.end({ timeout: 5 });
  }

  private forgetOld(): void {
    const oldest = Date.now() - REMEMBER_ENDED_MS;
    for (const [id, at] of this.ended) if (at < oldest) this.ended.delete(id);
  }
}
