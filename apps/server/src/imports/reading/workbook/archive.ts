import { StringDecoder } from 'node:string_decoder';
import { crc32, createInflateRaw } from 'node:zlib';
import { BOUNDS } from './bounds.ts';
import { damaged, tooMuchInside } from './refusals.ts';
import { readDirectory, unpacksTooFar, type ZipEntry } from './zip-directory.ts';

const LOCAL_SIGNATURE = 0x04034b50;
const LOCAL_BYTES = 30;
const STORED = 0;
const DEFLATED = 8;
const CHUNK_BYTES = 65_536;

/** The parts of a zip archive held in memory. Nothing is written anywhere, and a part not asked for stays packed. */
export class Archive {
  private readonly file: Buffer;
  private readonly entries: ReadonlyMap<string, ZipEntry>;
  private unpacked = 0;

  /** @throws {ImportRefusal} when the directory cannot be read or promises too much */
  constructor(bytes: Uint8Array) {
    this.file = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.length);
    this.entries = readDirectory(this.file);
  }

  /** Names of all parts, in lower case. */
  names(): readonly string[] {
    return [...this.entries.keys()];
  }

  has(name: string): boolean {
    return this.entries.has(name.toLowerCase());
  }

  /** Unpacked size of a part as the directory has it, bytes; 0 for a part that is not there. */
  sizeOf(name: string): number {
    return this.entries.get(name.toLowerCase())?.unpackedBytes ?? 0;
  }

  /**
   * The text of a part, piece by piece: UTF-8, or UTF-16 by its byte order mark.
   *
   * @throws {ImportRefusal} when the part is missing or damaged, or when more comes out of it than its
   *   directory entry says or all parts may have
   */
  async *textOf(name: string): AsyncGenerator<string> {
    let decoder: StringDecoder | null = null;
    for await (const chunk of this.checked(this.entryOf(name))) {
      decoder ??= new StringDecoder(chunk[0] === 0xff && chunk[1] === 0xfe ? 'utf16le' : 'utf8');
      yield decoder.write(chunk);
    }
    yield decoder?.end() ?? '';
  }

  private entryOf(name: string): ZipEntry {
    const entry = this.entries.get(name.toLowerCase());
    if (!entry) throw damaged(`Its part ${name} is missing.`);
    return entry;
  }

  /** Counts while unpacking, so that a directory that lies is found out before the bytes go any further. */
  private async *checked(entry: ZipEntry): AsyncGenerator<Buffer> {
    let size = 0;
    let crc = 0;
    for await (const chunk of this.unpack(entry)) {
      size += chunk.length;
      this.unpacked += chunk.length;
      if (this.unpacked > BOUNDS.unpackedBytes) throw unpacksTooFar();
      if (size > entry.unpackedBytes) throw tooMuchInside(`Its part ${entry.name} is larger than the archive says.`);
      crc = crc32(chunk, crc);
      yield chunk;
    }
    if (size !== entry.unpackedBytes || crc !== entry.crc) throw damaged(`Its part ${entry.name} is not whole.`);
  }

  private async *unpack(entry: ZipEntry): AsyncGenerator<Buffer> {
    const packed = this.packedBytes(entry);
    if (entry.method === STORED) {
      for (let at = 0; at < packed.length; at += CHUNK_BYTES) yield packed.subarray(at, at + CHUNK_BYTES);
      return;
    }
    if (entry.method !== DEFLATED) throw damaged(`Its part ${entry.name} is packed in an unusual way.`);
    const inflate = createInflateRaw({ chunkSize: CHUNK_BYTES });
    inflate.end(packed);
    try {
      for await (const chunk of inflate) yield chunk as Buffer;
    } catch (error) {
      throw isZlibError(error) ? damaged(`Its part ${entry.name} cannot be unpacked.`) : error;
    }
  }

  private packedBytes({ name, headerAt, packedBytes }: ZipEntry): Buffer {
    if (headerAt + LOCAL_BYTES > this.file.length || this.file.readUInt32LE(headerAt) !== LOCAL_SIGNATURE) {
      throw damaged(`Its part ${name} is not where the directory says.`);
    }
    const from = headerAt + LOCAL_BYTES + this.file.readUInt16LE(headerAt + 26) + this.file.readUInt16LE(headerAt + 28);
    if (from + packedBytes > this.file.length) throw damaged(`Its part ${name} is cut off.`);
    return this.file.subarray(from, from + packedBytes);
  }
}

function isZlibError(error: unknown): boolean {
  return error instanceof Error && 'code' in error && /^Z_|^ERR_/.test(String(error.code));
}
