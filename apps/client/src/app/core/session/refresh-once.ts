import { firstValueFrom } from 'rxjs';
import type { SessionApi } from './session-api';

let running: Promise<unknown> | null = null;

/** One refresh at a time: within a tab by sharing the promise, between tabs by a Web Lock where the browser has one. */
export function refreshOnce(api: SessionApi): Promise<unknown> {
  running ??= locked(() => firstValueFrom(api.refresh())).finally(() => (running = null));
  return running;
}

const locked = <T>(work: () => Promise<T>): Promise<T> =>
  'locks' in navigator ? (navigator.locks.request('lanewright-refresh', work) as Promise<T>) : work();
