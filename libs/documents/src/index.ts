export { ioList, type IoList, type IoSheet } from './io-list.ts';
export { IO_COLUMNS, type ColumnKind, type IoCell, type IoColumn } from './io-columns.ts';
export { type IoSummary, type ModuleLine } from './io-summary.ts';
export { CAUTIONS, DISCLAIMER, DRAFT_STATE } from './cautions.ts';
