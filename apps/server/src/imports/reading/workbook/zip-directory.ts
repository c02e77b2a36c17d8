import { BOUNDS } from './bounds.ts';
import { damaged, encrypted, tooMuchInside } from './refusals.ts';

/** A file of the archive as the archive's directory describes it. Nothing of it is believed unchecked. */
export interface ZipEntry {
  /** Lower case, with forward slashes; only ever compared. */
  readonly name: string;
  readonly method: number;
  readonly crc: number;
  readonly packedBytes: number;
  readonly unpackedBytes: number;
  /** Where the local header stands in the file. */
  readonly headerAt: number;
}

const SIGNATURE = { end: 0x06054b50, end64: 0x06064b50, locator64: 0x07064b50, central: 0x02014b50 } as const;
const END_BYTES = 22;
const CENTRAL_BYTES = 46;
const LONGEST_COMMENT = 0xffff;
/** What a 32-bit field holds when the value stands in the 64-bit record instead. */
const ELSEWHERE = 0xffffffff;

/**
 * The directory of a zip archive, by name (APPNOTE 6.3.10, sections 4.3.12 to 4.3.16).
 *
 * @param file the whole archive
 * @throws {ImportRefusal} when it is cut off or contradicts itself, has a password, or has more than a
 *   workbook can need
 */
export function readDirectory(file: Buffer): ReadonlyMap<string, ZipEntry> {
  const end = endRecord(file);
  if (end.count > BOUNDS.entries) throw tooMuchInside(`The archive has ${end.count} files inside it.`);
  const entries = new Map<string, ZipEntry>();
  let at = end.directoryAt;
  for (let i = 0; i < end.count; i += 1) {
    const { entry, next } = centralEntry(file, at);
    if (entries.has(entry.name)) throw damaged('The archive names one file twice.');
    entries.set(entry.name, entry);
    at = next;
  }
  refuseBombs([...entries.values()], file.length);
  return entries;
}

interface EndRecord {
  readonly count: number;
  readonly directoryAt: number;
}

function endRecord(file: Buffer): EndRecord {
  const earliest = Math.max(0, file.length - END_BYTES - LONGEST_COMMENT);
  for (let at = file.length - END_BYTES; at >= earliest; at -= 1) {
    if (file.readUInt32LE(at) === SIGNATURE.end && at + END_BYTES + file.readUInt16LE(at + 20) <= file.length) {
      return endRecord64(file, at) ?? { count: file.readUInt16LE(at + 10), directoryAt: file.readUInt32LE(at + 16) };
    }
  }
  throw damaged('The end of the file is missing.');
}

function endRecord64(file: Buffer, endAt: number): EndRecord | null {
  const locatorAt = endAt - 20;
  if (locatorAt < 0 || file.readUInt32LE(locatorAt) !== SIGNATURE.locator64) return null;
  const at = safeNumber(file, locatorAt + 8);
  if (at + 56 > file.length || file.readUInt32LE(at) !== SIGNATURE.end64) throw directoryBroken();
  return { count: safeNumber(file, at + 32), directoryAt: safeNumber(file, at + 48) };
}

function centralEntry(file: Buffer, at: number): { readonly entry: ZipEntry; readonly next: number } {
  if (at + CENTRAL_BYTES > file.length || file.readUInt32LE(at) !== SIGNATURE.central) throw directoryBroken();
  const nameEnd = at + CENTRAL_BYTES + file.readUInt16LE(at + 28);
  const extraEnd = nameEnd + file.readUInt16LE(at + 30);
  const next = extraEnd + file.readUInt16LE(at + 32);
  if (next > file.length) throw directoryBroken();
  if (file.readUInt16LE(at + 8) & 1) throw encrypted();
  const [unpackedBytes, packedBytes, headerAt] = inFull(
    [file.readUInt32LE(at + 24), file.readUInt32LE(at + 20), file.readUInt32LE(at + 42)],
    file.subarray(nameEnd, extraEnd),
  );
  const name = file
    .toString('utf8', at + CENTRAL_BYTES, nameEnd)
    .replaceAll('\\', '/')
    .toLowerCase();
  const [method, crc] = [file.readUInt16LE(at + 10), file.readUInt32LE(at + 16)];
  return { entry: { name, method, crc, packedBytes, unpackedBytes, headerAt }, next };
}

/** Puts the values of the 64-bit extra field, which come in this order, where the 32-bit ones say so. */
function inFull(fields: readonly number[], extra: Buffer): number[] {
  const wide = extraField64(extra);
  let at = 0;
  return fields.map((field) => {
    if (field !== ELSEWHERE || !wide) return field;
    if (at + 8 > wide.length) throw directoryBroken();
    at += 8;
    return safeNumber(wide, at - 8);
  });
}

function extraField64(extra: Buffer): Buffer | null {
  for (let at = 0; at + 4 <= extra.length;) {
    const end = at + 4 + extra.readUInt16LE(at + 2);
    if (extra.readUInt16LE(at) === 1) return extra.subarray(at + 4, end);
    at = end;
  }
  return null;
}

function safeNumber(buffer: Buffer, at: number): number {
  const value = Number(buffer.readBigUInt64LE(at));
  if (!Number.isSafeInteger(value)) throw directoryBroken();
  return value;
}

/** What the directory itself gives away; a directory that lies is caught when its parts are unpacked. */
function refuseBombs(entries: readonly ZipEntry[], fileBytes: number): void {
  const packed = entries.reduce((sum, { packedBytes }) => sum + packedBytes, 0);
  if (packed > fileBytes) throw damaged('Its parts are said to be larger than the file.');
  const xml = entries.filter(({ name }) => /\.(xml|rels)$/.test(name));
  const unpacked = xml.reduce((sum, { unpackedBytes }) => sum + unpackedBytes, 0);
  if (unpacked > BOUNDS.unpackedBytes) throw unpacksTooFar();
  xml.forEach(refuseRatio);
}

function refuseRatio({ unpackedBytes, packedBytes }: ZipEntry): void {
  if (unpackedBytes <= BOUNDS.ratioFreeBytes || unpackedBytes <= BOUNDS.ratio * packedBytes) return;
  throw tooMuchInside(`One of its parts unpacks to more than ${BOUNDS.ratio} times its size, as no list does.`);
}

/** The refusal of content beyond `BOUNDS.unpackedBytes`. */
export function unpacksTooFar(): Error {
  return tooMuchInside(
    `Unpacked, it is far larger than a list can be; up to ${BOUNDS.unpackedBytes / 1_000_000} MB can be read.`,
  );
}

function directoryBroken(): Error {
  return damaged('The directory of its parts cannot be read.');
}
