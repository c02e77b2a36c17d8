import { LIMITS } from './grid.ts';
import { ImportRefusal } from './import-refusal.ts';

export const ENCODINGS = ['utf-8', 'utf-16le', 'utf-16be', 'windows-1252'] as const;
export type Encoding = (typeof ENCODINGS)[number];

export interface DecodedText {
  readonly text: string;
  readonly encoding: Encoding;
  /** Whether the file began with a byte order mark; it is not part of `text`. */
  readonly bom: boolean;
}

/**
 * Turns the bytes of an upload into text.
 *
 * @param bytes the whole file
 * @param chosen the encoding that a person set; without it, it is detected: byte order mark, then the
 *   zero bytes of UTF-16, then strict UTF-8, and Windows-1252 for what is left
 * @throws {ImportRefusal} for an empty or too large file, and for what is no text
 */
export function decodeText(bytes: Uint8Array, chosen?: Encoding): DecodedText {
  if (bytes.length > LIMITS.bytes) throw tooLarge(bytes.length);
  refuseKnownFormats(bytes);
  const mark = byteOrderMark(bytes);
  const encoding = chosen ?? mark?.encoding ?? detectEncoding(bytes);
  const bom = mark?.encoding === encoding;
  const text = decodeAs(bom ? bytes.subarray(mark.length) : bytes, encoding);
  if (text.trim() === '') throw empty();
  refuseNonText(text);
  return { text, encoding, bom };
}

interface ByteOrderMark {
  readonly encoding: Encoding;
  readonly length: number;
}

function byteOrderMark(bytes: Uint8Array): ByteOrderMark | null {
  if (startsWith(bytes, [0xef, 0xbb, 0xbf])) return { encoding: 'utf-8', length: 3 };
  if (startsWith(bytes, [0xff, 0xfe])) return { encoding: 'utf-16le', length: 2 };
  if (startsWith(bytes, [0xfe, 0xff])) return { encoding: 'utf-16be', length: 2 };
  return null;
}

function detectEncoding(bytes: Uint8Array): Encoding {
  return zeroBytePattern(bytes) ?? (isUtf8(bytes) ? 'utf-8' : 'windows-1252');
}

/** Latin text in UTF-16 has a zero in every second byte: the odd ones in little endian, else the even ones. */
function zeroBytePattern(bytes: Uint8Array): Encoding | null {
  const sample = bytes.subarray(0, 4096);
  const zeros = [0, 0];
  sample.forEach((byte, i) => {
    if (byte === 0) zeros[i % 2] += 1;
  });
  const [even, odd] = zeros.map((count) => count / (sample.length / 2)) as [number, number];
  if (odd > 0.4 && even < 0.1) return 'utf-16le';
  if (even > 0.4 && odd < 0.1) return 'utf-16be';
  return null;
}

function isUtf8(bytes: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return true;
  } catch {
    return false;
  }
}

function decodeAs(bytes: Uint8Array, encoding: Encoding): string {
  if (encoding === 'windows-1252') return decodeWindows1252(bytes);
  try {
    return new TextDecoder(encoding, { fatal: true }).decode(bytes);
  } catch {
    throw new ImportRefusal(
      'encoding-mismatch',
      'The encoding does not fit',
      `This file is not ${encoding.toUpperCase()}.`,
      'Choose another encoding, or let it be detected.',
    );
  }
}

/** What Windows-1252 has at 0x80 to 0x9F, where Latin-1 has control characters. */
const WINDOWS_1252_C1 = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ';

/** By a table of our own: some releases of Node decode this label as Latin-1. */
function decodeWindows1252(bytes: Uint8Array): string {
  return Buffer.from(bytes)
    .toString('latin1')
    .replace(/[\u0080-\u009f]/g, (each) => WINDOWS_1252_C1[each.charCodeAt(0) - 0x80]);
}

interface KnownFormat {
  readonly magic: readonly number[];
  readonly refuse: () => ImportRefusal;
}

const KNOWN_FORMATS: readonly KnownFormat[] = [
  { magic: [0x50, 0x4b, 0x03, 0x04], refuse: workbook },
  { magic: [0x50, 0x4b, 0x05, 0x06], refuse: workbook },
  { magic: [0xd0, 0xcf, 0x11, 0xe0], refuse: oldSpreadsheet },
  { magic: [0x25, 0x50, 0x44, 0x46, 0x2d], refuse: pdf },
  { magic: [0x1f, 0x8b], refuse: compressed },
  { magic: [0x37, 0x7a, 0xbc, 0xaf], refuse: compressed },
];

function refuseKnownFormats(bytes: Uint8Array): void {
  const known = KNOWN_FORMATS.find((format) => startsWith(bytes, format.magic));
  if (known) throw known.refuse();
}

/** A text has no NUL, and next to no other control characters. */
function refuseNonText(text: string): void {
  if (text.includes('\0')) {
    throw new ImportRefusal(
      'nul-bytes',
      'This file is not plain text',
      'It holds NUL bytes, which no text has.',
      'Open it in the program it comes from and save it as CSV (UTF-8).',
    );
  }
  // eslint-disable-next-line no-control-regex -- control characters are what is looked for
  const controls = text.match(/[\u0001-\u0008\u000e-\u001f]/g)?.length ?? 0;
  if (controls > Math.max(4, text.length / 500)) {
    throw new ImportRefusal(
      'not-text',
      'This file is not plain text',
      'Its content looks like that of a binary file.',
      'Open it in the program it comes from and save it as CSV (UTF-8).',
    );
  }
}

function startsWith(bytes: Uint8Array, magic: readonly number[]): boolean {
  return magic.every((byte, i) => bytes[i] === byte);
}

function empty(): ImportRefusal {
  return new ImportRefusal(
    'empty-file',
    'The file is empty',
    'There is no text in it.',
    'Check that the list was saved, then choose the file again.',
  );
}

function tooLarge(size: number): ImportRefusal {
  const megabytes = (n: number): string => (n / 1_000_000).toFixed(n % 1_000_000 === 0 ? 0 : 1);
  return new ImportRefusal(
    'too-large',
    'The file is too large',
    `It has ${megabytes(size)} MB; up to ${megabytes(LIMITS.bytes)} MB can be read.`,
    'Split the list, for instance by area, and import the parts one after the other.',
  );
}

function workbook(): ImportRefusal {
  return new ImportRefusal(
    'workbook',
    'This is a workbook, not a CSV',
    'The file is a workbook or another zip archive.',
    'Open it in your spreadsheet program and save the sheet as CSV (UTF-8).',
  );
}

function oldSpreadsheet(): ImportRefusal {
  return new ImportRefusal(
    'old-spreadsheet',
    'This is a spreadsheet of the old kind, not a CSV',
    'The file is in the binary format of older office programs.',
    'Open it in your spreadsheet program and save it as .xlsx, or save the sheet as CSV (UTF-8).',
  );
}

function pdf(): ImportRefusal {
  return new ImportRefusal(
    'pdf',
    'This is a PDF, not a CSV',
    'A PDF holds printed pages, not the cells of a list.',
    'Ask for the list the PDF was printed from, and save that as CSV (UTF-8).',
  );
}

function compressed(): ImportRefusal {
  return new ImportRefusal(
    'compressed',
    'This is a compressed file, not a CSV',
    'The list has to be unpacked first.',
    'Unpack it and choose the CSV inside.',
  );
}
