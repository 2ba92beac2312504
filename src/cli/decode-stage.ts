import { EXIT } from './exit-code.js';
import { RequestError } from './request-error.js';

/** The text of a stage file in UTF-8, with or without its byte order mark; the first byte that is none of UTF-8 is refused with its line. */
export function decodeStage(bytes: Uint8Array, file: string): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    const at = firstFault(bytes);
    const line = bytes.subarray(0, at).filter((byte) => byte === LINE_FEED).length + 1;
    const byte = (bytes[at] ?? 0).toString(16).toUpperCase().padStart(2, '0');
    const message = `not UTF-8: byte 0x${byte} in line ${line}`;
    throw new RequestError([{ code: 'S100', severity: 'error', message, fix: 'save the file as UTF-8', place: { file, line } }], EXIT.request);
  }
}

const LINE_FEED = 0x0a;

/** Index of the byte that starts the first sequence UTF-8 does not know. */
function firstFault(bytes: Uint8Array): number {
  const decoder = new TextDecoder('utf-8', { fatal: true });
  for (let at = 0; at < bytes.length; at += 1) {
    try {
      decoder.decode(bytes.subarray(at, at + 1), { stream: true });
    } catch {
      return startOfSequence(bytes, at);
    }
  }
  return startOfSequence(bytes, bytes.length - 1);
}

/** A sequence that breaks off is told by its first byte, the one an editor of another encoding wrote. */
function startOfSequence(bytes: Uint8Array, at: number): number {
  const isLead = (byte: number): boolean => byte >= 0xc0;
  for (let back = at - 1; back >= Math.max(0, at - 3); back -= 1) {
    const byte = bytes[back] ?? 0;
    if (byte < 0x80) break;
    if (isLead(byte) && !isComplete(bytes, back, at)) return back;
  }
  return at;
}

function isComplete(bytes: Uint8Array, from: number, to: number): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes.subarray(from, to));
    return true;
  } catch {
    return false;
  }
}
