import type { Part, Tier } from './part.js';
import { pieceOf, TRAITS, type Piece, type Trait } from './traits.js';

/**
 * The parts of one tier, by id, taken apart: for each trait its distinct pieces, and one code a part. Datasheet values are rounded, so
 * the pieces are few, and what is decided of one combination of pieces holds for every part that has it.
 */
export interface ScreenView {
  readonly tier: Tier;
  readonly size: number;
  /** Codes come in segments of this many parts; the last may be shorter. */
  readonly segment: number;
  /** How many distinct pieces of a trait there are; codes are below it. */
  width(trait: Trait): number;
  piece(trait: Trait, code: number): Piece;
  /** Codes of one segment, written to the start of `into`. */
  codes(trait: Trait, segment: number, into: Int32Array): void;
  /** The id of the part at a position. */
  id(position: number): string;
  /** The whole part at a position. */
  part(position: number): Part;
}

/** The views of parts that are in memory, in any order: approved before generic, each by id. */
export function viewsOf(parts: readonly Part[]): ScreenView[] {
  const byId = [...parts].sort((a, b) => (a.id < b.id ? -1 : Number(a.id > b.id)));
  return (['approved', 'generic'] as const).map((tier) => viewOf(tier, byId.filter((part) => part.tier === tier)));
}

/** A view of parts that are in memory; they must be of one tier and ordered by id. */
export function viewOf(tier: Tier, parts: readonly Part[]): ScreenView {
  const coded = new Map<Trait, Coded>();
  const codedOf = (trait: Trait): Coded => {
    const known = coded.get(trait) ?? encode(parts, trait);
    coded.set(trait, known);
    return known;
  };
  return {
    tier,
    size: parts.length,
    segment: Math.max(1, parts.length),
    width: (trait) => codedOf(trait).pieces.length,
    piece: (trait, code) => pieceAt(codedOf(trait).pieces, code),
    codes: (trait, _segment, into) => {
      into.set(codedOf(trait).codes);
    },
    id: (position) => partAt(parts, position).id,
    part: (position) => partAt(parts, position),
  };
}

function partAt(parts: readonly Part[], position: number): Part {
  const part = parts[position];
  if (part === undefined) throw new RangeError(`no part at ${position} of ${parts.length}`);
  return part;
}

/** The piece with this code. */
export function pieceAt<One>(pieces: readonly One[], code: number): One {
  const piece = pieces[code];
  if (piece === undefined) throw new RangeError(`no piece ${code} of ${pieces.length}`);
  return piece;
}

interface Coded {
  readonly pieces: readonly Piece[];
  readonly codes: Int32Array;
}

function encode(parts: readonly Part[], trait: Trait): Coded {
  const known = new Map<string, number>();
  const pieces: Piece[] = [];
  const codes = Int32Array.from(parts, (part) => {
    const piece = pieceOf(part, trait);
    const key = JSON.stringify(piece);
    const code = known.get(key);
    if (code !== undefined) return code;
    known.set(key, pieces.length);
    return pieces.push(piece) - 1;
  });
  return { pieces, codes };
}

/** Places of the traits in `TRAITS`. */
export const TRAIT_NUMBER: ReadonlyMap<Trait, number> = new Map(TRAITS.map((trait, number) => [trait, number]));
