import { Observable, retry, switchMap, timer } from 'rxjs';

const RETRY_MS = 5000;

/**
 * Sequence numbers of a project as the server announces them, until unsubscribed. A browser reconnects a broken stream
 * by itself, but not one that was refused: that ends with an error after which `renewed` is asked for a fresh sign-in.
 */
export const liveChanges = (projectId: string, renewed: () => Promise<unknown>): Observable<number> =>
  stream(projectId).pipe(
    retry({ delay: () => timer(RETRY_MS).pipe(switchMap(() => renewed())) }),
  );

const stream = (projectId: string): Observable<number> =>
  new Observable((subscriber) => {
    const source = new EventSource(`/api/v1/projects/${projectId}/events`);
    source.addEventListener('change', (event: MessageEvent<string>) => {
      subscriber.next((JSON.parse(event.data) as { sequence: number }).sequence);
    });
    source.addEventListener('error', () => {
      if (source.readyState === EventSource.CLOSED) subscriber.error(new Error('The stream of changes was refused'));
    });
    return () => source.close();
  });
