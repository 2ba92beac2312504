import type { Basis } from './basis.js';
import type { LimitKind, Parameter } from './figures.js';
import type { Part } from './part.js';

/** How much trust the figures are read with: both are always tried. */
export type Outlook = 'pessimistic' | 'optimistic';

/** What the stage's surroundings do to a figure: temperature ends in °C, nominal supply in V. */
export interface Operating {
  readonly coldest: number;
  readonly hottest: number;
  readonly nominalSupply: number;
}

/** One figure as it counts in one outlook. Values may be infinite: "as good as can be". */
export interface Reading {
  readonly value: number;
  /** As the list has it, before any factor; null when nothing was printed. */
  readonly printed: number | null;
  readonly kind: LimitKind | null;
  readonly basis: Basis;
  /** Slot of the figure, for joining its origin; null for an assumed or borrowed value. */
  readonly slot: string | null;
  /** How the value was made from the printed one: `typical × 3`, `25 °C limit × 1.3`; null when it is the printed one. */
  readonly how: string | null;
}

/** Worst figures of a class over its generic sets, to borrow from. */
export type ClassWorst = Readonly<Partial<Record<Parameter, number>>>;

/** Everything a reading needs to know beside the part. */
export interface ReadingRules {
  readonly operating: Operating;
  /** Typical and assumed figures count as missing, and nothing is borrowed. */
  readonly strict: boolean;
  /** Null when the part belongs to no known class. */
  readonly classWorst: ClassWorst | null;
}

export interface PartUnderTest extends ReadingRules {
  readonly part: Part;
  readonly outlook: Outlook;
  /** Told of every parameter before its figures are read: a part may have them only then. */
  readonly look?: (parameter: Parameter) => void;
  /** Only the verdict is wanted: what is told beside it may be left out. */
  readonly brief?: true;
}
