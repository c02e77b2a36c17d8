/** What a handler answers: a status, a JSON value (or finished JSON text), headers. */
export class Answer {
  constructor(readonly status: number, readonly body: unknown, readonly headers: Readonly<Record<string, string>> = {}) {}
}

/** JSON that the database has written already. */
export class JsonText {
  constructor(readonly text: string) {}
}

export const ok = (body: unknown, headers?: Record<string, string>) => new Answer(200, body, headers);
export const created = (body: unknown, headers?: Record<string, string>) => new Answer(201, body, headers);
export const noContent = () => new Answer(204, undefined);
export const notModified = (headers: Record<string, string>) => new Answer(304, undefined, headers);

/** The ETag of a row or a project. */
export const etag = (version: number | string) => `"${version}"`;
