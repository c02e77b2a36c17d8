import { describe, expect, it } from 'vitest';
import { decodeText } from './decode.ts';
import { LIMITS } from './grid.ts';
import { ImportRefusal, type RefusalCode } from './import-refusal.ts';

const TEXT = 'Tag;Länge\r\nGC1-L01;18\r\n';

function utf16(text: string, bigEndian: boolean, mark: boolean): Uint8Array {
  const bytes = Buffer.from((mark ? '\ufeff' : '') + text, 'utf16le');
  return bigEndian ? bytes.swap16() : bytes;
}

function refusalOf(bytes: Uint8Array): RefusalCode | null {
  try {
    decodeText(bytes);
    return null;
  } catch (error) {
    expect(error).toBeInstanceOf(ImportRefusal);
    const refusal = error as ImportRefusal;
    expect([refusal.title, refusal.detail, refusal.remedy].every((each) => each.length > 5)).toBe(true);
    return refusal.code;
  }
}

describe('decoding an upload', () => {
  it.each([
    ['UTF-8', Buffer.from(TEXT), 'utf-8', false],
    ['UTF-8 with mark', Buffer.from(`\ufeff${TEXT}`), 'utf-8', true],
    ['UTF-16 LE with mark', utf16(TEXT, false, true), 'utf-16le', true],
    ['UTF-16 BE with mark', utf16(TEXT, true, true), 'utf-16be', true],
    ['UTF-16 LE by its zero bytes', utf16(TEXT, false, false), 'utf-16le', false],
    ['UTF-16 BE by its zero bytes', utf16(TEXT, true, false), 'utf-16be', false],
    ['Windows-1252', Buffer.from(TEXT, 'latin1'), 'windows-1252', false],
  ])('reads %s', (_name, bytes, encoding, bom) => {
    expect(decodeText(bytes)).toEqual({ text: TEXT, encoding, bom });
  });

  it('reads the signs that Windows-1252 has and Latin-1 lacks', () => {
    expect(decodeText(Uint8Array.of(0x80, 0x85, 0x96, 0x84, 0x93, 0xe4)).text).toBe('€…–„“ä');
  });

  it('takes the encoding that a person chose', () => {
    expect(decodeText(Buffer.from('ä'), 'windows-1252').text).toBe('Ã¤');
    expect(() => decodeText(Buffer.from(TEXT, 'latin1'), 'utf-8')).toThrow(/encoding/i);
  });

  it.each<[string, Uint8Array, RefusalCode]>([
    ['nothing', new Uint8Array(), 'empty-file'],
    ['blanks only', Buffer.from(' \r\n\t'), 'empty-file'],
    ['a byte order mark only', Uint8Array.of(0xef, 0xbb, 0xbf), 'empty-file'],
    ['a workbook', Buffer.from('PK\u0003\u0004rest'), 'workbook'],
    ['an old spreadsheet', Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1), 'old-spreadsheet'],
    ['a PDF', Buffer.from('%PDF-1.7\n'), 'pdf'],
    ['a compressed file', Uint8Array.of(0x1f, 0x8b, 8, 0), 'compressed'],
    ['a text with NUL', Buffer.from('Tag,Text\nA,b\0c\n'), 'nul-bytes'],
    ['other binary content', Uint8Array.from({ length: 900 }, (_, i) => 1 + (i % 255)), 'not-text'],
    ['a file beyond the limit', new Uint8Array(LIMITS.bytes + 1), 'too-large'],
  ])('refuses %s', (_name, bytes, code) => {
    expect(refusalOf(bytes)).toBe(code);
  });
});
