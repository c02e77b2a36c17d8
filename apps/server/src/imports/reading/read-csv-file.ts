import type { Design } from '#calc';
import { hasGuardMark } from './apostrophe-guard.ts';
import { readCsv } from './csv-grid.ts';
import { decodeText, type Encoding } from './decode.ts';
import { detectDecimalMark } from './decimal-mark.ts';
import type { Delimiter } from './delimiter.ts';
import { DesignIndex } from './design-index.ts';
import { rowNumbered, rowsBelow, type DecimalMark, type Grid } from './grid.ts';
import { detectHeaderRow } from './header-row.ts';
import type { ImportSettings, Mapping } from './plan.ts';
import { mappingOf, suggestMapping, type ColumnSuggestion } from './suggest-mapping.ts';
import { suggestValues, type ValueSuggestion } from './values.ts';

/** What a person corrected; everything left out is detected. */
export interface ChosenSettings {
  readonly encoding?: Encoding;
  readonly delimiter?: Delimiter;
  readonly decimal?: DecimalMark;
  readonly headerRow?: number;
  readonly mapping?: Mapping;
  readonly valueMapping?: ImportSettings['valueMapping'];
}

/** A file as read, with the settings that stand for it now: chosen ones, else suggested ones. */
export interface CsvFileReading {
  readonly grid: Grid;
  readonly encoding: Encoding;
  readonly bom: boolean;
  readonly delimiter: Delimiter;
  readonly ownExport: boolean;
  /** Suggestions for every column, also where a mapping was chosen. */
  readonly columns: readonly ColumnSuggestion[];
  /** Texts of the choice columns and what each is read as. */
  readonly values: readonly ValueSuggestion[];
  /** What `interpretGrid` takes. */
  readonly settings: ImportSettings;
}

/**
 * Reads an uploaded CSV and finds its settings: encoding, delimiter, heading row, mapping, decimal sign.
 *
 * @param bytes the whole file
 * @param chosen what a person set instead
 * @param design the project it is imported into
 * @throws {ImportRefusal} when the file cannot be read
 */
export function readCsvFile(bytes: Uint8Array, chosen: ChosenSettings, design: Design): CsvFileReading {
  const { text, encoding, bom } = decodeText(bytes, chosen.encoding);
  const { grid, delimiter } = readCsv(text, chosen.delimiter);
  const headerRow = chosen.headerRow ?? detectHeaderRow(grid);
  const rows = rowsBelow(grid, headerRow);
  const columns = suggestMapping(grid, headerRow, design);
  const mapping = chosen.mapping ?? mappingOf(columns);
  const decimal = chosen.decimal ?? detectDecimalMark(rows, mapping, delimiter);
  return {
    grid,
    encoding,
    bom,
    delimiter,
    columns,
    ownExport: hasGuardMark(rowNumbered(grid, headerRow)?.cells ?? []),
    values: suggestValues(rows, mapping, new DesignIndex(design)),
    settings: { decimal, headerRow, mapping, ...(chosen.valueMapping && { valueMapping: chosen.valueMapping }) },
  };
}
