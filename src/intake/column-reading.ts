import type { Condition, LimitKind, Parameter } from '../parts/figures.js';
import type { FieldKind } from '../quantities/kinds.js';
import type { IdentityField, Statement } from './header-words.js';
import type { RailSense, Special } from './terms.js';

export type Target = Parameter | Special;

/** A column of an ordinary list: its cells may hold one figure, several, or a range. */
export interface MeasuredReading {
  readonly kind: 'measured';
  readonly target: Target;
  /** Stated by the header; null when only the cells can say. */
  readonly limit: LimitKind | null;
  /** What two figures in one cell mean, where the header says it. */
  readonly order: readonly LimitKind[] | null;
  readonly unit: string | null;
  readonly condition: Condition;
  readonly perPackage: boolean;
}

/** One of the meanings a column may have, and the header that says it. */
export interface ColumnChoice {
  readonly words: string;
  readonly header: string;
}

export type ColumnReading =
  | { readonly kind: 'identity'; readonly field: IdentityField }
  | {
      readonly kind: 'figure';
      readonly parameter: Parameter;
      readonly limit: LimitKind;
      /** As written in the header; null when each cell must bring its own. */
      readonly unit: string | null;
      readonly condition: Condition;
    }
  | { readonly kind: 'price'; readonly currency: string | null; readonly quantity: number | null }
  | { readonly kind: 'statement'; readonly statement: Statement }
  | MeasuredReading
  /** Inputs or outputs to the rails in words. */
  | { readonly kind: 'rail'; readonly sense: RailSense }
  /** The load the swings of the row were measured at. */
  | { readonly kind: 'load'; readonly unit: string | null }
  /** A column lists have and no check reads: kept in the raw record; read where it has a kind, so that a slip is told. */
  | { readonly kind: 'known'; readonly field: FieldKind | null; readonly unit: string | null }
  /** Two readings: the list is refused until one is chosen. */
  | { readonly kind: 'question'; readonly words: string; readonly choices: readonly ColumnChoice[] }
  /** Not a column railfit knows: kept in the raw record. */
  | { readonly kind: 'text'; readonly suggestion?: string };

export type HeaderReading = ColumnReading | { readonly kind: 'problem'; readonly reason: string; readonly fix?: string };
