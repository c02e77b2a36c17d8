import type { IoList } from '#documents';
import type exceljs from 'exceljs';
import { bookStyles, type SheetWriter } from './xlsx-page.ts';

type Cells = readonly (string | number)[];

/** The first sheet: state, counts, findings, spare channels of each module, cautions. No table that an import would take. */
export function writeSummary(sheet: SheetWriter, list: IoList): void {
  sheet.columns = [30, 14, 12, 44, 9, 10, 8, 8, 24].map((width) => ({ width }));
  const { summary } = list;
  put(sheet, [`I/O list · ${list.project}`], bookStyles.title);
  put(sheet, [list.state]);
  put(sheet, [list.date]);
  gap(sheet);
  for (const { name, value } of summary.counts) put(sheet, [name, value]);
  gap(sheet);
  put(sheet, ['Findings'], bookStyles.heading);
  put(sheet, ['Errors', summary.findings.errors]);
  put(sheet, ['Warnings', summary.findings.warnings]);
  put(sheet, ['Notes', summary.findings.notes]);
  gap(sheet);
  put(sheet, ['Cabinet', 'Controller', 'Module', 'Module type', 'Kind', 'Channels', 'Used', 'Free', 'Free channels'], bookStyles.heading);
  for (const each of summary.modules) {
    put(sheet, [each.cabinet, each.controller, each.module, each.type, each.kind, each.channels, each.used, each.free, each.freeChannels]);
  }
  gap(sheet);
  put(sheet, ['Cautions'], bookStyles.heading);
  for (const caution of list.cautions) put(sheet, [caution]);
  gap(sheet);
  put(sheet, [list.disclaimer]);
  sheet.commit();
}

function put(sheet: SheetWriter, cells: Cells, style: Partial<exceljs.Style> = bookStyles.plain): void {
  const row = sheet.addRow([...cells]);
  cells.forEach((cell, i) => (row.getCell(i + 1).style = typeof cell === 'string' ? { ...style, numFmt: '@' } : style));
  row.commit();
}

function gap(sheet: SheetWriter): void {
  sheet.addRow([]).commit();
}
