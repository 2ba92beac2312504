import type Database from 'better-sqlite3';
import { TRAITS, type Trait } from '../parts/traits.js';
import type { Cell } from './part-row.js';
import { TRAIT_COLUMNS } from './trait-columns.js';

/** Parts in one segment: its codes are read, and its sums kept, in one go. */
export const SEGMENT = 1 << 16;
/** Changes when the tables of the dictionary mean something else; one of another form is made anew. */
export const FORM = 3;
/** Between the pieces of a trait, each written as JSON, which has no line ends of its own. */
export const BETWEEN_PIECES = '\n';
/** The trait under which the keys of the rows are kept, in the order of the parts. */
export const KEYS = 'row key';

/** Takes parts apart as they come, in the order of the catalog; a segment is written when it is full, so that memory stays bounded. */
export interface Encoder {
  /** `row` as `partToRow` makes it. */
  readonly add: (key: number, row: readonly Cell[]) => void;
  /** Writes what is left, and declares the dictionary to hold. */
  readonly finish: () => void;
}

interface Coding {
  readonly trait: Trait;
  readonly columns: readonly number[];
  /** Code by the cell, or by several as text. */
  readonly known: Map<Cell, number>;
  /** The cells of each as JSON, as they are written: a long list has hundreds of thousands. */
  readonly pieces: string[];
  readonly codes: Uint32Array;
}

/** To be used inside a transaction, for `expected` parts. Replaces what was there. */
export function encoder(database: Database.Database, expected: number): Encoder {
  for (const table of ['dictionary', 'dictionary_trait', 'dictionary_segment']) database.prepare(`delete from ${table}`).run();
  const room = Math.min(SEGMENT, expected);
  const codings = TRAITS.map((trait) => codingOf(trait, room));
  const keys = new Uint32Array(room);
  const insert = database.prepare('insert into dictionary_segment (trait, segment, width, codes) values (?, ?, ?, ?)');
  let parts = 0;
  const flush = (): void => {
    const count = parts % SEGMENT === 0 ? Math.min(parts, SEGMENT) : parts % SEGMENT;
    if (count === 0) return;
    const segment = Math.ceil(parts / SEGMENT) - 1;
    insert.run(KEYS, segment, 4, bytesOf(keys.slice(0, count), 4));
    for (const { trait, pieces, codes } of codings) {
      const width = pieces.length <= 256 ? 1 : pieces.length <= 65_536 ? 2 : 4;
      insert.run(trait, segment, width, bytesOf(codes.slice(0, count), width));
    }
  };
  return {
    add(key, row) {
      const at = parts % SEGMENT;
      keys[at] = key;
      for (const coding of codings) coding.codes[at] = codeOf(coding, row);
      parts += 1;
      if (parts % SEGMENT === 0) flush();
    },
    finish() {
      if (parts % SEGMENT !== 0) flush();
      const insertTrait = database.prepare('insert into dictionary_trait (trait, pieces) values (?, ?)');
      for (const { trait, pieces } of codings) insertTrait.run(trait, pieces.join(BETWEEN_PIECES));
      database.prepare('insert into dictionary (only, generation, form, parts, segment) select 1, generation, ?, ?, ? from part_generation').run(FORM, parts, SEGMENT);
    },
  };
}

function codingOf(trait: Trait, room: number): Coding {
  return { trait, columns: TRAIT_COLUMNS.get(trait) ?? [], known: new Map(), pieces: [], codes: new Uint32Array(room) };
}

function codeOf({ columns, known, pieces }: Coding, row: readonly Cell[]): number {
  const key = keyOf(columns, row);
  const code = known.get(key);
  if (code !== undefined) return code;
  known.set(key, pieces.length);
  return pieces.push(JSON.stringify(columns.map((column) => row[column] ?? null))) - 1;
}

/** One cell that is filled alone, as it mostly is, is told by its place and value without making a text of all of them. */
function keyOf(columns: readonly number[], row: readonly Cell[]): Cell {
  const [first = 0] = columns;
  if (columns.length === 1) return row[first] ?? null;
  const last = columns.at(-1) ?? first;
  let filled = 0;
  for (const column of columns) if ((row[column] ?? null) !== null) filled += 1;
  if (filled === 0) return null;
  const [alone, points] = [row[first] ?? null, row[last] ?? null];
  // Points are a text in brackets, which no text made of several cells begins with.
  if (filled === 1 && (typeof alone === 'number' || typeof points === 'string')) return alone ?? points;
  let key = '';
  // Without escaping where nothing stands behind: the points, which are long.
  for (const column of columns) key += column === last ? String(row[column] ?? '') : `${JSON.stringify(row[column] ?? null)}|`;
  return key;
}

/** Little-endian, whatever the machine. */
function bytesOf(codes: Uint32Array, width: number): Buffer {
  const bytes = Buffer.alloc(codes.length * width);
  const view = new DataView(bytes.buffer, bytes.byteOffset);
  for (let at = 0; at < codes.length; at += 1) {
    const code = codes[at] ?? 0;
    if (width === 1) view.setUint8(at, code);
    else if (width === 2) view.setUint16(at * 2, code, true);
    else view.setUint32(at * 4, code, true);
  }
  return bytes;
}
