import type { Request, Response } from 'express';
import { type Answer, compressed, JsonText } from './answer.ts';

/** Below this, compressing costs more than it saves. */
const WORTH_COMPRESSING = 4096;

/** Sends an answer as JSON, compressed where that is worth it. Nothing of the API is kept by shared caches. */
export async function send(req: Request, res: Response, answer: Answer): Promise<void> {
  res.status(answer.status).set({ 'Cache-Control': 'private, no-cache', ...answer.headers });
  if (answer.body === undefined) {
    res.end();
    return;
  }
  const json = answer.body instanceof JsonText ? answer.body : null;
  const text = json?.text ?? JSON.stringify(answer.body);
  res.set('Content-Type', 'application/json; charset=utf-8').vary('Accept-Encoding');
  if (text.length < WORTH_COMPRESSING || !req.acceptsEncodings('gzip')) {
    res.end(text);
    return;
  }
  res.set('Content-Encoding', 'gzip').end(await (json?.gzip() ?? compressed(text)));
}
