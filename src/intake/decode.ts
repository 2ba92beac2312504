import { sizeFault, type Encoding } from './limits.js';
import { firstBadByte } from './utf8.js';
import { decodeWindows1252 } from './windows-1252.js';

export type DecodeResult =
  /** `text` is without byte-order mark. */
  | { readonly ok: true; readonly text: string; readonly encoding: Encoding; readonly how: string }
  | { readonly ok: false; readonly code: string; readonly reason: string; readonly fix: string; readonly line: number };

export interface DecodeOptions {
  /** Given by the user: it wins over what the bytes look like. */
  readonly encoding?: Encoding;
  readonly large?: boolean;
}

/**
 * Bytes of a list as text: by its byte-order mark, else strict UTF-8, else Windows-1252, stated with the first byte that is not
 * UTF-8. `encoding` overrides. NUL bytes without the mark of UTF-16 are refused with what they look like.
 */
export function decodeList(bytes: Uint8Array, { encoding, large = false }: DecodeOptions = {}): DecodeResult {
  const size = sizeFault(bytes.length, large);
  if (size !== null) return { ok: false, ...size };
  const mark = markOf(bytes);
  if (encoding !== undefined) return decodeAs(encoding, { bytes, from: mark?.encoding === encoding ? mark.length : 0 }, 'as given by --encoding');
  if (mark !== null) return decodeAs(mark.encoding, { bytes, from: mark.length }, 'byte-order mark, removed');
  const nul = bytes.indexOf(0);
  if (nul >= 0) return refuse('I102', nulReason(bytes, nul), nulFix(bytes), lineOf(bytes, nul));
  const bad = firstBadByte(bytes);
  return bad === null ? utf8(bytes, 'strict, no byte-order mark') : windows1252(bytes, bad);
}

function markOf(bytes: Uint8Array): { readonly encoding: Encoding; readonly length: number } | null {
  if (bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf) return { encoding: 'utf-8', length: 3 };
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return { encoding: 'utf-16le', length: 2 };
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return { encoding: 'utf-16be', length: 2 };
  return null;
}

/** The file, and where its text begins behind the mark. */
interface Marked {
  readonly bytes: Uint8Array;
  readonly from: number;
}

function decodeAs(encoding: Encoding, { bytes, from }: Marked, how: string): DecodeResult {
  const content = bytes.subarray(from);
  if (encoding === 'utf-8') {
    const bad = firstBadByte(content);
    return bad === null ? utf8(content, how) : refuse('I101', `not UTF-8 (${how}): ${byteWords(bytes, from + bad)} begins no valid character`, 'another --encoding', lineOf(content, bad));
  }
  if (encoding === 'windows-1252') {
    const decoded = decodeWindows1252(content);
    return 'text' in decoded ? transcoded(decoded.text, encoding, how) : refuse('I101', `${byteWords(content, decoded.bad)} is no character of Windows-1252`, 'another --encoding', lineOf(content, decoded.bad));
  }
  return utf16(content, encoding, how);
}

function utf16(content: Uint8Array, encoding: 'utf-16le' | 'utf-16be', how: string): DecodeResult {
  if (content.length % 2 !== 0) return refuse('I102', `the file is ${NAMES[encoding]} and ends in half a character`, 'save the file again, as "CSV UTF-8"');
  const units = Buffer.from(content);
  const text = (encoding === 'utf-16be' ? units.swap16() : units).toString('utf16le');
  if (/\p{Cs}/u.test(text)) return refuse('I102', `the file is ${NAMES[encoding]} and holds half a surrogate pair`, 'save the file again, as "CSV UTF-8"');
  return transcoded(text, encoding, how);
}

function utf8(bytes: Uint8Array, how: string): DecodeResult {
  return { ok: true, text: new TextDecoder('utf-8', { ignoreBOM: true }).decode(bytes), encoding: 'utf-8', how };
}

function windows1252(bytes: Uint8Array, bad: number): DecodeResult {
  const decoded = decodeWindows1252(bytes);
  const where = `${byteWords(bytes, bad)}, line ${lineOf(bytes, bad)}`;
  if ('text' in decoded) return transcoded(decoded.text, 'windows-1252', `not UTF-8: ${where}`);
  const other = `${byteWords(bytes, decoded.bad)} is no character of Windows-1252`;
  return refuse('I101', `not UTF-8 (${where} begins no valid character), and ${other}`, 'save the file as "CSV UTF-8"', lineOf(bytes, bad));
}

function transcoded(text: string, encoding: Encoding, how: string): DecodeResult {
  return { ok: true, text, encoding, how };
}

/** How encodings are called in messages. */
export const NAMES: Readonly<Record<Encoding, string>> = { 'utf-8': 'UTF-8', 'utf-16le': 'UTF-16LE', 'utf-16be': 'UTF-16BE', 'windows-1252': 'Windows-1252' };

function refuse(...[code, reason, fix, line = 1]: [string, string, string, number?]): DecodeResult {
  return { ok: false, code, reason, fix, line };
}

function byteWords(bytes: Uint8Array, offset: number): string {
  const byte = (bytes[offset] ?? 0).toString(16).toUpperCase().padStart(2, '0');
  return `the byte 0x${byte} at offset ${offset}`;
}

function nulReason(bytes: Uint8Array, offset: number): string {
  const guess = guessOf(bytes);
  return `a NUL byte at offset ${offset}: ${guess === null ? 'it is no text file, and no UTF-16 without its mark either' : `it is most likely ${NAMES[guess]} without its mark`}`;
}

function nulFix(bytes: Uint8Array): string {
  const guess = guessOf(bytes);
  return guess === null ? 'save the file as "CSV UTF-8"' : `--encoding ${guess}, or save the file as "CSV UTF-8"`;
}

/** Latin letters in UTF-16 leave every second byte NUL: the odd offsets when the low byte comes first. */
function guessOf(bytes: Uint8Array): Encoding | null {
  const nuls: [number, number] = [0, 0];
  const length = Math.min(bytes.length, 4096);
  for (let at = 0; at < length; at += 1) if (bytes[at] === 0) nuls[at % 2 === 0 ? 0 : 1] += 1;
  const [even, odd] = nuls;
  if (Math.max(even, odd) * 4 < length) return null;
  return odd > even ? 'utf-16le' : 'utf-16be';
}

/** Physical line of a byte, from 1; a line ends with LF, CR LF or CR. */
export function lineOf(bytes: Uint8Array, offset: number): number {
  let line = 1;
  for (let at = 0; at < offset; at += 1) {
    if (bytes[at] === 0x0a || (bytes[at] === 0x0d && bytes[at + 1] !== 0x0a)) line += 1;
  }
  return line;
}

