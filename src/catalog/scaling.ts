import type { Condition, LimitKind, Parameter } from '../parts/figures.js';
import { figureSlot } from '../parts/figures.js';
import type { Part } from '../parts/part.js';

/** What a column says: a figure under its condition, or the price. */
export type ColumnSubject =
  | { readonly kind: 'figure'; readonly parameter: Parameter; readonly limit: LimitKind; readonly condition: Condition }
  | { readonly kind: 'price' };

/** A column whose figures are a power of ten times those of the last import. */
export interface ScaledColumn {
  readonly subject: ColumnSubject;
  /** New to old as a power of ten; never 0. */
  readonly power: number;
  /** Parts in both lists with a figure there that is not zero, and how many of them moved by this power. */
  readonly known: number;
  readonly scaled: number;
}

/** Watches the figures of parts that are in both lists, one pair of versions after the other. */
export interface ScalingWatch {
  see(before: Part, after: Part): void;
  /** The columns that moved as a whole, in canonical order of the first part that has them. */
  found(): ScaledColumn[];
}

/** Of the known parts of a column, so many must have moved by one power; a real change of a figure or two may be among them. */
const MOST = 0.9;
/** One part alone may have been corrected. */
const LEAST = 2;

export function watchScaling(): ScalingWatch {
  const columns = new Map<string, Tally>();
  return {
    see(before, after) {
      const old = new Map(valuesOf(before).map(({ slot, value }) => [slot, value]));
      for (const { slot, subject, value } of valuesOf(after)) count(columns, { slot, subject, was: old.get(slot), now: value });
    },
    found: () => [...columns.values()].flatMap(scaledOf),
  };
}

interface Tally {
  readonly subject: ColumnSubject;
  known: number;
  readonly powers: Map<number, number>;
}

interface Seen {
  readonly slot: string;
  readonly subject: ColumnSubject;
  readonly was: number | undefined;
  readonly now: number;
}

function count(columns: Map<string, Tally>, { slot, subject, was, now }: Seen): void {
  if (was === undefined || was === 0 || now === 0) return;
  const tally = columns.get(slot) ?? { subject, known: 0, powers: new Map<number, number>() };
  columns.set(slot, tally);
  tally.known += 1;
  const power = powerOfTen(now / was);
  if (power !== null && power !== 0) tally.powers.set(power, (tally.powers.get(power) ?? 0) + 1);
}

function scaledOf({ subject, known, powers }: Tally): ScaledColumn[] {
  const [most] = [...powers].sort((a, b) => b[1] - a[1]);
  if (most === undefined || most[1] < LEAST || most[1] < MOST * known) return [];
  return [{ subject, power: most[0], known, scaled: most[1] }];
}

/** The exponent of a ratio that is a power of ten, to within the rounding of two conversions; else null. */
function powerOfTen(ratio: number): number | null {
  if (!(ratio > 0)) return null;
  const power = Math.round(Math.log10(ratio));
  return Math.abs(ratio / 10 ** power - 1) <= 1e-9 ? power : null;
}

interface SlotValue {
  readonly slot: string;
  readonly subject: ColumnSubject;
  readonly value: number;
}

function valuesOf({ figures, price }: Part): SlotValue[] {
  const values = figures.map(({ parameter, kind, condition, value }): SlotValue => ({
    slot: figureSlot({ parameter, kind, condition }),
    subject: { kind: 'figure', parameter, limit: kind, condition },
    value,
  }));
  // Prices of another currency or quantity are another column.
  return price === null ? values : [...values, { slot: `price ${price.currency} ${price.quantity ?? ''}`, subject: { kind: 'price' }, value: price.amount }];
}
