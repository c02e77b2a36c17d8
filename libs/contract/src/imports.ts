import { type Static, Type } from 'typebox';
import { nullable, oneOf, Text, Uuid, Whole } from './common.ts';

const encodings = ['utf-8', 'utf-16le', 'utf-16be', 'windows-1252'] as const;
const delimiters = [',', ';', '\t', '|'] as const;

/** How the file is to be read; every field that is left out is detected. */
export const ReadingSettings = Type.Object({
  encoding: Type.Optional(oneOf([...encodings])),
  delimiter: Type.Optional(oneOf([...delimiters])),
  decimal: Type.Optional(oneOf(['.', ','])),
  headerRow: Type.Optional(Whole(1, 1000)),
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
  /** Why this field: "by name", "by values"; empty where a person chose it. */
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
  row: Type.Integer(),
  line: Type.Integer(),
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
  settings: Type.Object({
    encoding: oneOf([...encodings]), delimiter: oneOf([...delimiters]), decimal: oneOf(['.', ',']), headerRow: Type.Integer(),
  }),
  ownExport: Type.Boolean(),
  columns: Type.Array(ImportColumn),
  /** The fields that a column may be given, with their labels. */
  fields: Type.Array(Type.Object({ key: Type.String(), label: Type.String() })),
  /** Texts of choice fields that the project does not know, with the values to choose from. */
  unknownValues: Type.Array(Type.Object({ field: Type.String(), text: Type.String(), rows: Type.Integer(), choices: Type.Array(Type.String()) })),
  counts: ImportCounts,
  rows: Type.Array(ImportRow),
});
export type ImportPreview = Static<typeof ImportPreview>;

export const ImportResult = Type.Object({
  id: Uuid, created: Type.Integer(), updated: Type.Integer(), same: Type.Integer(), heldBack: Type.Integer(),
  /** Null where the file changed nothing. */
  sequence: nullable(Type.Integer()),
});
export type ImportResult = Static<typeof ImportResult>;
