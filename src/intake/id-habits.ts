import type { CellFault } from './cell-fault.js';

/** What the ids of a list have in common, and what in one of them a spreadsheet or a slip of the hand has changed. */
export interface IdHabits {
  /** A letter where the other ids have the digit it looks like, or a number that lost its leading zeros; null for an ordinary id. */
  fault(id: string): CellFault | null;
  /** True when most ids of the list are written in the other case. */
  isOtherCase(id: string): boolean;
}

/** Fewer ids than this have no habits. */
const LEAST = 4;
const TWINS: Readonly<Record<string, string>> = { O: '0', o: '0', I: '1', l: '1' };

export function idHabits(ids: readonly string[]): IdHabits {
  const known = ids.filter((id) => id !== '');
  const upper = known.filter((id) => /\p{Lu}/u.test(id) && !/\p{Ll}/u.test(id)).length;
  const digits = digitCounts(known);
  const widths = numberWidths(known);
  return {
    fault: (id) => (known.length < LEAST ? null : (lookAlike(id, digits) ?? lostZeros(id, widths))),
    isOtherCase: (id) => upper * 2 > known.length && /\p{Ll}/u.test(id),
  };
}

/** By length of the id: how many there are, and how many of them have which digit where; `counts[10 · position + digit]`. */
type Digits = ReadonlyMap<number, { all: number; readonly counts: number[] }>;

function digitCounts(ids: readonly string[]): Digits {
  const digits = new Map<number, { all: number; readonly counts: number[] }>();
  for (const id of ids) {
    const known = digits.get(id.length) ?? { all: 0, counts: new Array<number>(10 * id.length).fill(0) };
    digits.set(id.length, known);
    known.all += 1;
    let at = 0;
    for (const character of id) {
      const digit = character.charCodeAt(0) - ZERO;
      if (digit >= 0 && digit <= 9) known.counts[10 * at + digit] = (known.counts[10 * at + digit] ?? 0) + 1;
      at += 1;
    }
  }
  return digits;
}

const ZERO = 0x30;

function lookAlike(id: string, digits: Digits): CellFault | null {
  if (!/[OoIl]/u.test(id)) return null;
  const { all, counts } = digits.get(id.length) ?? { all: 0, counts: [] };
  for (const [at, character] of Array.from(id).entries()) {
    const digit = TWINS[character];
    const others = digit === undefined ? 0 : (counts[10 * at + Number(digit)] ?? 0);
    if (digit === undefined || others < LEAST - 1 || others * 4 < all * 3) continue;
    const fix = id.slice(0, at) + digit + id.slice(at + 1);
    return { code: 'I404', reason: `letter ${character} where ${others} of ${all} ids have the digit ${digit}`, fix };
  }
  return null;
}

/** How many ids that are numbers alone have so many digits. */
function numberWidths(ids: readonly string[]): ReadonlyMap<number, number> {
  const widths = new Map<number, number>();
  for (const id of ids) if (/^\d+$/u.test(id)) widths.set(id.length, (widths.get(id.length) ?? 0) + 1);
  return widths;
}

/** A spreadsheet takes `0012` for the number 12. */
function lostZeros(id: string, widths: ReadonlyMap<number, number>): CellFault | null {
  if (!/^\d+$/u.test(id)) return null;
  const numbers = [...widths.values()].reduce((sum, count) => sum + count, 0);
  const [usual = 0, count = 0] = [...widths].sort((a, b) => b[1] - a[1])[0] ?? [];
  if (id.length >= usual || count < LEAST - 1 || count * 2 <= numbers) return null;
  return { code: 'I408', reason: `${id} has ${id.length} digits where ${count} of ${numbers} ids have ${usual}: a spreadsheet drops leading zeros`, fix: id.padStart(usual, '0') };
}
