import type { LimitWord, Token } from './tokens.js';

/** A signed number with its unit, not yet read. */
export interface Figure {
  readonly sign: '' | '+' | '-';
  readonly number: Token;
  readonly unit: Token | null;
  readonly start: number;
  readonly end: number;
}

export type Body =
  | { readonly shape: 'value'; readonly figures: readonly [Figure] }
  | { readonly shape: 'magnitude'; readonly figures: readonly [Figure] }
  | { readonly shape: 'range'; readonly figures: readonly [Figure, Figure] }
  | { readonly shape: 'list'; readonly figures: readonly Figure[] }
  /** Value, then the tolerance: one figure for ±, two for +a/-b (upper first). */
  | { readonly shape: 'tolerance'; readonly figures: readonly [Figure]; readonly tolerance: readonly Figure[] };

/** One figure, range or tolerance, with the word that says which limit it is. */
export interface Segment {
  readonly limit: LimitWord | null;
  readonly body: Body;
  readonly start: number;
  readonly end: number;
}

export interface Phrase {
  readonly segments: readonly Segment[];
  /** Text in parentheses that repeats the value in other words, as the canonical echo does: `2 Vpp (1 Vpk)`. */
  readonly aside: { readonly text: string; readonly start: number; readonly end: number } | null;
  readonly end: number;
}
