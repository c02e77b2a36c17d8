import { LIMITS, type Grid } from '../grid.ts';
import { Archive } from './archive.ts';
import { GENERAL } from './number-format.ts';
import { isWorkbook, refuseByFirstBytes } from './recognise.ts';
import { noSheet, notAWorkbook } from './refusals.ts';
import { readSharedStrings } from './shared-strings.ts';
import { SheetReader, type Merge, type SheetContent, type SheetContext } from './sheet-part.ts';
import { readCellFormats } from './styles-part.ts';
import { readWorkbookPart, type SheetRef, type WorkbookPart } from './workbook-part.ts';
import { readXml } from './xml.ts';

export interface SheetReading {
  readonly name: string;
  /** Whether the sheet's tab is hidden. */
  readonly hidden: boolean;
  /** Rows 1 to the last with content, padded to the widest; row number and line are the sheet's row number. */
  readonly grid: Grid;
  /** Merged cells; the value stands in the top left one, the others are blank. */
  readonly merges: readonly Merge[];
  /** Formulas that were saved without their result, whose cells are therefore blank. */
  readonly formulasWithoutValue: number;
}

export interface WorkbookReading {
  /** In the order of their tabs. */
  readonly sheets: readonly SheetReading[];
}

/** Told how far reading has come: rows read, and an estimate of how many there are, null before there is one. */
export type WorkbookProgress = (rows: number, total: number | null) => void;

const PROGRESS_ROWS = 1_000;

/**
 * Reads an .xlsx workbook: every worksheet, cells as texts that say what a person sees there. Formulas are
 * never evaluated; drawings, embedded and linked files are never read.
 *
 * @param bytes the whole file
 * @param options `onProgress` is called about every thousand rows, and at the end
 * @throws {ImportRefusal} when it is no workbook that can be read, or passes a limit
 */
export async function readWorkbook(
  bytes: Uint8Array,
  options: { readonly onProgress?: WorkbookProgress } = {},
): Promise<WorkbookReading> {
  refuseByFirstBytes(bytes);
  if (!isWorkbook(bytes)) throw notAWorkbook();
  const archive = new Archive(bytes);
  const workbook = await readWorkbookPart(archive);
  if (workbook.sheets.length === 0) throw noSheet();
  const context = await readContext(archive, workbook);
  return { sheets: await readSheets(archive, workbook.sheets, context, options.onProgress ?? (() => undefined)) };
}

async function readContext(archive: Archive, workbook: WorkbookPart): Promise<SheetContext> {
  const { sharedStrings, styles, from1904 } = workbook;
  return {
    strings: sharedStrings === null ? [] : await readSharedStrings(archive, sharedStrings),
    formats: styles === null ? () => GENERAL : await readCellFormats(archive, styles, from1904),
  };
}

async function readSheets(
  archive: Archive,
  refs: readonly SheetRef[],
  context: SheetContext,
  onProgress: WorkbookProgress,
): Promise<readonly SheetReading[]> {
  const progress = new Progress(
    refs.reduce((sum, { part }) => sum + archive.sizeOf(part), 0),
    onProgress,
  );
  const sheets: SheetReading[] = [];
  let rowsLeft: number = LIMITS.rows;
  for (const { name, hidden, part } of refs) {
    const content = await readSheet(archive, part, new SheetReader(name, rowsLeft, context), progress);
    rowsLeft -= content.grid.rows.length;
    sheets.push({ name, hidden, ...content });
  }
  progress.end();
  return sheets;
}

async function readSheet(
  archive: Archive,
  part: string,
  reader: SheetReader,
  progress: Progress,
): Promise<SheetContent> {
  let counted = 0;
  await readXml(archive, part, reader, (characters) => {
    progress.add(reader.rowsRead - counted, characters);
    counted = reader.rowsRead;
  });
  return reader.content();
}

/** Estimates the rows to come from the share of the sheets' bytes that has been read. */
class Progress {
  private rows = 0;
  private characters = 0;
  private told = 0;

  constructor(
    private readonly bytes: number,
    private readonly onProgress: WorkbookProgress,
  ) {}

  add(rows: number, characters: number): void {
    this.rows += rows;
    this.characters += characters;
    if (this.rows - this.told < PROGRESS_ROWS) return;
    this.told = this.rows;
    this.onProgress(this.rows, this.estimate());
  }

  end(): void {
    this.onProgress(this.rows, this.rows);
  }

  private estimate(): number {
    return Math.max(this.rows, Math.round((this.rows * this.bytes) / this.characters));
  }
}
