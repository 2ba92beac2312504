import { cellPool } from './cell-pool.js';

const [QUOTE, CR, LF] = [0x22, 0x0d, 0x0a];

/** Why a record could not be taken apart. */
export interface QuoteFault {
  readonly code: 'I303' | 'I304';
  /** Physical line on which the quote stands. */
  readonly quoteLine: number;
  /** From 1. */
  readonly column: number;
  /** Where on its line the quote stands, from 1. */
  readonly character: number;
  /** The cell as it can be made out. */
  readonly text: string;
}

/** Where reading has come to in the text that is held. */
interface ReadingPlace {
  readonly at: number;
  readonly line: number;
  readonly lineStart: number;
}

/** Takes one record after another from a text, by the quoting rules of RFC 4180; more of the text may be added between them. */
export class RecordReader {
  /** Physical line of the place reading has come to. */
  line = 1;
  /** Physical line on which the last record ended. */
  lineOfEnd = 1;
  #text = '';
  readonly #delimiter: number;
  readonly #pooled = cellPool();
  #at = 0;
  #lineStart = 0;
  #width = 0;

  constructor(delimiter: number) {
    this.#delimiter = delimiter;
  }

  /** More of the text; what has been read of it is let go. */
  append(piece: string): void {
    this.#text = this.#text.slice(this.#at) + piece;
    this.#lineStart -= this.#at;
    this.#at = 0;
  }

  /** Characters that are there and not read yet. */
  left(): number {
    return this.#text.length - this.#at;
  }

  place(): ReadingPlace {
    return { at: this.#at, line: this.line, lineStart: this.#lineStart };
  }

  backTo({ at, line, lineStart }: ReadingPlace): void {
    [this.#at, this.line, this.#lineStart] = [at, line, lineStart];
  }

  isAtEnd(): boolean {
    return this.#at >= this.#text.length;
  }

  record(): { readonly cells: readonly string[]; readonly fault: QuoteFault | null } {
    // Rows of a table are as wide as the row before: room for all cells at once.
    const cells = new Array<string>(this.#width);
    let count = 0;
    let fault: QuoteFault | null = null;
    for (; ; count += 1) {
      const next = this.#text.charCodeAt(this.#at);
      // An empty cell, as most of a wide table are.
      if (next === this.#delimiter) cells[count] = '';
      else {
        const found = next === QUOTE ? this.#quoted(count + 1) : this.#plain(count + 1);
        cells[count] = this.#pooled(found.text);
        fault ??= found.fault;
      }
      if (this.#text.charCodeAt(this.#at) !== this.#delimiter || this.isAtEnd()) break;
      this.#at += 1;
    }
    this.#width = cells.length = count + 1;
    this.lineOfEnd = this.line;
    this.#lineEnd();
    return { cells, fault };
  }

  #plain(column: number): { text: string; fault: QuoteFault | null } {
    const start = this.#at;
    this.#toCellEnd();
    const text = this.#text.slice(start, this.#at);
    const quote = text.indexOf('"');
    return { text, fault: quote < 0 ? null : this.#fault('I304', { column, at: start + quote, text }) };
  }

  #quoted(column: number): { text: string; fault: QuoteFault | null } {
    const [open, openLine, openLineStart] = [this.#at, this.line, this.#lineStart];
    const pieces: string[] = [];
    for (let from = open + 1; ; ) {
      const close = this.#text.indexOf('"', from);
      if (close < 0) {
        this.#skipTo(this.#text.length);
        const text = this.#text.slice(open + 1);
        return { text, fault: { code: 'I303', quoteLine: openLine, column, character: open - openLineStart + 1, text } };
      }
      pieces.push(this.#text.slice(from, close));
      this.#skipTo(close + 1);
      if (this.#text.charCodeAt(close + 1) !== QUOTE) return this.#closed(pieces.join('"'), column);
      from = close + 2;
      this.#at = from;
    }
  }

  /** Behind a closing quote only a delimiter, a line end or the end of the text may stand. */
  #closed(content: string, column: number): { text: string; fault: QuoteFault | null } {
    const quote = this.#at - 1;
    this.#toCellEnd();
    if (this.#at === quote + 1) return { text: content, fault: null };
    const text = content + this.#text.slice(quote + 1, this.#at);
    return { text, fault: this.#fault('I304', { column, at: quote, text }) };
  }

  #fault(code: QuoteFault['code'], { column, at, text }: { column: number; at: number; text: string }): QuoteFault {
    return { code, quoteLine: this.line, column, character: at - this.#lineStart + 1, text };
  }

  #toCellEnd(): void {
    const [text, delimiter] = [this.#text, this.#delimiter];
    let at = this.#at;
    for (; at < text.length; at += 1) {
      const unit = text.charCodeAt(at);
      if (unit === delimiter || unit === LF || unit === CR) break;
    }
    this.#at = at;
  }

  /** Moves on inside quotes, counting the lines that end there. */
  #skipTo(end: number): void {
    for (; this.#at < end; this.#at += 1) {
      const unit = this.#text.charCodeAt(this.#at);
      if (unit !== LF && unit !== CR) continue;
      if (unit === CR && this.#text.charCodeAt(this.#at + 1) === LF) continue;
      this.line += 1;
      this.#lineStart = this.#at + 1;
    }
  }

  #lineEnd(): void {
    if (this.isAtEnd()) return;
    const isPair = this.#text.charCodeAt(this.#at) === CR && this.#text.charCodeAt(this.#at + 1) === LF;
    this.#at += isPair ? 2 : 1;
    this.line += 1;
    this.#lineStart = this.#at;
  }
}
