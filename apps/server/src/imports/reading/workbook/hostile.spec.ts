import { describe, expect, it } from 'vitest';
import { LIMITS } from '../grid.ts';
import { ImportRefusal, type RefusalCode } from '../import-refusal.ts';
import { Archive } from './archive.ts';
import { BOUNDS } from './bounds.ts';
import { readWorkbook } from './index.ts';
import { rowOf, stylesOf, workbookFiles, workbookOf } from './testing/workbook-files.ts';
import { zipOf, type ZipFiles } from './testing/zip-builder.ts';

async function refusalOf(bytes: Uint8Array): Promise<RefusalCode | 'read'> {
  try {
    await readWorkbook(bytes);
    return 'read';
  } catch (error) {
    if (!(error instanceof ImportRefusal)) throw error;
    expect([error.title, error.detail, error.remedy].every((text) => text.length > 10)).toBe(true);
    return error.code;
  }
}

const GOOD = workbookOf({ sheets: [rowOf('<c t="inlineStr"><is><t>Tag</t></is></c>'.repeat(40))] });
const types = (kind: string): string => `application/vnd.${kind}`;
const sheet = (content: string | Uint8Array, more: object = {}): Buffer =>
  workbookOf({ sheets: [{ content, ...more }] });
const withoutPart = (part: string): Buffer => zipOf(workbookFiles({}).filter(([name]) => name !== part));

/** A compound file with one directory entry of this name, as far as a reader of names needs it. */
function container(stream: string): Buffer {
  const file = Buffer.alloc(1536);
  Buffer.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1]).copy(file);
  Buffer.from(`${stream}\0`, 'utf16le').copy(file, 1024 + 128);
  file.writeUInt16LE(2 * (stream.length + 1), 1024 + 128 + 64);
  return file;
}

describe('files of another kind', () => {
  it.each<[string, Uint8Array, RefusalCode]>([
    ['nothing', new Uint8Array(), 'empty-file'],
    ['a file beyond the limit', new Uint8Array(LIMITS.bytes + 1), 'too-large'],
    ['a text', Buffer.from('Tag,Text\n'), 'compressed'],
    ['an encrypted workbook', container('EncryptedPackage'), 'workbook-encrypted'],
    ['a spreadsheet of the old kind', container('Workbook'), 'old-spreadsheet'],
    ['one of a still older kind', container('Book'), 'old-spreadsheet'],
    ['another old office document', container('WordDocument'), 'old-spreadsheet'],
    ['an archive of lists', zipOf([['list.csv', 'Tag\nA\n']]), 'compressed'],
    ['an archive of nothing', zipOf([]), 'compressed'],
    ['an archive with a password', zipOf([['list.csv', { content: 'x', flags: 1 }]]), 'workbook-encrypted'],
    [
      'a text document',
      workbookOf({ workbookType: types('openxmlformats-officedocument.wordprocessingml.document.main+xml') }),
      'compressed',
    ],
    [
      'a binary workbook',
      workbookOf({ workbookType: types('ms-excel.sheet.binary.macroEnabled.main') }),
      'workbook-binary',
    ],
    [
      'a workbook for macros',
      workbookOf({ workbookType: types('ms-excel.sheet.macroEnabled.main+xml') }),
      'workbook-macros',
    ],
    [
      'a workbook with macros under a plain type',
      workbookOf({ more: [['xl/vbaProject.bin', 'x']] }),
      'workbook-macros',
    ],
    [
      'an OpenDocument spreadsheet',
      zipOf([['mimetype', { content: types('oasis.opendocument.spreadsheet'), stored: true }]]),
      'open-document',
    ],
    ['a workbook without a sheet', workbookOf({ sheets: [] }), 'workbook-no-sheet'],
  ])('%s is refused', async (_name, bytes, code) => {
    expect(await refusalOf(bytes)).toBe(code);
  });

  it('a template is read, and so is a workbook whose sheet is empty', async () => {
    expect(
      await refusalOf(
        workbookOf({ workbookType: types('openxmlformats-officedocument.spreadsheetml.template.main+xml') }),
      ),
    ).toBe('read');
  });
});

