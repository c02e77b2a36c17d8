import express, { type RequestHandler, type Response } from 'express';
import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { compressedFiles } from './compressed-files.ts';

const HASHED = /-[A-Za-z0-9_-]{8,}\.(js|css|woff2?|ttf|svg|png|webp)$/;

/** The built client: its files, and index.html for every address of its own. */
export interface ClientFiles {
  /** One for each build, for component styles: a nonce for each request would change the page's bytes. */
  readonly styleNonce: string;
  readonly files: RequestHandler[];
  readonly page: RequestHandler;
}

/** @throws when the folder holds no index.html */
export function clientFiles(folder: string): ClientFiles {
  const index = readFileSync(join(folder, 'index.html'), 'utf8');
  const styleNonce = createHash('sha256').update(index).digest('base64url').slice(0, 22);
  const page = withNonce(index, styleNonce);
  return {
    styleNonce,
    files: [compressedFiles(folder, setCaching), express.static(folder, { index: false, setHeaders: setCaching })],
    page: (req, res, next) => {
      if (req.method !== 'GET' && req.method !== 'HEAD') return next();
      // A file that is missing is missing; only addresses of pages get the page.
      if (/\.\w+$/.test(req.path)) return next();
      res.set('Cache-Control', 'no-cache').type('html').send(page);
    },
  };
}

const setCaching = (res: Response, path: string): void => {
  res.set('Cache-Control', HASHED.test(path) ? 'public, max-age=31536000, immutable' : 'no-cache');
};

function withNonce(index: string, nonce: string): string {
  const filled = index.replaceAll('BUILD_STYLE_NONCE', nonce);
  return filled.includes('ngCspNonce') ? filled : filled.replace('<lw-root', `<lw-root ngCspNonce="${nonce}"`);
}
