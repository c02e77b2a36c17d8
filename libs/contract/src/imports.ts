import { type Static, Type } from 'typebox';
import { nullable, oneOf, Text, Uuid, Whole } from './common.ts';

const encodings = ['utf-8', 'utf-16le', 'utf-16be', 'windows-1252'] as const;
const delimiters = [',', ';', '\t', '|'] as const;

/** How the file is to be read; every field that is left out is detected. */
export const ReadingSettings = Type.Object({
  encoding: Type.Optional(oneOf([...encodings])),
  delimiter: Type.Optional(oneOf([...delimiters])),
  decimal: Type.Optional(oneOf(['.', ','])),
  /** Number of the lowest row of the headings, in every sheet that is taken. */
  headerRow: Type.Optional(Whole(1, 1000)),
  /** Names of the sheets that are taken together; their headings are alike. */
  sheets: Type.Optional(Type.Array(Text(31), { minItems: 1, maxItems: 200 })),
}, { additionalProperties: false });
export type ReadingSettings = Static<typeof ReadingSettings>;

/** Reading, plus which column is which field and which text stands for which value. */
export const ImportSettings = Type.Object({
  ...ReadingSettings.properties,
  /** Column letter → field; left out: the suggestion. */
  mapping: Type.Optional(Type.Record(Type.String({ pattern: '^[A-Z]{1,3}$' }), Text(40))),
  /** Field → text in the file → value of the project, null for blank. */
  valueMapping: Type.Optional(Type.Record(Type.String(), Type.Record(Type.String(), nullable(Text(300))))),
}, { additionalProperties: false });
export type ImportSettings = Static<typeof ImportSettings>;

export const ImportColumn = Type.Object({
  column: Type.String(),
  heading: Type.String(),
  /** The first few texts in it. */
  samples: Type.Array(Type.String()),
  field: nullable(Type.String()),
  /** Why this field: "as last time", "left out last time", "by name", "by values"; empty where a person chose it. */
  reason: Type.String(),
});
export type ImportColumn = Static<typeof ImportColumn>;

export const ImportProblem = Type.Object({
  code: Type.String(), severity: oneOf(['error', 'warning']), field: nullable(Type.String()), column: nullable(Type.String()),
  cell: nullable(Type.String()), message: Type.String(), remedy: Type.String(),
});
export const ImportNote = Type.Object({ code: Type.String(), field: Type.String(), column: Type.String(), cell: Type.String(), message: Type.String() });
const Value = Type.Union([Type.String(), Type.Number(), Type.Null()]);

export const ImportRow = Type.Object({
  /** Place in the preview, from 0. */
  index: Type.Integer(),
  /** The sheet of a workbook; null in a CSV. */
  sheet: nullable(Type.String()),
  row: Type.Integer(),
  line: Type.Integer(),
  /** Every row of the file that makes this point; more than one where each row is a signal. */
  rows: Type.Array(Type.Integer()),
  action: oneOf(['create', 'update', 'same', 'hold', 'skip']),
  why: nullable(Type.String()),
  values: Type.Record(Type.String(), Value),
  changes: Type.Array(Type.Object({ field: Type.String(), from: Value, to: Value })),
  problems: Type.Array(ImportProblem),
  notes: Type.Array(ImportNote),
});
export type ImportRow = Static<typeof ImportRow>;

export const ImportCounts = Type.Object({
  rows: Type.Integer(), toCreate: Type.Integer(), toUpdate: Type.Integer(), same: Type.Integer(),
  heldBack: Type.Integer(), skipped: Type.Integer(), withProblems: Type.Integer(), problems: Type.Integer(),
  notes: Type.Integer(), pointsAfter: Type.Integer(),
});

/** What the file is, how it was read, and row by row what an import would do. Nothing has been changed. */
export const ImportPreview = Type.Object({
  id: Uuid,
  fileName: Type.String(),
  /** As the file was read; a workbook has no encoding and no delimiter, a CSV no sheets. */
  settings: Type.Object({
    encoding: nullable(oneOf([...encodings])), delimiter: nullable(oneOf([...delimiters])), decimal: oneOf(['.', ',']),
    headerRow: Type.Integer(),
  }),
  /** `alike`: its headings are those of the sheets taken, so that it can be taken with them. */
  sheets: Type.Array(Type.Object({ name: Type.String(), rows: Type.Integer(), taken: Type.Boolean(), alike: Type.Boolean() })),
  ownExport: Type.Boolean(),
  /** Formulas that were saved without their result: their cells are read as blank. */
  formulasWithoutValue: Type.Integer(),
  columns: Type.Array(ImportColumn),
  /** The fields that a column may be given, with their labels. */
  fields: Type.Array(Type.Object({ key: Type.String(), label: Type.String() })),
  /** Texts of choice fields that the project does not know, with the values to choose from. */
  unknownValues: Type.Array(Type.Object({
    field: Type.String(), text: Type.String(), rows: Type.Integer(), choices: Type.Array(Type.String()),
    /** It is taken as it was last time: for `value`, or for blank where that is null. */
    remembered: Type.Boolean(),
    value: nullable(Type.String()),
  })),
  /** Why it cannot be imported as the columns stand, and what to do; there are no rows then. */
  refusal: nullable(Type.Object({ title: Type.String(), detail: Type.String() })),
  counts: ImportCounts,
});
export type ImportPreview = Static<typeof ImportPreview>;

const rowFilters = ['all', 'create', 'update', 'same', 'hold', 'problems', 'skip'] as const;
export const ImportRowsQuery = Type.Object({
  show: Type.Optional(oneOf([...rowFilters])),
  offset: Type.Optional(Whole(0, 100_000)),
  limit: Type.Optional(Whole(1, 500)),
}, { additionalProperties: false });
export type RowFilter = (typeof rowFilters)[number];

/** Some rows of the last preview. */
export const ImportRowPage = Type.Object({
  /** Rows of this kind in the whole file. */
  total: Type.Integer(),
  rows: Type.Array(ImportRow),
});
export type ImportRowPage = Static<typeof ImportRowPage>;

/** How far an import is that is being read or written now. */
export const ImportWork = Type.Object({
  stage: oneOf(['waiting', 'reading', 'checking', 'writing']),
  /** Rows done of `total`; total is null while it cannot be known. */
  done: Type.Integer(),
  total: nullable(Type.Integer()),
  /** Milliseconds since it began. */
  elapsedMs: Type.Integer(),
});
export type ImportWork = Static<typeof ImportWork>;

export const ImportResult = Type.Object({
  id: Uuid, created: Type.Integer(), updated: Type.Integer(), same: Type.Integer(), heldBack: Type.Integer(),
  /** Null where the file changed nothing. */
  sequence: nullable(Type.Integer()),
});
export type ImportResult = Static<typeof ImportResult>;
