/** Why a file or its settings cannot be imported at all. */
export type RefusalCode =
  | 'empty-file'
  | 'too-large'
  | 'workbook'
  | 'workbook-damaged'
  | 'workbook-too-large'
  | 'workbook-encrypted'
  | 'workbook-macros'
  | 'workbook-binary'
  | 'workbook-entities'
  | 'workbook-no-sheet'
  | 'open-document'
  | 'old-spreadsheet'
  | 'pdf'
  | 'compressed'
  | 'not-text'
  | 'nul-bytes'
  | 'encoding-mismatch'
  | 'quote-not-closed'
  | 'unreadable'
  | 'too-many-rows'
  | 'too-many-columns'
  | 'cell-too-long'
  | 'sheet-unknown'
  | 'sheets-unlike'
  | 'signal-type-unmapped'
  | 'no-rows'
  | 'header-row-outside'
  | 'column-outside'
  | 'field-twice'
  | 'tag-unmapped';

/**
 * A file that cannot be imported. `title` and `detail` say what is wrong, `remedy` what to do; all three
 * are for people. Nothing has been changed when it is thrown.
 */
export class ImportRefusal extends Error {
  override readonly name = 'ImportRefusal';

  constructor(
    readonly code: RefusalCode,
    readonly title: string,
    readonly detail: string,
    readonly remedy: string,
  ) {
    super(`${title}: ${detail} ${remedy}`);
  }
}
