import { Observable } from 'rxjs';

/** Sequence numbers of a project as the server announces them; reconnects by itself until unsubscribed. */
export const liveChanges = (projectId: string): Observable<number> =>
  new Observable((subscriber) => {
    const source = new EventSource(`/api/v1/projects/${projectId}/events`);
    source.addEventListener('change', (event: MessageEvent<string>) => {
      subscriber.next((JSON.parse(event.data) as { sequence: number }).sequence);
    });
    return () => source.close();
  });
