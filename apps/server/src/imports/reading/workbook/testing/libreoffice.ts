import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** Whether LibreOffice is there to be asked what a workbook shows. */
export const hasLibreOffice = spawnSync('soffice', ['--version'], { stdio: 'ignore' }).status === 0;

/** Comma, quote, UTF-8, from line 1, all text quoted, cells as shown, every sheet to a file of its own. */
const CSV_OF_EVERY_SHEET = 'csv:Text - txt - csv (StarCalc):44,34,76,1,,0,true,true,true,false,false,-1';

/**
 * What LibreOffice shows in the sheets of workbooks. One start of the program serves them all.
 *
 * @returns for each workbook CSV texts by the name of the sheet
 */
export function shownByLibreOffice(workbooks: readonly Uint8Array[]): readonly ReadonlyMap<string, string>[] {
  const folder = mkdtempSync(join(tmpdir(), 'workbook-'));
  try {
    const files = workbooks.map((_, i) => join(folder, `${i}.xlsx`));
    workbooks.forEach((bytes, i) => writeFileSync(files[i], bytes));
    const profile = `-env:UserInstallation=file://${folder}/profile`;
    const convert = ['--headless', '--norestore', '--convert-to', CSV_OF_EVERY_SHEET, '--outdir', folder];
    execFileSync('soffice', [profile, ...convert, ...files], { stdio: 'ignore', timeout: 60_000 });
    return workbooks.map((_, i) => sheetsIn(folder, `${i}-`));
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

function sheetsIn(folder: string, prefix: string): ReadonlyMap<string, string> {
  const files = readdirSync(folder).filter((name) => name.startsWith(prefix) && name.endsWith('.csv'));
  return new Map(files.map((name) => [name.slice(prefix.length, -4), readFileSync(join(folder, name), 'utf8')]));
}
