import { LIMITS } from '../grid.ts';

/** An escape such as `_x000D_` shrinks to one character, so a longer raw text is surely too long a cell. */
const RAW_LENGTH = 8 * LIMITS.cellLength;

/** Collects the pieces of a text, but never more than is needed to know that it is too long. */
export class TextCollector {
  private raw = '';

  clear(): void {
    this.raw = '';
  }

  add(piece: string): void {
    if (this.raw.length < RAW_LENGTH) this.raw += piece.length > RAW_LENGTH ? piece.slice(0, RAW_LENGTH) : piece;
  }

  get text(): string {
    return this.raw;
  }
}

/**
 * A text of the file as its cell shows it: the escapes of characters that XML cannot hold (ECMA-376 part 1,
 * 22.9.2.19) read back. Control characters other than tabs and line ends show as nothing; what would be
 * half a character stays as written.
 */
export function unescaped(text: string): string {
  if (!text.includes('_x')) return text;
  return text.replace(/_x([0-9A-Fa-f]{4})_/g, (escape, digits: string) => {
    const code = parseInt(digits, 16);
    if ((code >= 0xd800 && code <= 0xdfff) || code >= 0xfffe) return escape;
    const isControl = code < 0x20 && code !== 0x09 && code !== 0x0a && code !== 0x0d;
    return isControl ? '' : String.fromCharCode(code);
  });
}

/**
 * The same text in memory of its own. What a parser hands out is a window on the piece of the file it came
 * from, and a few kept words would keep all of the file.
 */
export function detached(text: string): string {
  return text.length < 13 ? text : Buffer.from(text, 'utf16le').toString('utf16le');
}