describe('damaged workbooks', () => {
  it.each<[string, Uint8Array]>([
    ['cut off within its parts', GOOD.subarray(0, 300)],
    ['cut off within its directory', GOOD.subarray(0, GOOD.length - 60)],
    ['without its first half', Buffer.concat([GOOD.subarray(0, 4), GOOD.subarray(400)])],
    ['whose sheet is missing', withoutPart('xl/worksheets/s1.xml')],
    ['whose links are missing', withoutPart('xl/_rels/workbook.xml.rels')],
    ['whose workbook part is missing', withoutPart('xl/workbook.xml')],
    ['with a part twice', zipOf([...workbookFiles({}), ['XL/workbook.xml', 'x']])],
    ['with a wrong check sum', sheet('<worksheet/>', { crc: 1 })],
    ['with an unknown way of packing', sheet('<worksheet/>', { method: 12 })],
    ['with bytes that do not unpack', sheet(Buffer.from([0xff, 0xff, 0xff]), { stored: true, method: 8 })],
    ['with a part larger than the file', sheet('<worksheet/>', { claimed: { packed: 1_000_000 } })],
    ['with a part shorter than it says', sheet('<worksheet/>', { claimed: { unpacked: 4_000 } })],
    ['with XML that ends too early', sheet('<worksheet><sheetData>')],
    ['with XML that is none', sheet('Tag,Text')],
    ['with nothing where XML should be', sheet('')],
    ['with an entity that nobody knows', sheet('<worksheet>&bomb;</worksheet>')],
    [
      'with a text that is not in the table',
      workbookOf({ sheets: [rowOf('<c t="s"><v>7</v></c>')], strings: '<si><t>a</t></si>' }),
    ],
    ['with a row that has no place', workbookOf({ sheets: ['<sheetData><row r="0"/></sheetData>'] })],
    ['with a row beyond the last', workbookOf({ sheets: ['<sheetData><row r="9999999999"/></sheetData>'] })],
    ['with a cell that has no place', workbookOf({ sheets: [rowOf('<c r="?"/>')] })],
    ['with a merged range that is none', workbookOf({ sheets: ['<mergeCells><mergeCell ref="x"/></mergeCells>'] })],
  ])('%s are refused', async (_name, bytes) => {
    expect(await refusalOf(bytes)).toBe('workbook-damaged');
  });

  it('with blank bytes behind the archive are read', async () => {
    expect(await refusalOf(Buffer.concat([GOOD, Buffer.alloc(500)]))).toBe('read');
  });
});

