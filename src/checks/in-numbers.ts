import type { NumberDemand } from '../demands/index.js';
import { weaknessOf, type Basis } from '../parts/basis.js';
import { meets } from '../verdicts/compare.js';
import type { BoundFinding, NumberFinding } from '../verdicts/finding.js';
import { standingOfNumbers } from '../verdicts/standing.js';
import type { Known, Unlimited } from './check.js';

/** What the terms of one part are in numbers, term after term in their order. */
export type Row = Float64Array;

/** A term in numbers: always as many of them. */
export interface NumbersOf<Asked, One> {
  readonly width: number;
  /** Writes them to the row from `at` on. */
  readonly write: (asked: Unlimited<Asked>, one: One, to: { readonly row: Row; readonly at: number }) => void;
}

/**
 * The numbers of a check put together from terms. Its `whole` is worked out from them too; by themselves they decide about one part after
 * the other without touching anything but numbers that lie side by side.
 */
export interface InNumbers<Asked, Found> {
  readonly terms: { readonly [Name in keyof Found]: NumbersOf<Asked, Found[Name]> };
  /** Null: this part cannot be told from numbers alone. */
  readonly finding: (asked: Asked, row: Row) => NumberFinding | BoundFinding | null;
  /** How that finding stands against the limit, without making it: there is one for every part, and only of a few more is asked. One of `STANDS`. */
  readonly stands: (asked: Asked, row: Row) => number;
}

/** How one reading stands, as a number: what passes has the weakness of its basis added. */
export const STANDS = { untold: -1, fails: 0, open: 1, passes: 2 } as const;

/** A number against its limit; `borrowed`: how much of it is. */
export function numbersStand({ required, sense }: NumberDemand, of: { readonly offered: number; readonly borrowed: number; readonly weakness: number }): number {
  const standing = standingOfNumbers({ required, sense, offered: of.offered, borrowed: of.borrowed });
  return standing === 'fail' ? STANDS.fails : standing === 'open' ? STANDS.open : STANDS.passes + of.weakness;
}

/** A bound against its limit. */
export function boundStands({ required, sense }: NumberDemand, known: number): number {
  return meets(required, known, sense) ? STANDS.open : STANDS.fails;
}

/** A number of a row; not a number: not known. */
export const numberAt = (row: Row, place: number): number => row[place] ?? NaN;

/** A reading, or anything with a value and a basis, as two numbers: the value (not a number: none), and how weak its basis is. */
export function writeReading(one: { readonly value: number; readonly basis: Basis } | null, { row, at }: { readonly row: Row; readonly at: number }): void {
  row[at] = one?.value ?? NaN;
  row[at + 1] = weaknessOf(one?.basis ?? 'guaranteed');
}

/** The row of one part whose terms are at hand. */
export function rowOf<Asked, Found>({ terms }: InNumbers<Asked, Found>, asked: Unlimited<Asked>, known: Known<Found>): Row {
  const names = Object.keys(terms) as (keyof Found)[];
  const row = new Float64Array(names.reduce((sum, name) => sum + terms[name].width, 0));
  let at = 0;
  for (const name of names) {
    terms[name].write(asked, known[name](), { row, at });
    at += terms[name].width;
  }
  return row;
}
