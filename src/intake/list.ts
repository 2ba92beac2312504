import type { Part, Tier } from '../parts/part.js';
import type { Problem } from '../quantities/problem.js';
import type { ColumnReading } from './header.js';

/** One column of a list as it was read: what its cells mean and where they stand. */
export interface ListColumn {
  /** From 1. */
  readonly number: number;
  /** Spreadsheet letter: A, B, … AA. */
  readonly letter: string;
  /** As written, trimmed. */
  readonly header: string;
  readonly reading: ColumnReading;
}

/** One record as it was read. */
export interface ListRecord {
  /** Physical line where the record starts, and where it ends when it spans several. */
  readonly line: number;
  readonly lineEnd: number;
  /** Record number with the header as row 1, as a spreadsheet counts. */
  readonly row: number;
  readonly cells: readonly string[];
}

/** A list that can be imported: parts and the record each came from, in file order. */
export interface ReadList {
  readonly ok: true;
  readonly file: string;
  readonly tier: Tier;
  readonly parts: readonly Part[];
  readonly columns: readonly ListColumn[];
  /** `records[i]` is the record of `parts[i]`. */
  readonly records: readonly ListRecord[];
  /** SHA-256 over the bytes of the file, hexadecimal. */
  readonly sha256: string;
  readonly delimiter: Delimiter;
  /** `comma` when a cell of the file proves it. */
  readonly decimal: 'point' | 'comma';
  readonly warnings: readonly Problem[];
}

/** A list that was refused whole: every fault, in file order. */
export interface RefusedList {
  readonly ok: false;
  readonly file: string;
  readonly problems: readonly Problem[];
  readonly counts: RefusedCounts;
  /** How the file was taken apart; null when it could not even be decoded. */
  readonly shape: ListShape | null;
}

export interface ListShape {
  readonly delimiter: Delimiter;
  readonly columns: number;
  /** null when the cells were not reached. */
  readonly decimal: 'point' | 'comma' | null;
}

export interface RefusedCounts {
  /** Records below the header. */
  readonly rows: number;
  /** Faults that keep the list out (also those beyond the number of stored problems). */
  readonly errors: number;
  /** Cells, and rows, with at least one such fault. */
  readonly cells: number;
  readonly parts: number;
}

export type ListResult = ReadList | RefusedList;

export interface ListOptions {
  /** Name used in messages and kept as origin. */
  readonly file: string;
  readonly tier: Tier;
  /** Ids of the generic sets, which no approved part may have. */
  readonly genericIds?: ReadonlySet<string>;
  /** Classes of the generic sets; another `class` is warned of. Not judged when absent. */
  readonly classes?: ReadonlySet<string>;
}

export type Delimiter = ',' | ';' | '\t';

/** Over one of these a list is refused, naming the limit. */
export const LIMITS = { bytes: 64 * 1024 * 1024, records: 200_000, columns: 512, cell: 64 * 1024, problems: 10_000 } as const;
