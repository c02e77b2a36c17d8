/**
 * How much a workbook may unpack to. The file itself has at most `LIMITS.bytes`; these keep its content in
 * proportion, so that no upload takes the memory or the time of everybody else.
 */
export const BOUNDS = {
  /** Files in the archive, pictures and all. */
  entries: 5_000,
  /** Bytes of all parts that are read, unpacked. */
  unpackedBytes: 300_000_000,
  /** A part may unpack to this many bytes whatever its ratio. */
  ratioFreeBytes: 5_000_000,
  /** Unpacked over packed bytes of a larger part; the sheets of real lists stay under 30. */
  ratio: 300,
  /** Characters of XML between two tags. */
  quietCharacters: 1_000_000,
  /** Elements inside one another. */
  depth: 64,
  sharedStrings: 2_000_000,
  /** Characters of all shared strings together. */
  sharedCharacters: 100_000_000,
  cellFormats: 65_536,
  /** Characters of all number formats that a workbook writes out itself. */
  formatCharacters: 300_000,
  merges: 100_000,
  sheets: 1_000,
  sheetNameLength: 100,
} as const;
