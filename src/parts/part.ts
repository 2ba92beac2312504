import type { Condition, Figure, LimitKind } from './figures.js';
import type { ScreenView } from './screen-view.js';

export type Tier = 'approved' | 'generic';
export const STATUSES = ['approved', 'conditional', 'restricted', 'not-approved'] as const;
export type Status = (typeof STATUSES)[number];
export const LIFECYCLES = ['preliminary', 'active', 'nrnd', 'last-time-buy', 'obsolete'] as const;
export type Lifecycle = (typeof LIFECYCLES)[number];
export type InputType = 'fet' | 'bipolar';

export interface Price {
  readonly amount: number;
  /** ISO 4217. */
  readonly currency: string;
  readonly quantity: number | null;
}

/** What is known about one amplifier. `null` is "not known", never a default. */
export interface Part {
  readonly id: string;
  readonly tier: Tier;
  readonly description: string | null;
  readonly status: Status | null;
  readonly lifecycle: Lifecycle | null;
  readonly package: string | null;
  readonly channels: number | null;
  /** As written: `none`, `AEC-Q100 grade 1`, … */
  readonly qualification: string | null;
  /** Id of the generic class the part belongs to; allows borrowing. */
  readonly class: string | null;
  readonly family: string | null;
  readonly price: Price | null;
  readonly phaseReversal: boolean | null;
  readonly inputClamp: boolean | null;
  readonly inputType: InputType | null;
  /** True when the offset makes no step over the whole input range: one pair, or a hand-over that is chopped or pumped away. */
  readonly crossoverFree: boolean | null;
  /** In canonical column order, then condition; at most one per slot (`figureSlot`). */
  readonly figures: readonly Figure[];
}

/** Where a figure came from. */
export type Origin =
  | {
      readonly kind: 'cell';
      readonly file: string;
      readonly sha256: string;
      /** Physical line where the record starts, and the record number with the header as row 1. */
      readonly line: number;
      readonly row: number;
      /** Column number from 1, and its spreadsheet letter. */
      readonly column: number;
      readonly columnLetter: string;
      readonly header: string;
      /** The cell as written. */
      readonly cell: string;
    }
  | { readonly kind: 'generic'; readonly id: string; readonly header: string; readonly cell: string }
  | { readonly kind: 'class'; readonly class: string }
  | { readonly kind: 'assumption'; readonly text: string };

/** A cell of the team's list where a figure of one part stands, or would stand. */
export interface ListCell {
  readonly file: string;
  readonly line: number;
  readonly row: number;
  readonly column: number;
  readonly columnLetter: string;
  readonly header: string;
  /** As written. */
  readonly cell: string;
  /** Nothing is written there, or a word for nothing. */
  readonly empty: boolean;
  /** Null where the header does not say it: the cell does. Always null for identity columns. */
  readonly kind: LimitKind | null;
  readonly condition: Condition;
}

/** What the engine asks of whoever keeps the parts. Pure: the engine never knows there is a database. */
export interface PartSource {
  readonly parts: readonly Part[];
  /** Hash over everything in the catalog that can change an answer. */
  readonly sha256: string;
  /** Origin of the figure in a slot (`figureSlot`) of a part; null when not kept. */
  origin(partId: string, slot: string): Origin | null;
  /** The cells of a part whose columns hold this parameter or identity field, in column order; absent where no list is kept. */
  cells?(partId: string, figure: string): readonly ListCell[];
  /** The same parts as views, approved before generic, and the generic ones whole. Absent: the parts are judged one by one. */
  readonly screening?: Screening;
}

/** Views of all parts of a source. */
export interface Screening {
  readonly views: readonly ScreenView[];
  readonly generic: readonly Part[];
  /** The first part of the source with this id, without reading the others. */
  find(id: string): Part | null;
}
