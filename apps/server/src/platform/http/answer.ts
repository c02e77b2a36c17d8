import { promisify } from 'node:util';
import { constants, gzip } from 'node:zlib';

/** What a handler answers: a status, a JSON value (or finished JSON text), headers. */
export class Answer {
  constructor(readonly status: number, readonly body: unknown, readonly headers: Readonly<Record<string, string>> = {}) {}
}

const compress = promisify(gzip);

/** JSON that the database has written already. */
export class JsonText {
  private compressed: Promise<Buffer> | undefined;

  constructor(readonly text: string) {}

  /** Its compressed form, made once. */
  gzip(): Promise<Buffer> {
    return (this.compressed ??= compressed(this.text));
  }
}

/** Gzip at its fastest: over a local network more would take longer than it saves. */
export const compressed = (text: string): Promise<Buffer> => compress(text, { level: constants.Z_BEST_SPEED });

export const ok = (body: unknown, headers?: Record<string, string>) => new Answer(200, body, headers);
export const created = (body: unknown, headers?: Record<string, string>) => new Answer(201, body, headers);
export const noContent = () => new Answer(204, undefined);
export const notModified = (headers: Record<string, string>) => new Answer(304, undefined, headers);

/** The ETag of a row or a project. */
export const etag = (version: number | string) => `"${version}"`;
