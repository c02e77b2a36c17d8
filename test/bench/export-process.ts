/** Reads a design, assesses it and exports its I/O list: `export-process.ts csv|xlsx|nothing DESIGN FOLDER`. */
import { assess, type Design } from '#calc';
import { ioList } from '#documents';
import { createWriteStream, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { ioListCsv } from '../../apps/server/src/documents/io-list-csv.ts';
import { writeIoListXlsx } from '../../apps/server/src/documents/io-list-xlsx.ts';

const [format, path, folder] = process.argv.slice(2);
const design = JSON.parse(readFileSync(path, 'utf8')) as Design;
const assessment = assess(design);
if (format !== 'nothing') {
  const list = ioList(design, assessment, '2026-05-04');
  if (format === 'csv') await pipeline(ioListCsv(list, { delimiter: ',', decimal: '.', bom: true }), createWriteStream(join(folder, 'list.csv')));
  else await writeIoListXlsx(list, join(folder, 'list.xlsx'));
}
