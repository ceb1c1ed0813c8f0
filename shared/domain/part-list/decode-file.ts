/** What a file turned out to be, before any row of it is read. */
export type DecodedFile =
  | { readonly ok: true; readonly text: string; readonly encoding: string }
  | { readonly ok: false; readonly code: string; readonly message: string };

/** 20 MB: hundreds of thousands of rows. More than that is not a part list. */
export const MOST_FILE_BYTES = 20 * 1024 * 1024;

const AS_CSV = 'Open it in the program that made it, save it as CSV and choose that file.';

const ZIP = [0x50, 0x4b];
const ZIPPED = `This is a spreadsheet or a ZIP archive with another ending, not text. ${AS_CSV}`;
const MAGIC: readonly {
  readonly bytes: readonly number[];
  readonly code: string;
  readonly message: string;
}[] = [
  // A control character follows; a list whose first mark is PK-1 is text.
  { bytes: [...ZIP, 0x03], code: 'file-spreadsheet', message: ZIPPED },
  { bytes: [...ZIP, 0x05], code: 'file-spreadsheet', message: ZIPPED },
  { bytes: [...ZIP, 0x07], code: 'file-spreadsheet', message: ZIPPED },
  {
    bytes: [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1],
    code: 'file-spreadsheet',
    message: `This is an old spreadsheet file with another ending, not text. ${AS_CSV}`,
  },
  {
    bytes: [0x25, 0x50, 0x44, 0x46],
    code: 'file-pdf',
    message: 'This is a PDF, not text. Ask for the part list as CSV and choose that file.',
  },
];

/**
 * The letters of Windows-1252 that are not those of Latin-1, from 0x80. Written out because the decoders
 * of Node and of browsers do not agree about them, and page and server must read alike.
 */
const WINDOWS_1252 =
  '\u20ac\u0081\u201a\u0192\u201e\u2026\u2020\u2021\u02c6\u2030\u0160\u2039\u0152\u008d\u017d\u008f' +
  '\u0090\u2018\u2019\u201c\u201d\u2022\u2013\u2014\u02dc\u2122\u0161\u203a\u0153\u009d\u017e\u0178';

function decodeWindows1252(bytes: Uint8Array): string {
  const latin = new TextDecoder('latin1').decode(bytes);
  return latin.replace(/[\u0080-\u009f]/g, (letter) => WINDOWS_1252[letter.charCodeAt(0) - 0x80] ?? letter);
}

function startsWith(bytes: Uint8Array, magic: readonly number[]): boolean {
  return magic.every((byte, index) => bytes[index] === byte);
}

/** UTF-16 without a byte order mark: in a list of sizes nearly every second byte is zero. */
function guessUtf16(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | null {
  const seen = Math.min(bytes.length, 4000) & ~1;
  if (seen < 4) return null;
  let [even, odd] = [0, 0];
  for (let index = 0; index < seen; index += 2) {
    if (bytes[index] === 0) even += 1;
    if (bytes[index + 1] === 0) odd += 1;
  }
  const half = seen / 2;
  if (odd > half * 0.6 && even < half * 0.1) return 'utf-16le';
  return even > half * 0.6 && odd < half * 0.1 ? 'utf-16be' : null;
}

function decodeUtf8(bytes: Uint8Array): string | null {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch (error) {
    // TypeError is how a decoder says that the bytes are of another encoding.
    if (error instanceof TypeError) return null;
    throw error;
  }
}

function decodeBytes(bytes: Uint8Array): { text: string; encoding: string } {
  if (startsWith(bytes, [0xef, 0xbb, 0xbf])) {
    const text = decodeUtf8(bytes);
    if (text !== null) return { text, encoding: 'utf-8 with mark' };
  }
  const utf16 = startsWith(bytes, [0xff, 0xfe])
    ? 'utf-16le'
    : startsWith(bytes, [0xfe, 0xff])
      ? 'utf-16be'
      : guessUtf16(bytes);
  if (utf16) return { text: new TextDecoder(utf16).decode(bytes), encoding: utf16 };
  const utf8 = decodeUtf8(bytes);
  return utf8 === null
    ? { text: decodeWindows1252(bytes), encoding: 'windows-1252' }
    : { text: utf8, encoding: 'utf-8' };
}

/** Control characters no text file carries; tab, line ends and form feed are left out. */
const CONTROLS = /[\u0000-\u0008\u000b\u000e-\u001f\u007f]/g;

function judgeText(text: string, encoding: string): DecodedFile {
  if (text.trim() === '') {
    return {
      ok: false,
      code: 'file-empty',
      message: 'The file is empty. Choose the file with the part list.',
    };
  }
  const head = text.slice(0, 20_000);
  const controls = head.match(CONTROLS)?.length ?? 0;
  if (head.includes('\u0000') || controls > head.length / 100) {
    return { ok: false, code: 'file-binary', message: `This is not a text file. ${AS_CSV}` };
  }
  if (/^\s*<(?:!doctype|\?xml|html|table|workbook)/i.test(head)) {
    return { ok: false, code: 'file-markup', message: `This is a web page or XML, not CSV. ${AS_CSV}` };
  }
  return { ok: true, text, encoding };
}

/**
 * Turns the bytes of an uploaded file, or pasted text, into text: UTF-8 with or without byte order mark,
 * UTF-16 either way round, Windows-1252 for what is none of them. Says in plain words what cannot be a list.
 */
export function decodeFile(input: Uint8Array | string): DecodedFile {
  const size = input.length;
  if (size > MOST_FILE_BYTES) {
    const message = `The file has ${Math.ceil(size / 1_048_576)} MB; a part list may have 20 MB. Split it and read the parts one by one.`;
    return { ok: false, code: 'file-too-large', message };
  }
  if (typeof input === 'string') return judgeText(input.replace(/^\ufeff/, ''), 'text');
  const magic = MAGIC.find(({ bytes }) => startsWith(input, bytes));
  if (magic) return { ok: false, code: magic.code, message: magic.message };
  const { text, encoding } = decodeBytes(input);
  return judgeText(text, encoding);
}
