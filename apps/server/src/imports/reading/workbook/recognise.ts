import { emptyFile, encrypted, fileTooLarge, oldSpreadsheet, otherOfficeDocument } from './refusals.ts';
import { LIMITS } from '../grid.ts';

const ZIP_MAGICS: readonly (readonly number[])[] = [
  [0x50, 0x4b, 0x03, 0x04],
  [0x50, 0x4b, 0x05, 0x06],
];
const CONTAINER_MAGIC = [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1];

/** A directory entry of a compound file: its name in UTF-16, the name's length in bytes behind it. */
const CONTAINER_ENTRY = { bytes: 128, nameLengthAt: 64 } as const;

/**
 * Whether a file is for `readWorkbook`, by its first bytes and whatever its name: a zip archive, or the
 * compound file that encrypted workbooks and spreadsheets of the old kind come in. Among them are files that
 * `readWorkbook` refuses with words of their own.
 */
export function isWorkbook(bytes: Uint8Array): boolean {
  return ZIP_MAGICS.some((magic) => startsWith(bytes, magic)) || isContainer(bytes);
}

/**
 * Refuses what cannot be a workbook before anything of it is unpacked.
 *
 * @throws {ImportRefusal} for an empty or too large file and for every compound file
 */
export function refuseByFirstBytes(bytes: Uint8Array): void {
  if (bytes.length === 0) throw emptyFile();
  if (bytes.length > LIMITS.bytes) throw fileTooLarge(bytes.length);
  if (isContainer(bytes)) throw containerRefusal(bytes);
}

function containerRefusal(bytes: Uint8Array): Error {
  if (hasStream(bytes, 'EncryptedPackage')) return encrypted();
  return hasStream(bytes, 'Workbook') || hasStream(bytes, 'Book') ? oldSpreadsheet() : otherOfficeDocument();
}

/** Looks at each place where a directory entry may stand; its sectors need not be followed for that. */
function hasStream(bytes: Uint8Array, name: string): boolean {
  const file = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.length);
  const wanted = Buffer.from(`${name}\0`, 'utf16le');
  const { bytes: step, nameLengthAt } = CONTAINER_ENTRY;
  for (let at = 0; at + step <= file.length; at += step) {
    if (file.readUInt16LE(at + nameLengthAt) !== wanted.length) continue;
    if (file.subarray(at, at + wanted.length).equals(wanted)) return true;
  }
  return false;
}

function isContainer(bytes: Uint8Array): boolean {
  return startsWith(bytes, CONTAINER_MAGIC);
}

function startsWith(bytes: Uint8Array, magic: readonly number[]): boolean {
  return magic.every((byte, i) => bytes[i] === byte);
}
