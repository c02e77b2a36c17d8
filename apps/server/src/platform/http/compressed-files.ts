import type { RequestHandler, Response } from 'express';
import { readdirSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { extname, join, sep } from 'node:path';
import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';

const TYPES: Readonly<Record<string, string>> = {
  '.js': 'text/javascript; charset=utf-8', '.css': 'text/css; charset=utf-8', '.svg': 'image/svg+xml', '.json': 'application/json; charset=utf-8',
};
/** A build's files are compressed once, so that more effort pays. */
const encoders = {
  br: (bytes: Buffer) => promisify(brotliCompress)(bytes, { params: { [constants.BROTLI_PARAM_QUALITY]: 9 } }),
  gzip: (bytes: Buffer) => promisify(gzip)(bytes),
} as const;
type Encoding = keyof typeof encoders;
const preferred = ['br', 'gzip'] as const;

/** Sends the texts of a folder compressed, each compressed at its first request and then kept; passes on all else. */
export function compressedFiles(folder: string, setHeaders: (res: Response, path: string) => void): RequestHandler {
  const names = readdirSync(folder, { recursive: true }).map(String).filter((name) => TYPES[extname(name)]);
  const known = new Set(names.map((name) => `/${name.split(sep).join('/')}`));
  const kept = new Map<string, Promise<Buffer>>();
  const compressed = (path: string, encoding: Encoding): Promise<Buffer> => {
    const key = `${encoding} ${path}`;
    const bytes = kept.get(key) ?? readFile(join(folder, path)).then(encoders[encoding]);
    kept.set(key, bytes);
    return bytes;
  };
  return async (req, res, next) => {
    const encoding = known.has(req.path) && req.method === 'GET' && preferred.find((one) => req.acceptsEncodings(one));
    if (!encoding) return next();
    const bytes = await compressed(req.path, encoding);
    setHeaders(res, req.path);
    res.set({ 'Content-Type': TYPES[extname(req.path)] ?? '', 'Content-Encoding': encoding, 'Content-Length': String(bytes.length) }).vary('Accept-Encoding').end(bytes);
  };
}
