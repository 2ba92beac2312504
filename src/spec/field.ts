import type { FieldKind } from '../quantities/kinds.js';

/** How a field is written: a map of further fields, one of a few words, free text, lists, a quantity, or a level: a word or a quantity. */
export type Shape = 'map' | 'text' | 'choice' | 'choices' | 'texts' | 'paths' | 'quantity' | 'level';

/** What a number must keep to be possible at all, whatever the rest of the stage says. SI units. */
export interface Bounds {
  /** Allowed: above this. */
  readonly above?: number;
  /** Allowed: from this on, inclusive. */
  readonly from?: number;
  /** Allowed: below this. */
  readonly below?: number;
  /** Allowed: up to this, inclusive. */
  readonly to?: number;
  /** Why, as the end of a sentence: `a load of 0 Ω is a short circuit`. */
  readonly why: string;
}

/** One field of the stage file: feeds the reader, its messages and the help. */
export interface FieldRow {
  /** Dotted; `NAME` stands for a name of the user's own choosing. */
  readonly path: string;
  readonly shape: Shape;
  /** Kind of quantity, for `quantity` and `level`. */
  readonly kind?: FieldKind;
  /** Accepted words, for `choice`, `choices` and `level`. */
  readonly words?: readonly string[];
  readonly bounds?: Bounds;
  /** A wording such as `max 5 mV` is accepted when it bounds this side. */
  readonly limit?: 'min' | 'max';
  readonly accepted: string;
  readonly example: string;
  readonly meaning: string;
  /** The command-line option of its own, when it has one. */
  readonly option?: string;
}
