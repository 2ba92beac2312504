import { LIMITS } from './list.js';

export type DecodeResult =
  /** `bytes` is what `text` was decoded from: the file without its byte-order mark. */
  | { readonly ok: true; readonly text: string; readonly bytes: Uint8Array }
  | { readonly ok: false; readonly code: string; readonly reason: string; readonly fix: string; readonly line: number };

/** Bytes of a list as text: strict UTF-8, with or without byte-order mark. Anything else is refused by name, never guessed. */
export function decodeList(bytes: Uint8Array): DecodeResult {
  if (bytes.length > LIMITS.bytes) return refuse('I105', `the file has ${bytes.length} bytes, the limit is 64 MiB`, 'split the list');
  const utf16 = utf16Mark(bytes);
  if (utf16 !== null) return refuse('I102', `the file is ${utf16}, not UTF-8`, SAVE_AS);
  const nul = bytes.indexOf(0);
  if (nul >= 0) return refuse('I102', nulReason(bytes, nul), SAVE_AS, lineOf(bytes, nul));
  const content = hasUtf8Mark(bytes) ? bytes.subarray(3) : bytes;
  const bad = firstBadByte(content);
  if (bad !== null) return refuse('I101', badReason(bytes, bad + bytes.length - content.length), SAVE_AS, lineOf(content, bad));
  return { ok: true, text: new TextDecoder('utf-8', { ignoreBOM: true }).decode(content), bytes: content };
}

const SAVE_AS = 'save the file as "CSV UTF-8"';

function refuse(...[code, reason, fix, line = 1]: [string, string, string, number?]): DecodeResult {
  return { ok: false, code, reason, fix, line };
}

function hasUtf8Mark(bytes: Uint8Array): boolean {
  return bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf;
}

function utf16Mark(bytes: Uint8Array): string | null {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'UTF-16 (little-endian, by its byte-order mark)';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'UTF-16 (big-endian, by its byte-order mark)';
  return null;
}

function nulReason(bytes: Uint8Array, offset: number): string {
  const guess = bytes[offset === 0 ? 1 : offset - 1] === 0 ? 'it is not a text file' : 'it is most likely UTF-16 without its mark';
  return `a NUL byte at offset ${offset}: ${guess}`;
}

function badReason(bytes: Uint8Array, offset: number): string {
  const byte = (bytes[offset] ?? 0).toString(16).toUpperCase().padStart(2, '0');
  return `not UTF-8: the byte 0x${byte} at offset ${offset} begins no valid character`;
}

/** Physical line of a byte, from 1; a line ends with LF, CR LF or CR. */
export function lineOf(bytes: Uint8Array, offset: number): number {
  let line = 1;
  for (let at = 0; at < offset; at += 1) {
    if (bytes[at] === 0x0a || (bytes[at] === 0x0d && bytes[at + 1] !== 0x0a)) line += 1;
  }
  return line;
}

/** Offset of the first byte that is not part of well-formed UTF-8 (RFC 3629, section 4), or null. */
function firstBadByte(bytes: Uint8Array): number | null {
  for (let at = 0; at < bytes.length; ) {
    const length = sequenceLength(bytes, at);
    if (length === 0) return at;
    at += length;
  }
  return null;
}

function sequenceLength(bytes: Uint8Array, at: number): number {
  const lead = bytes[at] ?? 0;
  if (lead < 0x80) return 1;
  const length = lead >= 0xc2 && lead < 0xe0 ? 2 : lead >= 0xe0 && lead < 0xf0 ? 3 : lead >= 0xf0 && lead < 0xf5 ? 4 : 0;
  if (length === 0 || !secondFits(lead, bytes[at + 1] ?? 0)) return 0;
  for (let next = 2; next < length; next += 1) if (((bytes[at + next] ?? 0) & 0xc0) !== 0x80) return 0;
  return length;
}

// The second byte excludes overlong forms, surrogates and code points above U+10FFFF.
function secondFits(lead: number, second: number): boolean {
  const low = lead === 0xe0 ? 0xa0 : lead === 0xf0 ? 0x90 : 0x80;
  const high = lead === 0xed ? 0x9f : lead === 0xf4 ? 0x8f : 0xbf;
  return second >= low && second <= high;
}
