import type { Basis } from '../parts/basis.js';
import type { BoundFinding, Missing, NumberFinding, Sense } from './finding.js';

type Limit = Pick<NumberFinding, 'required' | 'unit' | 'sense'>;
type Amount = Required<Pick<NumberFinding, 'offered' | 'borrowed'>>;

// Classes, not literals: a survey makes millions of them, and the engine then knows one form of each (measured: a shortlist of a million parts takes a quarter less).

/** Nothing but the numbers that decide. */
export class BriefNumbers implements NumberFinding {
  readonly kind = 'numbers';
  readonly required: number;
  readonly unit: string;
  readonly sense: Sense;
  readonly basis: Basis;
  readonly offered: number;
  readonly borrowed: number;

  constructor({ required, unit, sense }: Limit, basis: Basis, { offered, borrowed }: Amount) {
    this.required = required;
    this.unit = unit;
    this.sense = sense;
    this.basis = basis;
    this.offered = offered;
    this.borrowed = borrowed;
  }
}

const NONE: readonly Missing[] = [];

/** The same of a bound for want of a figure. */
export class BriefBound implements BoundFinding {
  readonly kind = 'bound';
  readonly missing = NONE;
  readonly cause = 'missing-figure';
  readonly required: number;
  readonly unit: string;
  readonly sense: Sense;
  readonly basis: Basis;
  readonly known: number;

  constructor({ required, unit, sense }: Limit, basis: Basis, known: number) {
    this.required = required;
    this.unit = unit;
    this.sense = sense;
    this.basis = basis;
    this.known = known;
  }
}
