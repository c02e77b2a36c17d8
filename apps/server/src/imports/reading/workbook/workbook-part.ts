import type { Archive } from './archive.ts';
import { BOUNDS } from './bounds.ts';
import { binaryWorkbook, damaged, macros, notAWorkbook, openDocument, tooMuchInside } from './refusals.ts';
import { relationshipsOf, type Relationship } from './relationships.ts';
import { isTrue, prefixedAttribute, readXml } from './xml.ts';

const CONTENT_TYPES = '[content_types].xml';
const MACRO_PARTS = /(^|\/)vbaproject\.bin$|^xl\/macrosheets\//;

export interface SheetRef {
  readonly name: string;
  readonly hidden: boolean;
  readonly part: string;
}

/** What the workbook part says, and where the parts are that its sheets need. */
export interface WorkbookPart {
  /** Worksheets in the order of their tabs; charts and the like left out. */
  readonly sheets: readonly SheetRef[];
  /** Whether dates count from 1904. */
  readonly from1904: boolean;
  readonly sharedStrings: string | null;
  readonly styles: string | null;
}

/**
 * Finds the workbook in the archive and reads its list of sheets.
 *
 * @throws {ImportRefusal} for archives that hold no workbook, or one of a kind that is not read
 */
export async function readWorkbookPart(archive: Archive): Promise<WorkbookPart> {
  const part = await findWorkbook(archive);
  const links = await relationshipsOf(archive, part);
  if (links.some(({ kind }) => /^(vbaProject|xlMacrosheet|xlIntlMacrosheet)$/.test(kind))) throw macros();
  const { named, from1904 } = await readSheetList(archive, part);
  return {
    sheets: named.flatMap((sheet) => sheetRef(sheet, links)),
    from1904,
    sharedStrings: partOfKind(archive, links, 'sharedStrings'),
    styles: partOfKind(archive, links, 'styles'),
  };
}

async function findWorkbook(archive: Archive): Promise<string> {
  await refuseOpenDocument(archive);
  const main = (await relationshipsOf(archive, '')).find(({ kind }) => kind === 'officeDocument');
  if (!main || !archive.has(CONTENT_TYPES)) throw notAWorkbook();
  const types = await contentTypes(archive);
  const type = types.get(main.part.toLowerCase()) ?? '';
  if (/sheet\.binary/i.test(type) || main.part.endsWith('.bin')) throw binaryWorkbook();
  const macroTypes = [...types.values()].some((each) => /macroEnabled|vbaProject/i.test(each));
  if (macroTypes || archive.names().some((name) => MACRO_PARTS.test(name))) throw macros();
  if (!/spreadsheetml\.(sheet|template)\.main\+xml$/i.test(type)) throw notAWorkbook();
  return main.part;
}

async function refuseOpenDocument(archive: Archive): Promise<void> {
  if (!archive.has('mimetype') || archive.sizeOf('mimetype') > 200) return;
  let type = '';
  for await (const piece of archive.textOf('mimetype')) type += piece;
  if (type.includes('opendocument.spreadsheet')) throw openDocument();
}

/** Content types by part, in lower case; those that go by a name's ending, under that. */
async function contentTypes(archive: Archive): Promise<ReadonlyMap<string, string>> {
  const types = new Map<string, string>();
  await readXml(archive, CONTENT_TYPES, {
    skip: new Set(),
    open(name, { PartName, Extension, ContentType = '' }) {
      if (name === 'Override' && PartName) types.set(PartName.replace(/^\//, '').toLowerCase(), ContentType);
      if (name === 'Default' && Extension) types.set(`*.${Extension.toLowerCase()}`, ContentType);
    },
  });
  return types;
}

interface NamedSheet {
  readonly name: string;
  readonly hidden: boolean;
  readonly link: string;
}

async function readSheetList(archive: Archive, part: string): Promise<{ named: NamedSheet[]; from1904: boolean }> {
  const named: NamedSheet[] = [];
  let from1904 = false;
  await readXml(archive, part, {
    skip: new Set(['extLst', 'AlternateContent']),
    open(element, attributes) {
      const { name = '', state = 'visible', date1904 } = attributes;
      if (element === 'workbookPr') from1904 = isTrue(date1904);
      if (element !== 'sheet') return;
      if (named.length === BOUNDS.sheets) throw tooMuchInside(`It has more than ${BOUNDS.sheets} sheets.`);
      named.push({
        name: name.slice(0, BOUNDS.sheetNameLength),
        hidden: state !== 'visible',
        link: prefixedAttribute(attributes, 'id') ?? '',
      });
    },
  });
  return { named, from1904 };
}

/** A sheet that is a chart or a dialog has no cells and is left out. */
function sheetRef({ name, hidden, link }: NamedSheet, links: readonly Relationship[]): SheetRef[] {
  const target = links.find(({ id }) => id === link);
  if (!target) throw damaged(`Its sheet “${name}” is missing.`);
  return target.kind === 'worksheet' ? [{ name, hidden, part: target.part }] : [];
}

function partOfKind(archive: Archive, links: readonly Relationship[], kind: string): string | null {
  const part = links.find((link) => link.kind === kind)?.part;
  return part !== undefined && archive.has(part) ? part : null;
}
