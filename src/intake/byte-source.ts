import { createHash } from 'node:crypto';
import { NeedsWhole } from './stream-errors.js';

/** A file that can be read again and again, some of it at a time. */
export interface ByteSource {
  readonly length: number;
  /** From the start, in order; a chunk may be overwritten by the next one. */
  chunks(): Iterable<Uint8Array>;
}

/** Bytes that are in memory already. */
export function wholeBytes(bytes: Uint8Array): ByteSource {
  return {
    length: bytes.length,
    *chunks() {
      for (let at = 0; at < bytes.length; at += CHUNK) yield bytes.subarray(at, at + CHUNK);
    },
  };
}

/** Bytes read at once. */
export const CHUNK = 1 << 18;

/** The UTF-8 text of a source, read once from start to end, and what is known of it by then. */
export interface TextRun {
  readonly pieces: Iterable<string>;
  /** How much was read, 0 to 1. */
  share(): number;
  /** SHA-256 over all bytes, hexadecimal; to be asked once, at the end. */
  sha256(): string;
}

/** Lines as they come, without byte-order mark. Bytes that are no UTF-8, or no text, throw `NeedsWhole`: what they are is told of the whole. */
export function textRun(source: ByteSource): TextRun {
  const hash = createHash('sha256');
  let read = 0;
  function* bytes(): Generator<Uint8Array> {
    for (const chunk of source.chunks()) {
      if (chunk.includes(0)) throw new NeedsWhole();
      hash.update(chunk);
      read += chunk.length;
      yield chunk;
    }
  }
  return { pieces: linesOf(bytes()), share: () => (source.length === 0 ? 1 : read / source.length), sha256: () => hash.digest('hex') };
}

const LF = 0x0a;

/** Cut behind line ends, where no character is cut. */
function* linesOf(chunks: Iterable<Uint8Array>): Generator<string> {
  const decoder = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });
  const decode = (bytes: Uint8Array): string => {
    try {
      return decoder.decode(bytes);
    } catch {
      throw new NeedsWhole();
    }
  };
  let [rest, isFirst]: [Buffer, boolean] = [Buffer.alloc(0), true];
  for (const chunk of chunks) {
    const end = chunk.lastIndexOf(LF) + 1;
    // A line longer than a chunk is none of a table.
    if (end === 0 && rest.length > CHUNK) throw new NeedsWhole();
    const lines = end === 0 ? '' : decode(Buffer.concat([rest, chunk.subarray(0, end)]));
    rest = Buffer.concat(end === 0 ? [rest, chunk] : [chunk.subarray(end)]);
    yield isFirst ? withoutMark(lines) : lines;
    isFirst &&= lines === '';
  }
  const last = decode(rest);
  yield isFirst ? withoutMark(last) : last;
}

const withoutMark = (text: string): string => (text.startsWith('\ufeff') ? text.slice(1) : text);
