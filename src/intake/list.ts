import type { Origin, Part, Status, Tier } from '../parts/part.js';
import type { Problem } from '../quantities/problem.js';
import type { ColumnReading } from './column-reading.js';
import type { ClassProposal } from './class-proposal.js';
import type { Declarations } from './declarations.js';
import type { Layout } from './layout.js';
import type { Encoding } from './limits.js';
import type { ListSources } from './list-sources.js';
import type { ListMapping } from './mapping.js';
import type { TextTally } from './text-tally.js';
import type { Workbook } from './workbook.js';

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
  /** Where figures stand that no header names. */
  readonly sources: ListSources;
  /** By index of the part, by slot or identity field: what look-up sheets added to the list. Absent without any. */
  readonly patched?: ReadonlyMap<number, Readonly<Record<string, PatchedCell>>>;
  /** SHA-256 over the bytes of the file, hexadecimal. */
  readonly sha256: string;
  readonly delimiter: Delimiter;
  /** `comma` when a cell of the file proves it. */
  readonly decimal: 'point' | 'comma';
  readonly warnings: readonly Problem[];
  /** How the file was taken apart and what its columns were taken for, in sentences; nothing that needs an act. */
  readonly notes: readonly string[];
  /** How the list was read, to be kept and reused; null for the canonical CSV, which needs none. */
  readonly mapping: ListMapping | null;
  /** Classes the figures of parts without one are near to; not applied. */
  readonly proposals: readonly ClassProposal[];
}

/** One part of a list on its way into the catalog. */
export interface ListRow {
  readonly part: Part;
  readonly record: ListRecord;
  /** Of the part in the list; what `sources.others` and `patched` are told by. */
  readonly index: number;
}

/** A list that is read row by row, so that no more than a row of it is held. */
export interface ListStream extends Pick<ReadList, 'ok' | 'file' | 'tier' | 'columns' | 'sources' | 'patched'> {
  /** Of the bytes; known when `rows` has come to the end. */
  readonly sha256: string;
  /** Told about the whole list, known when `rows` has come to the end. */
  readonly warnings: readonly Problem[];
  /** How much of the file has been read, 0 to 1. */
  share(): number;
  /** What its columns of text say, by number; known when `rows` has come to the end. */
  readonly tallies: ReadonlyMap<number, TextTally>;
  /** By id. Throws at the end `ListRefused` with everything that is wrong, and `NeedsWhole` where this list cannot be read so. */
  rows(): Iterable<ListRow>;
}

/** A cell of a look-up sheet a figure came from. */
export type PatchedCell = Extract<Origin, { kind: 'cell' }>;

/** A list that was refused whole: every fault, in file order. */
export interface RefusedList {
  readonly ok: false;
  readonly file: string;
  readonly problems: readonly Problem[];
  readonly counts: RefusedCounts;
  /** How the file was taken apart; null when it could not even be decoded. */
  readonly shape: ListShape | null;
  readonly notes: readonly string[];
  /** What a person can answer; without an answer each is one of the problems. */
  readonly questions: readonly ListQuestion[];
}

/** One thing only the owner of the list knows, and the answers there are. */
export interface ListQuestion {
  readonly words: string;
  /** Cells the question is about, as written: at most three. */
  readonly samples: readonly string[];
  readonly choices: readonly { readonly words: string; readonly answer: ListAnswer }[];
}

/** An answer as the options carry it. */
export type ListAnswer = Pick<ListOptions, 'map' | 'layout' | 'delimiter' | 'words' | 'sheet'>;

/** A column, by letter or header, and the header it is read as; `text` keeps it unread. */
export interface ColumnAnswer {
  readonly column: string;
  readonly header: string;
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
  /** The sheets of a workbook, in place of the text in the bytes. */
  readonly workbook?: Workbook;
  /** Answers of the user; each wins over what the file and a mapping say. */
  readonly sheet?: string;
  readonly encoding?: Encoding;
  readonly delimiter?: Delimiter;
  readonly decimal?: 'point' | 'comma';
  readonly layout?: Layout;
  readonly map?: readonly ColumnAnswer[];
  /** Own words of the status column, folded. */
  readonly words?: ReadonlyMap<string, Status>;
  /** Own words for "not known". */
  readonly missing?: readonly string[];
  readonly declare?: Declarations;
  /** Lifts the limits of size and number. */
  readonly large?: boolean;
  /** Saved mappings, to be looked for the one of this list. */
  readonly mappings?: readonly ListMapping[];
  /** The approved part in force with this id, to see whether a changed unit changed the figures; null when there is none. */
  readonly previous?: (id: string) => Part | null;
  /** The generic sets, to propose classes from; with `classWithin` those nearer than that are applied. */
  readonly generic?: readonly Part[];
  readonly classWithin?: number;
  /** Told how many records have been read; called often. */
  readonly progress?: (done: number, total: number) => void;
}

export const DELIMITERS = [',', ';', '\t', '|'] as const;
export type Delimiter = (typeof DELIMITERS)[number];

export { LIMITS } from './limits.js';
