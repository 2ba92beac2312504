import type { Dimension } from './dimensions.js';

/** A unit as read from text. `dimension` null: a prefix alone (`k`), which says nothing about what is measured. */
export interface UnitReading {
  readonly dimension: Dimension | null;
  /** Power of ten from this unit to the SI unit of its dimension. */
  readonly exponent: number;
  /** SI spelling: `kΩ`, `nV/√Hz`; for a prefix alone its SI letter. */
  readonly canonical: string;
  /** First prefix as typed: the letter that may be ambiguous. */
  readonly prefix: string;
  readonly wrongCase?: string;
  /** Spellings it may stand for when the letter case alone cannot tell; such a unit is refused. */
  readonly alternatives?: readonly string[];
  readonly refusedPrefix?: true;
  readonly notes: readonly string[];
}

/** A unit with one spelling and power of ten, and nothing to be noted. */
export const fixed = (dimension: Dimension, canonical: string, exponent = 0): UnitReading => ({
  dimension,
  exponent,
  canonical,
  prefix: '',
  notes: [],
});

/** The unit with one more note. */
export const noted = (unit: UnitReading, note: string): UnitReading => ({ ...unit, notes: [...unit.notes, note] });
