import type { IoList } from '#documents';
import type { Response } from 'express';
import { randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { Type } from 'typebox';
import { route, type Route } from '../platform/http/route.ts';
import { safeFileName } from './file-name.ts';
import { ioListCsv } from './io-list-csv.ts';
import { readIoList } from './io-list-service.ts';
import { writeIoListXlsx } from './io-list-xlsx.ts';

const CSV = 'text/csv; charset=utf-8; header=present';
const XLSX = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet';

const CsvQuery = Type.Object({
  delimiter: Type.Enum(['comma', 'semicolon', 'tab'], { default: 'comma' }),
  decimal: Type.Enum(['point', 'comma'], { default: 'point' }),
  bom: Type.Boolean({ default: true }),
}, { additionalProperties: false });

const DELIMITERS = { comma: ',', semicolon: ';', tab: '\t' } as const;
const DECIMALS = { point: '.', comma: ',' } as const;

export const documentRoutes: readonly Route[] = [
  route({
    method: 'get', path: '/projects/:projectId/documents/io-list.csv', permission: 'project:read', summary: 'The I/O list as CSV, which the import takes',
    query: CsvQuery, produces: 'text/csv', answers: { 200: null },
    handle: async ({ context, params, query, res }) => {
      const list = await readIoList(context, params.projectId);
      announce(res, list, CSV, 'csv');
      await stream(ioListCsv(list, { delimiter: DELIMITERS[query.delimiter], decimal: DECIMALS[query.decimal], bom: query.bom }), res);
    },
  }),
  route({
    method: 'get', path: '/projects/:projectId/documents/io-list.xlsx', permission: 'project:read', summary: 'The I/O list as a workbook, a sheet a cabinet',
    produces: XLSX, answers: { 200: null },
    handle: async ({ context, params, res }) => {
      const list = await readIoList(context, params.projectId);
      const path = join(tmpdir(), `lanewright-${randomUUID()}.xlsx`);
      try {
        await writeIoListXlsx(list, path);
        announce(res, list, XLSX, 'xlsx');
        await stream(createReadStream(path), res);
      } finally {
        await rm(path, { force: true });
      }
    },
  }),
];

/** What the browser saves it as; the name says that it is a draft. */
function announce(res: Response, { project, date }: IoList, type: string, extension: string): void {
  const name = safeFileName([project, 'io-list', 'draft', date], extension);
  res.set({ 'Content-Type': type, 'Content-Disposition': `attachment; filename="${name}"`, 'Cache-Control': 'private, no-store' });
}

/** Sends a stream to its end. A reader who leaves early is no error of the server. */
async function stream(source: Readable, res: Response): Promise<void> {
  try {
    await pipeline(source, res);
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE')) throw error;
  }
}
