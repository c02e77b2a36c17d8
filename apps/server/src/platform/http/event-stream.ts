import type { Request, Response } from 'express';

const HEARTBEAT_MS = 20_000;

export interface EventStream {
  send(event: string, data: object, id: number): void;
  end(): void;
  /** Runs `work` once when the stream is over, whoever ended it. */
  whenClosed(work: () => void): void;
}

/** Answers with server-sent events. At each heartbeat it is asked whether the listener may still listen. */
export function openStream(req: Request, res: Response, { stillAllowed }: { readonly stillAllowed: () => Promise<boolean> }): EventStream {
  res.status(200).set({ 'Content-Type': 'text/event-stream', 'Cache-Control': 'no-store', 'X-Accel-Buffering': 'no' });
  res.flushHeaders();
  res.write('retry: 2000\n\n');
  const heartbeat = setInterval(() => {
    res.write(':\n\n');
    stillAllowed().then((allowed) => allowed || res.end(), () => res.end());
  }, HEARTBEAT_MS);
  const closers = [() => clearInterval(heartbeat)];
  res.once('close', () => closers.forEach((close) => close()));
  return {
    send: (event, data, id) => void res.write(`id: ${id}\nevent: ${event}\ndata: ${JSON.stringify(data)}\n\n`),
    end: () => void res.end(),
    whenClosed: (work) => void (res.closed || req.destroyed ? work() : closers.push(work)),
  };
}
