import { describe, expect, it } from 'vitest';
import { MOST_FILE_BYTES, decodeFile } from '#shared/domain/part-list/decode-file.ts';

const bytesOf = (text: string) => new TextEncoder().encode(text);

function utf16(text: string, order: 'le' | 'be', mark: boolean): Uint8Array {
  const units = [...(mark ? '\ufeff' : ''), ...text].map((letter) => letter.charCodeAt(0));
  return new Uint8Array(
    units.flatMap((unit) => (order === 'le' ? [unit & 255, unit >> 8] : [unit >> 8, unit & 255])),
  );
}

function faultOf(input: Uint8Array | string): string {
  const decoded = decodeFile(input);
  if (decoded.ok) throw new Error(`read as ${decoded.encoding}`);
  expect(decoded.message).toMatch(/[.]$/);
  return decoded.code;
}

describe('encodings', () => {
  it.each([
    ['utf-8', bytesOf('Länge 1½″')],
    ['utf-8 with mark', bytesOf('\ufeffLänge 1½″')],
    ['utf-16le', utf16('Länge 1½″', 'le', true)],
    ['utf-16be', utf16('Länge 1½″', 'be', true)],
    ['utf-16le', utf16('Länge 1½″', 'le', false)],
    ['utf-16be', utf16('Länge 1½″', 'be', false)],
  ])('%s', (encoding, bytes) => {
    expect(decodeFile(bytes)).toEqual({ ok: true, text: 'Länge 1½″', encoding });
  });

  it('what is no UTF-8 is Windows-1252, curly marks and crosses included', () => {
    const bytes = new Uint8Array([
      0x4c, 0x20, 0x35, 0x30, 0xd7, 0x35, 0x20, 0x31, 0x32, 0x92, 0x36, 0xbd, 0x94, 0x80,
    ]);
    expect(decodeFile(bytes)).toEqual({ ok: true, text: 'L 50×5 12’6½”€', encoding: 'windows-1252' });
  });

  it('pasted text is taken as it is', () => {
    expect(decodeFile('\ufeffMark,Qty')).toEqual({ ok: true, text: 'Mark,Qty', encoding: 'text' });
  });
});

describe('what cannot be a part list', () => {
  it.each<[string, Uint8Array | string]>([
    ['file-empty', new Uint8Array()],
    ['file-empty', ' \r\n\r\n'],
    ['file-spreadsheet', new Uint8Array([0x50, 0x4b, 0x03, 0x04, 0x14, 0x00])],
    ['file-spreadsheet', new Uint8Array([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, 0x00])],
    ['file-pdf', bytesOf('%PDF-1.7\n')],
    ['file-binary', new Uint8Array([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 1, 2, 3])],
    ['file-markup', '<html><table><tr><td>Mark</td></tr></table></html>'],
    ['file-too-large', new Uint8Array(MOST_FILE_BYTES + 1)],
  ])('%s', (code, input) => {
    expect(faultOf(input)).toBe(code);
  });

  it('a mark that begins like an archive is text', () => {
    expect(decodeFile('PK-1,4,L3x3x1/4').ok).toBe(true);
    expect(decodeFile(bytesOf('PKG1,4,L3x3x1/4')).ok).toBe(true);
  });
});
