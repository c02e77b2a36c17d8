export { isWorkbook } from './recognise.ts';
export { readWorkbook, type SheetReading, type WorkbookProgress, type WorkbookReading } from './read-workbook.ts';
export type { Merge } from './sheet-part.ts';
