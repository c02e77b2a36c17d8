import { crc32, deflateRawSync } from 'node:zlib';

/** A file for an archive; what is given besides the content makes the archive lie or break. */
export interface ZipFile {
  readonly content: string | Uint8Array;
  readonly stored?: boolean;
  readonly method?: number;
  readonly flags?: number;
  readonly crc?: number;
  /** Sizes that the directory claims, bytes. */
  readonly claimed?: { readonly packed?: number; readonly unpacked?: number };
  /** Whether sizes and place stand in the 64-bit extra field. */
  readonly wide?: boolean;
}

export type ZipFiles = readonly (readonly [name: string, file: ZipFile | string])[];

/** Makes a zip archive, without any of the checks that would keep a hostile one from being made. */
export function zipOf(files: ZipFiles): Buffer {
  const locals: Buffer[] = [];
  const central: Buffer[] = [];
  let at = 0;
  for (const [name, each] of files) {
    const { local, entry } = packed(name, typeof each === 'string' ? { content: each } : each, at);
    locals.push(local);
    central.push(entry);
    at += local.length;
  }
  const directory = Buffer.concat(central);
  return Buffer.concat([...locals, directory, endRecord(files.length, directory.length, at)]);
}

function packed(name: string, file: ZipFile, at: number): { local: Buffer; entry: Buffer } {
  const content = Buffer.from(file.content);
  const data = file.stored ? content : deflateRawSync(content);
  const nameBytes = Buffer.from(name);
  const unpackedBytes = file.claimed?.unpacked ?? content.length;
  const packedBytes = file.claimed?.packed ?? data.length;
  const head = Buffer.alloc(26);
  head.writeUInt16LE(20, 0);
  head.writeUInt16LE(file.flags ?? 0, 2);
  head.writeUInt16LE(file.method ?? (file.stored ? 0 : 8), 4);
  head.writeUInt32LE(file.crc ?? crc32(content), 10);
  head.writeUInt32LE(file.wide ? 0xffffffff : packedBytes, 14);
  head.writeUInt32LE(file.wide ? 0xffffffff : unpackedBytes, 18);
  head.writeUInt16LE(nameBytes.length, 22);
  const extra = file.wide ? wideField(unpackedBytes, packedBytes) : Buffer.alloc(0);
  const tail = Buffer.alloc(14);
  tail.writeUInt32LE(at, 10);
  const centralHead = Buffer.from(head);
  centralHead.writeUInt16LE(extra.length, 24);
  return {
    local: Buffer.concat([Buffer.from('PK\u0003\u0004'), head, nameBytes, data]),
    entry: Buffer.concat([Buffer.from('PK\u0001\u0002\u0014\0'), centralHead, tail, nameBytes, extra]),
  };
}

function wideField(unpackedBytes: number, packedBytes: number): Buffer {
  const field = Buffer.alloc(20);
  field.writeUInt16LE(1, 0);
  field.writeUInt16LE(16, 2);
  field.writeBigUInt64LE(BigInt(unpackedBytes), 4);
  field.writeBigUInt64LE(BigInt(packedBytes), 12);
  return field;
}

function endRecord(count: number, size: number, at: number): Buffer {
  const end = Buffer.alloc(22);
  end.write('PK\u0005\u0006', 'latin1');
  end.writeUInt16LE(count, 8);
  end.writeUInt16LE(count, 10);
  end.writeUInt32LE(size, 12);
  end.writeUInt32LE(at, 16);
  return end;
}
