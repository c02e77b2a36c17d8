import { columnLetter, LIMITS } from '../grid.ts';
import { ImportRefusal } from '../import-refusal.ts';

const COPY_TO_NEW = 'Copy the cells of the list into a new workbook, save that as .xlsx, and choose it.';
const SAVE_AGAIN = 'Open it in your spreadsheet program, save it again as .xlsx, or save the sheet as CSV (UTF-8).';

/** Names come from the file and may be of any length. */
const shortened = (text: string): string => (text.length > 300 ? `${text.slice(0, 300)}…` : text);

const counted = (n: number): string => n.toLocaleString('en-GB');

/** A file that its own structure contradicts: cut off, altered, or never a whole workbook. */
export function damaged(what: string): ImportRefusal {
  return new ImportRefusal('workbook-damaged', 'The workbook is damaged or incomplete', shortened(what), SAVE_AGAIN);
}

/** A file that unpacks to more than anyone's list needs, whether by accident or on purpose. */
export function tooMuchInside(what: string): ImportRefusal {
  return new ImportRefusal('workbook-too-large', 'The workbook holds too much', shortened(what), COPY_TO_NEW);
}

export function entitiesDeclared(): ImportRefusal {
  return new ImportRefusal(
    'workbook-entities',
    'The workbook is not safe to read',
    'It declares a document type or entities of its own, which no spreadsheet program writes.',
    COPY_TO_NEW,
  );
}

export function encrypted(): ImportRefusal {
  return new ImportRefusal(
    'workbook-encrypted',
    'The workbook is encrypted',
    'It opens only with a password, so the list in it cannot be read.',
    'Open it in your spreadsheet program, save it without a password, and choose it again.',
  );
}

export function oldSpreadsheet(): ImportRefusal {
  return new ImportRefusal(
    'old-spreadsheet',
    'This is a spreadsheet of the old kind',
    'The file is in the binary format of older office programs (.xls).',
    'Open it in your spreadsheet program and save it as .xlsx, or save the sheet as CSV (UTF-8).',
  );
}

/** An office document of the binary kind that is no spreadsheet. */
export function otherOfficeDocument(): ImportRefusal {
  return new ImportRefusal(
    'old-spreadsheet',
    'This is not a spreadsheet',
    'The file is another kind of office document in an older binary format.',
    'Copy the list into a spreadsheet, save that as .xlsx or as CSV (UTF-8), and choose it.',
  );
}

export function macros(): ImportRefusal {
  return new ImportRefusal(
    'workbook-macros',
    'The workbook holds macros',
    'Workbooks with macros are not read, since nobody here can tell what they do.',
    'Open it in your spreadsheet program, save it as .xlsx without macros, and choose that.',
  );
}

export function binaryWorkbook(): ImportRefusal {
  return new ImportRefusal(
    'workbook-binary',
    'This is a binary workbook',
    'The file is in the .xlsb format, which cannot be read.',
    'Open it in your spreadsheet program and save it as .xlsx, or save the sheet as CSV (UTF-8).',
  );
}

export function openDocument(): ImportRefusal {
  return new ImportRefusal(
    'open-document',
    'This is an OpenDocument file',
    'Spreadsheets in the OpenDocument format (.ods) cannot be read.',
    'Open it in your spreadsheet program and save it as .xlsx, or save the sheet as CSV (UTF-8).',
  );
}

export function notAWorkbook(): ImportRefusal {
  return new ImportRefusal(
    'compressed',
    'This is an archive, not a workbook',
    'The file is a zip archive or another kind of document, with no workbook in it that could be read directly.',
    'If the list was packed, unpack it and choose the .xlsx or CSV inside.',
  );
}

export function noSheet(): ImportRefusal {
  return new ImportRefusal(
    'workbook-no-sheet',
    'The workbook has no sheet with cells',
    'It holds no worksheet, or only charts.',
    'Choose the workbook that holds the list.',
  );
}

export function emptyFile(): ImportRefusal {
  return new ImportRefusal(
    'empty-file',
    'The file is empty',
    'There is nothing in it.',
    'Check that the list was saved, then choose the file again.',
  );
}

export function fileTooLarge(size: number): ImportRefusal {
  return new ImportRefusal(
    'too-large',
    'The file is too large',
    `It has ${(size / 1_000_000).toFixed(1)} MB; up to ${LIMITS.bytes / 1_000_000} MB can be read.`,
    'Split the list, for instance by area, and import the parts one after the other.',
  );
}

export function tooManyRows(sheet: string, row: number): ImportRefusal {
  return new ImportRefusal(
    'too-many-rows',
    'The workbook has too many rows',
    `Up to ${counted(LIMITS.rows)} rows can be read at once, all sheets together; row ${counted(row)} of sheet “${sheet}” is beyond that.`,
    'Delete what does not belong to the list, or split the list, for instance by area, and import the parts one after the other.',
  );
}

export function tooManyColumns(sheet: string, row: number): ImportRefusal {
  return new ImportRefusal(
    'too-many-columns',
    'The list has too many columns',
    `Row ${counted(row)} of sheet “${sheet}” has more than ${LIMITS.columns} columns.`,
    'Delete the columns that no point needs, and choose the file again.',
  );
}

export function cellTooLong(sheet: string, row: number, column: number): ImportRefusal {
  return new ImportRefusal(
    'cell-too-long',
    'A cell is too long',
    `Cell ${columnLetter(column)}${row} of sheet “${sheet}” has more than ${counted(LIMITS.cellLength)} characters.`,
    'Shorten the text, and choose the file again.',
  );
}
