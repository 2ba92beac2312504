/** Where a problem stands: a file with line and column (both from 1), an option, or a CSV cell. */
export interface Place {
  readonly file?: string;
  readonly line?: number;
  readonly column?: number;
  /** Stage-file path such as `signal.input`, or an option such as `--supply`. */
  readonly path?: string;
  /** CSV only: the record number with the header as row 1, the column letter, the header text and the part id. */
  readonly row?: number;
  readonly columnLetter?: string;
  readonly header?: string;
  readonly part?: string;
}

/** One thing that is wrong with what the user gave: what, where, why, and what to type instead. */
export interface Problem {
  /** Stable code with a help page: Q001.. quantities, S1xx stage file, S2xx contradictions, I5xx import, C1xx command line. */
  readonly code: string;
  readonly severity: 'error' | 'warning';
  /** A statement without "please" or exclamation marks; quotes the value as typed. */
  readonly message: string;
  /** Something that can be pasted in place of the faulty text. */
  readonly fix?: string;
  /** The text as typed, and the part of it that is meant: [start, end) in UTF-16 units. */
  readonly text?: string;
  readonly span?: readonly [number, number];
  readonly place?: Place;
}
