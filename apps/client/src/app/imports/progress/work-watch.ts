import { computed, DestroyRef, inject, Injectable, signal } from '@angular/core';
import { catchError, EMPTY, exhaustMap, type Subscription, timer } from 'rxjs';
import { ImportApi } from '../import-api';
import type { ImportProgress, ProgressStage } from './progress-words';
import { TimeLeft } from './time-left';

const POLL_MS = 500;
const QUIET_MS = 400;

/** Watches one job at a time: bytes on their way, then the server's work, asked for every half second. */
@Injectable()
export class WorkWatch {
  private readonly api = inject(ImportApi);
  private readonly state = signal<ImportProgress | null>(null);
  private readonly late = signal(false);
  private readonly left = new TimeLeft();
  private quiet: ReturnType<typeof setTimeout> | undefined;
  private polling: Subscription | null = null;
  private stopping: Subscription | null = null;

  /** What to show; null for the first 400 ms, so that a small file does not make the screen flicker. */
  readonly progress = computed(() => (this.late() ? this.state() : null));

  constructor() {
    inject(DestroyRef).onDestroy(() => this.end());
  }

  begin(stage: ProgressStage): void {
    this.end();
    this.state.set({ stage, done: 0, total: null, leftMs: null });
    this.quiet = setTimeout(() => this.late.set(true), QUIET_MS);
  }

  /** Bytes that have gone. */
  sent(done: number, total: number | null): void {
    this.show('sending', done, total);
  }

  /** Asks the server from now on, until the job ends; an answer that fails says nothing. */
  follow(projectId: string, importId: string): void {
    if (this.polling) return;
    this.polling = timer(POLL_MS, POLL_MS)
      .pipe(exhaustMap(() => this.api.work(projectId, importId).pipe(catchError(() => EMPTY))))
      .subscribe((work) => { if (work) this.show(work.stage, work.done, work.total); });
  }

  /** Asks the server to stop, again and again until the job has ended: it may not have begun when asked first. */
  stop(projectId: string, importId: string): void {
    if (this.stopping) return;
    this.show('stopping', 0, null);
    this.late.set(true);
    this.stopping = timer(0, POLL_MS)
      .pipe(exhaustMap(() => this.api.stop(projectId, importId).pipe(catchError(() => EMPTY))))
      .subscribe();
  }

  end(): void {
    clearTimeout(this.quiet);
    this.polling?.unsubscribe();
    this.stopping?.unsubscribe();
    this.polling = null;
    this.stopping = null;
    this.left.restart();
    this.late.set(false);
    this.state.set(null);
  }

  private show(stage: ProgressStage, done: number, total: number | null): void {
    if (this.stopping) return;
    if (this.state()?.stage !== stage) this.left.restart();
    this.state.set({ stage, done, total, leftMs: this.left.next({ atMs: performance.now(), done }, total) });
  }
}
