import type { Archive } from './archive.ts';
import { BOUNDS } from './bounds.ts';
import { BUILT_IN_FORMATS } from './built-in-formats.ts';
import { numberFormat, type NumberFormat } from './number-format.ts';
import { tooMuchInside } from './refusals.ts';
import { readXml } from './xml.ts';

/** How the cells of a style show their values, by the number of the style. */
export type CellFormats = (style: number) => NumberFormat;

/**
 * Reads which number format each cell style has. A format is made out when the first cell wants it, since
 * workbooks carry along many that no cell has.
 *
 * @param from1904 whether the workbook's dates count from 1904
 */
export async function readCellFormats(archive: Archive, part: string, from1904: boolean): Promise<CellFormats> {
  const { ids, codes } = await readStyles(archive, part);
  const formats = new Map<number, NumberFormat>();
  return (style) => {
    const id = ids[style] ?? 0;
    const known = formats.get(id) ?? numberFormat(codes.get(id) ?? '', from1904);
    formats.set(id, known);
    return known;
  };
}

interface Styles {
  /** The number format of each cell style. */
  readonly ids: readonly number[];
  readonly codes: ReadonlyMap<number, string>;
}

async function readStyles(archive: Archive, part: string): Promise<Styles> {
  const ids: number[] = [];
  const codes = new Map(BUILT_IN_FORMATS);
  let characters = 0;
  let inCellFormats = false;
  await readXml(archive, part, {
    skip: new Set(['extLst', 'dxfs', 'cellStyleXfs', 'AlternateContent']),
    open(name, { numFmtId, formatCode = '' }) {
      if (name === 'cellXfs') inCellFormats = true;
      if (name === 'xf' && inCellFormats) ids.push(Number(numFmtId ?? 0));
      if (name !== 'numFmt') return;
      codes.set(Number(numFmtId), formatCode);
      characters += formatCode.length;
    },
    close(name) {
      if (name === 'cellXfs') inCellFormats = false;
      if (ids.length > BOUNDS.cellFormats || characters > BOUNDS.formatCharacters) {
        throw tooMuchInside('It has more cell styles than a list can need.');
      }
    },
  });
  return { ids, codes };
}
