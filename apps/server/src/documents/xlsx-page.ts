import type { IoList } from '#documents';
import type exceljs from 'exceljs';

/** A sheet of a workbook that is written as a stream. */
export type SheetWriter = ReturnType<exceljs.stream.xlsx.WorkbookWriter['addWorksheet']>;

const font = { name: 'Arial', size: 9 } as const;
const line = { style: 'thin', color: { argb: 'FF8A8F98' } } as const;
const headingAlignment = { vertical: 'bottom', wrapText: true } as const;

export const bookStyles = {
  font,
  plain: { font, alignment: { vertical: 'top' } },
  wrapped: { font, alignment: { vertical: 'top', wrapText: true } },
  title: { font: { ...font, size: 11, bold: true } },
  heading: { font: { ...font, bold: true }, alignment: headingAlignment, border: { bottom: line } },
  /** Derived columns: what an import leaves out. */
  derivedHeading: { font: { ...font, italic: true }, alignment: headingAlignment, border: { bottom: line } },
} satisfies Record<string, Partial<exceljs.Style> | Partial<exceljs.Font>>;

interface Page {
  /** Rows that stay in sight and repeat on each printed page. */
  readonly titleRows?: number;
}

/** A4 and A3 in the numbering of workbooks; the types of the writer name only some sizes. */
const PAPER = { a4: 9, a3: 8 as exceljs.PaperSize } as const;

/** Print set-up and views of a sheet: landscape, fitted to the width, project and state on every page. */
export function pageOf({ project, state, date, disclaimer }: IoList, { titleRows }: Page): Partial<exceljs.AddWorksheetOptions> {
  return {
    pageSetup: {
      orientation: 'landscape', paperSize: titleRows === undefined ? PAPER.a4 : PAPER.a3, fitToPage: true, fitToWidth: 1, fitToHeight: 0,
      margins: { left: 0.4, right: 0.4, top: 0.7, bottom: 0.7, header: 0.3, footer: 0.3 },
      ...(titleRows !== undefined && { printTitlesRow: `1:${titleRows}` }),
    },
    headerFooter: {
      oddHeader: `&L${inHeader(project, 80)}&C${inHeader(state, 60)}&R&A`,
      oddFooter: `&L${inHeader(disclaimer, 130)}&C${date}&RPage &P of &N`,
    },
    views: titleRows === undefined ? [] : [{ state: 'frozen', xSplit: 1, ySplit: titleRows }],
  };
}

/** "&" begins a code in headers and footers, and all three parts together hold 255 characters. */
function inHeader(text: string, most: number): string {
  const short = text.length > most ? `${text.slice(0, most - 1)}…` : text;
  return short.replaceAll('&', '&&');
}