describe('workbooks that would take memory or time', () => {
  const nine = (name: string, content: string): string => `<!ENTITY ${name} "${content.repeat(9)}">`;
  const laughs = `<!DOCTYPE x [${nine('a', 'ha')}${nine('b', '&a;')}${nine('c', '&b;')}]><worksheet>&c;</worksheet>`;
  const noughts = Buffer.alloc(40_000_000, '<worksheet>'.padEnd(1_000));
  const manyMerges = `<mergeCells>${Array.from({ length: BOUNDS.merges + 1 }, (_, i) => `<mergeCell ref="A${i + 1}:B${i + 1}"/>`).join('')}</mergeCells>`;
  const many = (count: number): ZipFiles => Array.from({ length: count }, (_, i) => [`xl/media/${i}.png`, ''] as const);

  it.each<[string, () => Buffer, RefusalCode]>([
    [
      'a directory that says so',
      () => sheet('x', { claimed: { unpacked: BOUNDS.unpackedBytes + 1 } }),
      'workbook-too-large',
    ],
    ['a 64-bit size', () => sheet('x', { wide: true, claimed: { unpacked: 2 ** 40 } }), 'workbook-too-large'],
    ['a ratio beyond any list', () => sheet(noughts), 'workbook-too-large'],
    ['a directory that lies', () => sheet(noughts, { claimed: { unpacked: 2_000 } }), 'workbook-too-large'],
    ['very many files', () => zipOf(many(BOUNDS.entries + 1)), 'workbook-too-large'],
    [
      'very many sheets',
      () => workbookOf({ sheets: Array.from({ length: BOUNDS.sheets + 1 }, () => '') }),
      'workbook-too-large',
    ],
    [
      'very many number formats',
      () => workbookOf({ styles: stylesOf(Array.from({ length: 2_000 }, (_, i) => `0" m${i}"`.padEnd(200, '0'))) }),
      'workbook-too-large',
    ],
    ['very many merged ranges', () => workbookOf({ sheets: [manyMerges] }), 'workbook-too-large'],
    ['entities in entities', () => sheet(laughs), 'workbook-entities'],
    [
      'a document type',
      () => sheet('<!DOCTYPE x SYSTEM "http://terminal.example/x.dtd"><worksheet/>'),
      'workbook-entities',
    ],
    ['elements without end', () => sheet('<a>'.repeat(500_000)), 'workbook-too-large'],
    ['a text without end', () => sheet(`<worksheet>${'x'.repeat(3_000_000)}`), 'workbook-too-large'],
    ['a comment without end', () => sheet(`<!--${'x'.repeat(3_000_000)}`), 'workbook-too-large'],
    ['an attribute without end', () => sheet(`<worksheet a="${'x'.repeat(3_000_000)}`), 'workbook-too-large'],
  ])('%s is refused', async (_name, make, code) => {
    expect(await refusalOf(make())).toBe(code);
  });

  it('are stopped while a part unpacks, long before its end', async () => {
    const bytes = zipOf([['part.xml', { content: noughts, claimed: { unpacked: 2_000 } }]]);
    let unpacked = 0;
    const reading = (async () => {
      for await (const piece of new Archive(bytes).textOf('part.xml')) unpacked += piece.length;
    })();
    await expect(reading).rejects.toThrow(/larger than the archive says/);
    expect(unpacked).toBe(0);
  });

  it('are read when pictures and other parts that nobody opens are large', async () => {
    const picture = { content: Buffer.alloc(5_000_000, 'x'), claimed: { unpacked: 900_000_000 } };
    expect(await refusalOf(workbookOf({ more: [['xl/media/image1.png', picture]] }))).toBe('read');
  });
});

describe('lists beyond a limit', () => {
  const cell = (ref: string, text: string): string =>
    `<row r="${ref.replace(/\D/g, '')}"><c r="${ref}" t="inlineStr"><is><t>${text}</t></is></c></row>`;
  const sheets = (...contents: string[]): Buffer =>
    workbookOf({ sheets: contents.map((rows) => `<sheetData>${rows}</sheetData>`) });

  it.each<[string, Buffer, RefusalCode | 'read']>([
    ['the last row', sheets(cell(`A${LIMITS.rows}`, 'x')), 'read'],
    ['a row behind the last', sheets(cell(`A${LIMITS.rows + 1}`, 'x')), 'too-many-rows'],
    ['a row of blanks there', sheets(cell(`A${LIMITS.rows + 1}`, '  ')), 'read'],
    ['rows of several sheets together', sheets(cell(`A${LIMITS.rows}`, 'x'), cell('A1', 'x')), 'too-many-rows'],
    ['the last column', sheets(cell('GR1', 'x')), 'read'],
    ['a column behind the last', sheets(cell('GS1', 'x')), 'too-many-columns'],
    ['a column of blanks there', sheets(cell('XFD1', ' ')), 'read'],
    ['a cell of the greatest length', sheets(cell('A1', 'x'.repeat(LIMITS.cellLength))), 'read'],
    ['a longer cell', sheets(cell('B3', 'x'.repeat(LIMITS.cellLength + 1))), 'cell-too-long'],
    ['escapes as many as a cell may hold', sheets(cell('A1', '_x000A_'.repeat(LIMITS.cellLength))), 'read'],
    ['more escapes', sheets(cell('A1', '_x000A_'.repeat(2 * LIMITS.cellLength))), 'cell-too-long'],
  ])('%s', async (_name, bytes, code) => {
    expect(await refusalOf(bytes)).toBe(code);
  });

  it('name the sheet and the cell', async () => {
    await expect(readWorkbook(sheets(cell('C7', 'x'.repeat(5_000))))).rejects.toThrow(/Cell C7 of sheet “Sheet 1”/);
  });
});
