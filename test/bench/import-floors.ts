import { parse } from 'csv-parse';
import exceljs from 'exceljs';
import { createReadStream } from 'node:fs';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type postgres from 'postgres';
import { asBenchOrganisation, type BenchServer } from './bench-server.ts';
import { IMPORT_FIELDS } from './import-files.ts';

/** Rows of texts in the order of `IMPORT_FIELDS`, without the heading row. */
type Rows = AsyncIterable<readonly string[]>;

/** The least that an import of a CSV can be: csv-parse, COPY to a temporary table, upsert. @returns rows taken */
export const csvFloor = (server: BenchServer, projectId: string, path: string): Promise<number> =>
  load(server, projectId, createReadStream(path).pipe(parse({ bom: true, from_line: 2 })) as Rows);

/** The same for a workbook, with exceljs's stream reader. @returns rows taken */
export const xlsxFloor = (server: BenchServer, projectId: string, path: string): Promise<number> => load(server, projectId, workbookRows(path));

async function* workbookRows(path: string): AsyncGenerator<readonly string[]> {
  const reader = new exceljs.stream.xlsx.WorkbookReader(path, { worksheets: 'emit', sharedStrings: 'cache', styles: 'ignore', hyperlinks: 'ignore' });
  for await (const sheet of reader) {
    for await (const row of sheet) {
      if (row.number > 1) yield IMPORT_FIELDS.map((_, i) => textOf(row.getCell(i + 1).value));
    }
  }
}

const textOf = (value: exceljs.CellValue): string => (typeof value === 'string' ? value : typeof value === 'number' ? String(value) : '');

async function load({ app, orgId }: BenchServer, projectId: string, rows: Rows): Promise<number> {
  return asBenchOrganisation(app, orgId, async (tx) => {
    await tx.unsafe(`create temporary table incoming (${IMPORT_FIELDS.map(({ column }) => `${column} text`).join(', ')}) on commit drop`);
    await pipeline(Readable.from(copyLines(rows)), await tx.unsafe('copy incoming from stdin').writable());
    await tx.unsafe('analyze incoming');
    await upsert(tx, orgId, projectId);
    const [{ count }] = await tx.unsafe<{ count: number }[]>('select count(*)::int as count from incoming');
    return count;
  });
}

const BATCH_CHARACTERS = 65_536;
const SPECIAL = /[\\\t\n\r]/g;
const ESCAPES: Readonly<Record<string, string>> = { '\\': '\\\\', '\t': '\\t', '\n': '\\n', '\r': '\\r' };

/** Lines in COPY's text format, many to a chunk; an empty cell is null. */
async function* copyLines(rows: Rows): AsyncGenerator<string> {
  let chunk = '';
  for await (const row of rows) {
    chunk += `${row.map((cell) => (cell === '' ? '\\N' : cell.replace(SPECIAL, (each) => ESCAPES[each]))).join('\t')}\n`;
    if (chunk.length < BATCH_CHARACTERS) continue;
    yield chunk;
    chunk = '';
  }
  if (chunk !== '') yield chunk;
}

const POINT_FIELDS = IMPORT_FIELDS.filter(({ table }) => table === 'points');

/** MERGE, since ON CONFLICT takes no deferrable constraint. */
async function upsert(tx: postgres.TransactionSql, orgId: string, projectId: string): Promise<void> {
  const own = POINT_FIELDS.filter(({ column }) => column !== 'tag');
  const names = POINT_FIELDS.map(({ column }) => column).join(', ');
  await tx.unsafe(`
    merge into points p using incoming i on p.project_id = '${projectId}' and p.tag = i.tag
    when matched then update set ${own.map(({ column, type }) => `${column} = i.${column}::${type}`).join(', ')}, version = p.version + 1
    when not matched then insert (id, org_id, project_id, ${names})
      values (gen_random_uuid(), '${orgId}', '${projectId}', ${POINT_FIELDS.map(({ column, type }) => `i.${column}::${type}`).join(', ')})`);
  await tx.unsafe(`
    merge into dispensers d using (
      select p.id as point_id, t.id as type_id, t.wiring, (i.cartridge_cm3::numeric * 1000)::int as cartridge_ul, (i.dose_cm3::numeric * 1000)::int as dose_ul
      from incoming i join points p on p.project_id = '${projectId}' and p.tag = i.tag left join dispenser_types t on t.name = i.type_name
    ) i on d.point_id = i.point_id
    when matched then update set type_id = i.type_id, wiring = i.wiring, cartridge_ul = i.cartridge_ul, dose_ul = i.dose_ul, version = d.version + 1
    when not matched then insert (id, org_id, project_id, point_id, type_id, wiring, cartridge_ul, dose_ul)
      values (gen_random_uuid(), '${orgId}', '${projectId}', i.point_id, i.type_id, i.wiring, i.cartridge_ul, i.dose_ul)`);
}
