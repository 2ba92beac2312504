import type { Delimiter, ListRecord } from './list.js';
import { RecordReader, type QuoteFault } from './record-reader.js';

/** A record that could not be taken apart. */
export interface SplitFault extends QuoteFault {
  /** Physical line where the record starts. */
  readonly line: number;
  readonly row: number;
}

export interface Records {
  /** Blank rows are records with one empty cell. */
  readonly records: readonly ListRecord[];
  readonly faults: readonly SplitFault[];
}

/**
 * Takes a text apart by the quoting rules of RFC 4180, at any delimiter; lines end with LF, CR LF or CR. A record with a stray quote
 * is a fault and left out, and reading goes on at the next line; a quote that never closes has swallowed the rest.
 */
export function recordsOf(text: string, delimiter: Delimiter): Records {
  const records: ListRecord[] = [];
  const faults: SplitFault[] = [];
  for (const one of recordStream([text], delimiter)) {
    if ('cells' in one) records.push(one);
    else faults.push(one);
  }
  return { records, faults };
}

/** The same of a text that comes in pieces, cut anywhere; no more of it is held than the record that is being read. */
export function* recordStream(pieces: Iterable<string>, delimiter: Delimiter): Generator<ListRecord | SplitFault> {
  const reader = new RecordReader(delimiter.charCodeAt(0));
  const coming = pieces[Symbol.iterator]();
  let isWhole = false;
  for (let row = 1; ; ) {
    const from = reader.place();
    const read = reader.isAtEnd() ? null : reader.record();
    if (!isWhole && reader.isAtEnd()) {
      // What comes next may belong to this record. A long one is not read again for every piece.
      reader.backTo(from);
      const wanted = 2 * reader.left();
      do {
        const next = coming.next();
        if (next.done === true) isWhole = true;
        else reader.append(next.value);
      } while (!isWhole && reader.left() < wanted);
      continue;
    }
    if (read === null) return;
    const { cells, fault } = read;
    yield fault === null ? { line: from.line, lineEnd: reader.lineOfEnd, row, cells } : { ...fault, line: from.line, row };
    row += 1;
  }
}
