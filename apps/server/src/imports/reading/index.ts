export { GUARD_MARK, guardText, hasGuardMark, markHeadings, unguardText } from './apostrophe-guard.ts';
export { CHOICES, optionsOf, type ChoiceKey } from './choices.ts';
export { countRows } from './counts.ts';
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
export { interpretFile } from './interpret.ts';
export { changesOf, type ImportChanges, type RowUpdate } from './plan-changes.ts';
export type * from './plan.ts';
export { readFile, type ChosenSettings, type FileReading } from './read-file.ts';
export { headingKey, NOTHING_REMEMBERED, textKey, toRemember, type Remembered, type ToRemember } from './remembered.ts';
export { mappingOf, suggestMapping, type ColumnSuggestion } from './suggest-mapping.ts';
export type { ValueSuggestion } from './suggest-values.ts';
export type { SheetChoice, SheetPart } from './take-sheets.ts';
