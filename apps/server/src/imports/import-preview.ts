import type { Design } from '#calc';
import type { ImportPreview } from '#contract';
import { countRows, type FileReading, FIELDS, type ImportPlan, type ImportRefusal, optionsOf } from './reading/index.ts';

/** What was read, and what importing it would do, as the import screen shows it; the rows are asked for by the page. */
export function previewOf({ id, fileName }: { readonly id: string; readonly fileName: string }, reading: FileReading, plan: ImportPlan | ImportRefusal, design: Design): ImportPreview {
  const { mapping, decimal, headerRow } = reading.settings;
  return {
    id, fileName,
    settings: { encoding: reading.encoding, delimiter: reading.delimiter, decimal, headerRow },
    sheets: reading.sheets.map((sheet) => ({ ...sheet })),
    ownExport: reading.ownExport,
    formulasWithoutValue: reading.formulasWithoutValue,
    columns: reading.columns.map(({ column, heading, samples, field, reason }) => ({
      column, heading, samples: [...samples], field: mapping[column] ?? null, reason: (mapping[column] ?? null) === field ? (reason ?? '') : '',
    })),
    fields: FIELDS.map(({ key, label, unit }) => ({ key, label: unit ? `${label}, ${unit}` : label })),
    unknownValues: reading.values.filter(({ reason }) => reason !== 'by name')
      .map(({ field, text, rows, value, reason }) => ({ field, text, rows, choices: optionsOf(field, design), value, remembered: reason !== null })),
    refusal: 'code' in plan ? { title: plan.title, detail: `${plan.detail} ${plan.remedy}` } : null,
    counts: 'code' in plan ? countRows([], design.points.length) : plan.counts,
  };
}
