export { GUARD_MARK, guardText, hasGuardMark, markHeadings, unguardText } from './apostrophe-guard.ts';
export { ENCODINGS, type Encoding } from './decode.ts';
export { DELIMITERS, type Delimiter } from './delimiter.ts';
export { addressOf, DesignIndex } from './design-index.ts';
export {
  FIELDS,
  fieldOf,
  headingOf,
  isFieldKey,
  type Field,
  type FieldKey,
  type FieldKind,
  type ValueKey,
} from './fields.ts';
export { columnIndex, columnLetter, LIMITS, type DecimalMark, type Grid, type GridRow } from './grid.ts';
export { ImportRefusal, type RefusalCode } from './import-refusal.ts';
export { interpretGrid } from './interpret.ts';
export { changesOf, type ImportChanges, type RowUpdate } from './plan-changes.ts';
export type * from './plan.ts';
export { readCsvFile, type ChosenSettings, type CsvFileReading } from './read-csv-file.ts';
export { mappingOf, suggestMapping, type ColumnSuggestion } from './suggest-mapping.ts';
export { CHOICES, optionsOf, type ChoiceKey, type ValueSuggestion } from './values.ts';
