import type { Design } from '#calc';
import type { ImportPreview, ImportSettings } from '#contract';
import { Invalid } from '../platform/problems.ts';
import {
  type ChosenSettings, type CsvFileReading, FIELDS, type ImportPlan, interpretGrid, isFieldKey, optionsOf, readCsvFile,
} from './reading/index.ts';

export interface Interpretation {
  readonly reading: CsvFileReading;
  readonly plan: ImportPlan;
}

/**
 * Reads the bytes with these settings and works out what importing them into the design would do.
 * @throws {ImportRefusal} where the file cannot be read, {Invalid} where a column is given to a field that does not exist
 */
export function interpret(bytes: Uint8Array, settings: ImportSettings, design: Design): Interpretation {
  const unknown = Object.entries(settings.mapping ?? {}).filter(([, field]) => !isFieldKey(field));
  if (unknown.length > 0) throw new Invalid(unknown.map(([column, field]) => ({ field: `mapping.${column}`, message: `There is no field ${field}.` })));
  const reading = readCsvFile(bytes, settings as ChosenSettings, design);
  return { reading, plan: interpretGrid(reading.grid, reading.settings, design) };
}

/** The interpretation as the import screen shows it. */
export function previewOf(id: string, fileName: string, { reading, plan }: Interpretation, design: Design): ImportPreview {
  const { mapping, decimal, headerRow } = reading.settings;
  return {
    id, fileName,
    settings: { encoding: reading.encoding, delimiter: reading.delimiter, decimal, headerRow },
    ownExport: plan.ownExport,
    columns: reading.columns.map(({ column, heading, samples, field, reason }) => ({
      column, heading, samples: [...samples], field: mapping[column] ?? null, reason: mapping[column] === field ? (reason ?? '') : '',
    })),
    fields: FIELDS.map(({ key, label, unit }) => ({ key, label: unit ? `${label}, ${unit}` : label })),
    unknownValues: reading.values.filter((v) => v.value === null)
      .map(({ field, text, rows }) => ({ field, text, rows, choices: optionsOf(field, design) })),
    counts: plan.counts,
    rows: plan.rows.map(({ row, line, action, why, values, changes, problems, notes }) => ({
      row, line, action, why, values: { ...values }, changes: [...changes], problems: [...problems], notes: [...notes],
    })),
  };
}
