import { ok, type Result } from '../result';
import type { TextEncoding } from './column-layout';
import { intakeFailure, type IntakeFailure } from './intake-failure';

/** How much of a file is looked at to find out what it is. */
export const HEAD_BYTES = 65_536;

const KNOWN_BINARY: readonly (readonly [string, readonly number[]])[] = [
  ['a PNG picture', [0x89, 0x50, 0x4e, 0x47]],
  ['a JPEG picture', [0xff, 0xd8, 0xff]],
  ['a GIF picture', [0x47, 0x49, 0x46, 0x38]],
  ['a PDF document', [0x25, 0x50, 0x44, 0x46]],
  ['a ZIP archive or a spreadsheet workbook', [0x50, 0x4b, 0x03, 0x04]],
  ['an old spreadsheet workbook', [0xd0, 0xcf, 0x11, 0xe0]],
  ['a compressed archive', [0x1f, 0x8b]],
];

/**
 * Finds out how a file spells text: byte order mark first, then the zero bytes of UTF-16, then
 * whether the first 64 KB are UTF-8; anything else that is text is read as Latin-1. Pictures,
 * documents, archives and other binary files are refused by what they are, whatever their name.
 */
export function detectEncoding(
  bytes: Uint8Array,
  fileName: string,
): Result<TextEncoding, IntakeFailure> {
  if (bytes.length === 0) {
    return intakeFailure('EMPTY_FILE', fileName, {}, 'the file is empty; export it again.');
  }
  const binary = KNOWN_BINARY.find(([, magic]) => startsWith(bytes, magic));
  if (binary !== undefined) return notText(fileName, binary[0]);
  const head = bytes.subarray(0, HEAD_BYTES);
  const wide = wideEncoding(head);
  if (wide !== null) return ok(wide);
  const control = head.reduce((count, byte) => count + (isControl(byte) ? 1 : 0), 0);
  if (control > 0) return notText(fileName, 'not a text file');
  return ok(isUtf8(head) ? 'utf-8' : 'latin-1');
}

/**
 * The file as one byte a character, which is all that numbers need: UTF-16 is narrowed (a character
 * beyond Latin-1 becomes `?`), other encodings come back as they are, without a byte order mark.
 * Lone carriage returns become line feeds.
 */
export function singleBytes(bytes: Uint8Array, encoding: TextEncoding): Uint8Array {
  const narrow =
    encoding === 'utf-16le' || encoding === 'utf-16be' ? narrowed(bytes, encoding) : bytes;
  const start = encoding === 'utf-8' && startsWith(narrow, [0xef, 0xbb, 0xbf]) ? 3 : 0;
  const body = narrow.subarray(start);
  const lineFeed = body.includes(10);
  return lineFeed || !body.includes(13) ? body : body.map((byte) => (byte === 13 ? 10 : byte));
}

/** Decodes a piece of a file; a character cut at the end of the piece is left out. */
export function decodeText(bytes: Uint8Array, encoding: TextEncoding): string {
  const label = encoding === 'latin-1' ? 'windows-1252' : encoding;
  return new TextDecoder(label).decode(bytes, { stream: true });
}

function notText(fileName: string, what: string): ReturnType<typeof intakeFailure> {
  return intakeFailure(
    'NOT_TEXT',
    fileName,
    {},
    `this is ${what}; export the record as CSV text and upload that.`,
  );
}

function isControl(byte: number): boolean {
  return byte < 32 && byte !== 9 && byte !== 10 && byte !== 12 && byte !== 13;
}

function startsWith(bytes: Uint8Array, beginning: readonly number[]): boolean {
  return beginning.every((byte, i) => bytes[i] === byte);
}

function wideEncoding(head: Uint8Array): 'utf-16le' | 'utf-16be' | null {
  if (startsWith(head, [0xff, 0xfe])) return 'utf-16le';
  if (startsWith(head, [0xfe, 0xff])) return 'utf-16be';
  const zeros = (parity: number): number =>
    head.reduce((count, byte, i) => count + (byte === 0 && i % 2 === parity ? 1 : 0), 0);
  const [even, odd] = [zeros(0), zeros(1)];
  const many = head.length * 0.4;
  if (odd > many && even === 0) return 'utf-16le';
  return even > many && odd === 0 ? 'utf-16be' : null;
}

function isUtf8(head: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(head, { stream: true });
    return true;
  } catch {
    return false;
  }
}

function narrowed(bytes: Uint8Array, encoding: 'utf-16le' | 'utf-16be'): Uint8Array {
  const low = encoding === 'utf-16le' ? 0 : 1;
  const marked = startsWith(bytes, low === 0 ? [0xff, 0xfe] : [0xfe, 0xff]) ? 2 : 0;
  const out = new Uint8Array(Math.floor((bytes.length - marked) / 2));
  for (let i = 0; i < out.length; i++) {
    const at = marked + 2 * i;
    const beyond = (bytes[at + 1 - low] ?? 0) !== 0;
    out[i] = beyond ? 63 : (bytes[at + low] ?? 0);
  }
  return out;
}
