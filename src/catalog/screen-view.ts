import type Database from 'better-sqlite3';
import { pieceAt, type ScreenView } from '../parts/screen-view.js';
import type { Piece, Trait } from '../parts/traits.js';
import { BETWEEN_PIECES, KEYS, SEGMENT } from './encoder.js';
import { PART_COLUMNS } from './part-columns.js';
import { rowToPart, type Cell } from './part-row.js';
import { pieceFrom } from './trait-columns.js';

/** The approved list as its dictionary has it. The dictionary must be fresh, and stay so while the view is used. */
export function storedView(database: Database.Database, size: number): ScreenView {
  // As bytes: the engine makes a text of them in a fraction of the time the driver does.
  const pieces = database.prepare<[string], Buffer>('select cast(pieces as blob) from dictionary_trait where trait = ?').pluck();
  const codes = database.prepare<[string, number], [number, Buffer]>('select width, codes from dictionary_segment where trait = ? and segment = ?').raw();
  const row = database.prepare<[number], Cell[]>(`select ${PART_COLUMNS.join(', ')} from part where key = ?`).raw();
  const id = database.prepare<[number], string>('select id from part where key = ?').pluck();
  const ids = new Map<number, string>();
  const known = new Map<Trait, StoredPieces>();
  const stored = (trait: Trait): StoredPieces => {
    const found = known.get(trait) ?? { texts: (pieces.get(trait)?.toString('utf8') ?? '').split(BETWEEN_PIECES), made: [] };
    known.set(trait, found);
    return found;
  };
  const read = (trait: string, segment: number): [number, Buffer] => {
    const found = codes.get(trait, segment);
    if (found === undefined) throw new RangeError(`the dictionary has no segment ${segment} of ${trait}`);
    return found;
  };
  const keysOf = onceEach((segment) => read(KEYS, segment)[1]);
  const inRow = <Found>(query: Database.Statement<[number], Found>, position: number): Found => {
    const key = keysOf(Math.floor(position / SEGMENT)).readUInt32LE((position % SEGMENT) * 4);
    const found = query.get(key);
    if (found === undefined) throw new RangeError(`no row ${key} in the part table`);
    return found;
  };
  return {
    tier: 'approved',
    size,
    segment: SEGMENT,
    width: (trait) => stored(trait).texts.length,
    piece: (trait, code) => pieceOf(trait, stored(trait), code),
    codes(trait, segment, into) {
      const [width, bytes] = read(trait, segment);
      spread(bytes, width, into);
    },
    id(position) {
      const found = ids.get(position) ?? inRow(id, position);
      ids.set(position, found);
      return found;
    },
    part: (position) => rowToPart(inRow(row, position)),
  };
}

function onceEach(make: (segment: number) => Buffer): (segment: number) => Buffer {
  const made = new Map<number, Buffer>();
  return (segment) => {
    const found = made.get(segment) ?? make(segment);
    made.set(segment, found);
    return found;
  };
}

interface StoredPieces {
  /** The cells of each as JSON. */
  readonly texts: readonly string[];
  /** Made of their cells when they are first looked at: of a long list few are. */
  readonly made: (Piece | undefined)[];
}

function pieceOf(trait: Trait, { texts, made }: StoredPieces, code: number): Piece {
  const piece = made[code] ?? pieceFrom(trait, JSON.parse(pieceAt(texts, code)) as Cell[]);
  made[code] = piece;
  return piece;
}

/** Little-endian codes of 1, 2 or 4 bytes as numbers. */
function spread(bytes: Buffer, width: number, into: Int32Array): void {
  if (width === 1) return into.set(bytes);
  const own = bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength);
  if (LITTLE_ENDIAN) return into.set(width === 2 ? new Uint16Array(own) : new Uint32Array(own));
  for (let at = 0; at * width < bytes.length; at += 1) into[at] = bytes.readUIntLE(at * width, width);
}

const LITTLE_ENDIAN = new Uint8Array(new Uint16Array([1]).buffer)[0] === 1;
