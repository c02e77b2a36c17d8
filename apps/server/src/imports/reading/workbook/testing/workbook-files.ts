import { zipOf, type ZipFile, type ZipFiles } from './zip-builder.ts';

const MAIN = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const LINKS = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const PACKAGE = 'http://schemas.openxmlformats.org/package/2006';
const WORKBOOK_TYPE = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet.main+xml';

export interface WorkbookPieces {
  /** Content of `sheetData` and what follows it, a sheet each; or a whole file in its place. */
  readonly sheets?: readonly (string | ZipFile)[];
  /** Content of the table of shared strings. */
  readonly strings?: string;
  /** Content of the style sheet. */
  readonly styles?: string;
  /** What stands before the list of sheets. */
  readonly workbook?: string;
  readonly workbookType?: string;
  /** Attributes of each sheet in the list. */
  readonly state?: readonly string[];
  readonly more?: ZipFiles;
}

/** A workbook of hand-written parts, as small as a reader accepts it. */
export function workbookOf(pieces: WorkbookPieces): Buffer {
  return zipOf(workbookFiles(pieces));
}

/** Its files, for a test that leaves one out or changes it. */
export function workbookFiles(pieces: WorkbookPieces): ZipFiles {
  const { sheets = [''], strings, styles, workbookType = WORKBOOK_TYPE, more = [] } = pieces;
  return [
    ['[Content_Types].xml', contentTypes(workbookType)],
    ['_rels/.rels', links([['rId1', 'officeDocument', 'xl/workbook.xml']])],
    ['xl/workbook.xml', workbookXml(pieces)],
    ['xl/_rels/workbook.xml.rels', workbookLinks(pieces)],
    ...sheets.map((sheet, i) => [`xl/worksheets/s${i + 1}.xml`, sheetFile(sheet)] as const),
    ...(strings === undefined ? [] : [['xl/sharedStrings.xml', `<sst xmlns="${MAIN}">${strings}</sst>`] as const]),
    ...(styles === undefined ? [] : [['xl/styles.xml', `<styleSheet xmlns="${MAIN}">${styles}</styleSheet>`] as const]),
    ...more,
  ];
}

/** A sheet of which only the cells of row 1 matter. */
export function rowOf(cells: string): string {
  return `<sheetData><row r="1">${cells}</row></sheetData>`;
}

/** Styles of cells by their number formats: style 1 is that of the first code. */
export function stylesOf(codes: readonly string[]): string {
  const escaped = codes.map((code) => code.replaceAll('&', '&amp;').replaceAll('"', '&quot;').replaceAll('<', '&lt;'));
  const formats = escaped.map((code, i) => `<numFmt numFmtId="${200 + i}" formatCode="${code}"/>`).join('');
  const styles = codes.map((_, i) => `<xf numFmtId="${200 + i}"/>`).join('');
  return `<numFmts>${formats}</numFmts><cellXfs><xf numFmtId="0"/>${styles}</cellXfs>`;
}

function sheetFile(sheet: string | ZipFile): string | ZipFile {
  return typeof sheet === 'string' ? `<?xml version="1.0"?><worksheet xmlns="${MAIN}">${sheet}</worksheet>` : sheet;
}

function workbookXml({ sheets = [''], workbook = '', state = [] }: WorkbookPieces): string {
  const list = sheets.map(
    (_, i) => `<sheet name="Sheet ${i + 1}" sheetId="${i + 1}" ${state[i] ?? ''} r:id="rId${i + 1}"/>`,
  );
  return `<workbook xmlns="${MAIN}" xmlns:r="${LINKS}">${workbook}<sheets>${list.join('')}</sheets></workbook>`;
}

function workbookLinks({ sheets = [''] }: WorkbookPieces): string {
  return links([
    ...sheets.map((_, i) => [`rId${i + 1}`, 'worksheet', `worksheets/s${i + 1}.xml`] as const),
    ['rIdA', 'sharedStrings', '/xl/sharedStrings.xml'],
    ['rIdB', 'styles', 'styles.xml'],
  ]);
}

function links(list: readonly (readonly [id: string, kind: string, target: string])[]): string {
  const each = list.map(
    ([id, kind, target]) => `<Relationship Id="${id}" Type="${LINKS}/${kind}" Target="${target}"/>`,
  );
  return `<Relationships xmlns="${PACKAGE}/relationships">${each.join('')}</Relationships>`;
}

function contentTypes(workbookType: string): string {
  const override = `<Override PartName="/xl/workbook.xml" ContentType="${workbookType}"/>`;
  return `<Types xmlns="${PACKAGE}/content-types"><Default Extension="xml" ContentType="application/xml"/>${override}</Types>`;
}
