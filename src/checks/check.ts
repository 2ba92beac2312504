import type { Demands } from '../demands/index.js';
import type { Parameter } from '../parts/figures.js';
import type { Identity, Readings } from '../parts/readings.js';
import type { Finding } from '../verdicts/finding.js';
import type { InNumbers, Row } from './in-numbers.js';

/**
 * The contract of a check. It says what the stage asks, reads figures that are already resolved into one outlook, and hands
 * back numbers side by side. It never says pass or fail, and never knows which outlook it is judging.
 */
export interface Check<Asked> {
  /** File name and id. */
  readonly id: string;
  /** The trade's term, as a line of text begins with it. */
  readonly title: string;
  readonly unit: string | null;
  /** Figures whose values decide it: a finding depends on nothing else of the part. */
  readonly reads: readonly (Parameter | keyof Identity)[];
  readonly hasMargin: boolean;
  /** What the stage asks; null: nothing. */
  asks(demands: Demands): Asked | null;
  /** Null when the check does not apply to this part (generic sets have no status). */
  judge(asked: Asked, readings: Readings): Finding | null;
}

/** What was worked out for each term, asked for when needed. */
export type Known<Found> = { readonly [Name in keyof Found]: () => Found[Name] };

/** What is asked but for the limit and the words about it. */
export type Unlimited<Asked> = Omit<Asked, 'required' | 'because'>;

type Told = Pick<Readings, 'brief'>;

/**
 * A check put together from terms. Each term looks at figures of its own, so it is worked out once for all parts that have these figures;
 * the whole is made of the terms, and the finding of the whole, and of nothing else. Neither terms nor whole know the limit: a changed
 * limit leaves them as they are.
 */
export interface ComposedCheck<Asked, Found, Whole> extends Omit<Check<Asked>, 'judge'> {
  readonly terms: { readonly [Name in keyof Found]: (asked: Unlimited<Asked>, readings: Readings) => Found[Name] };
  readonly whole: (asked: Unlimited<Asked>, known: Known<Found>, told: Told) => Whole;
  readonly finding: (asked: Asked, whole: Whole, told: Told) => Finding | null;
  /** Where the decision is a matter of numbers alone: `whole` is made of the same ones. */
  readonly inNumbers?: InNumbers<Asked, Found>;
}

/** The same as a check: its judge works out every term the whole asks for. */
export function composed<Asked extends object, Found, Whole>(check: ComposedCheck<Asked, Found, Whole>): ComposedCheck<Asked, Found, Whole> & Check<Asked> {
  return { ...check, judge: (asked, readings) => check.finding(asked, check.whole(asked, knownOf(check.terms, { asked, readings }), readings), readings) };
}

/** Terms of one part, each worked out when it is asked for. */
export function knownOf<Asked extends object, Found>(terms: ComposedCheck<Asked, Found, unknown>['terms'], { asked, readings }: { readonly asked: Asked; readonly readings: Readings }): Known<Found> {
  const names = Object.keys(terms) as (keyof Found)[];
  return Object.fromEntries(names.map((name) => [name, () => terms[name](asked, readings)])) as Known<Found>;
}

/** Terms, whole and finding of a check put together from terms, with its question bound inside. */
export interface AnyComposition {
  readonly names: readonly string[];
  term(name: string, demands: Demands, readings: Readings): unknown;
  readonly whole: (demands: Demands, known: Known<Readonly<Record<string, unknown>>>, told: Told) => unknown;
  finding(demands: Demands, whole: unknown, told: Told): Finding | null;
  /** For one stage; null: it has no such form, or is not asked. */
  inNumbers(demands: Demands): AnyNumbers | null;
}

/** A check in numbers with its question bound inside: terms in the order of `names`. */
export interface AnyNumbers {
  readonly terms: readonly { readonly width: number; readonly write: (one: unknown, to: { readonly row: Row; readonly at: number }) => void }[];
  readonly finding: (row: Row) => Finding | null;
  readonly stands: (row: Row) => number;
}

/** A check with its question bound inside, so that all checks have one type. */
export interface AnyCheck {
  readonly id: string;
  readonly title: string;
  readonly unit: string | null;
  readonly reads: readonly string[];
  readonly hasMargin: boolean;
  isAsked(demands: Demands): boolean;
  /** What the stage asks, to be held against what another stage asks; null: nothing. */
  asked(demands: Demands): unknown;
  judge(demands: Demands, readings: Readings): Finding | null;
  /** Null: its judge is one piece. */
  readonly composition: AnyComposition | null;
}

export function seal<Asked extends object>(check: Check<Asked>): AnyCheck {
  const { id, title, unit, reads, hasMargin } = check;
  return {
    id, title, unit, reads, hasMargin,
    composition: 'terms' in check ? compositionOf(check as unknown as ComposedCheck<Asked, Readonly<Record<string, unknown>>, unknown>) : null,
    isAsked: (demands) => check.asks(demands) !== null,
    asked: (demands) => check.asks(demands),
    judge: (demands, readings) => {
      const asked = check.asks(demands);
      return asked === null ? null : check.judge(asked, readings);
    },
  };
}

function compositionOf<Asked extends object>({ terms, asks, whole, finding, inNumbers }: ComposedCheck<Asked, Readonly<Record<string, unknown>>, unknown>): AnyComposition {
  const of = <Made>(demands: Demands, make: (asked: Asked) => Made): Made | null => {
    const asked = asks(demands);
    return asked === null ? null : make(asked);
  };
  return {
    names: Object.keys(terms),
    term: (name, demands, readings) => of(demands, (asked) => terms[name]?.(asked, readings)),
    whole: (demands, known, told) => of(demands, (asked) => whole(asked, known, told)),
    finding: (demands, found, told) => of(demands, (asked) => finding(asked, found, told)),
    inNumbers: (demands) => of(demands, (asked) => (inNumbers === undefined ? null : numbersFor(inNumbers, Object.keys(terms), asked))),
  };
}

function numbersFor<Asked>({ terms, finding, stands }: InNumbers<Asked, Readonly<Record<string, unknown>>>, names: readonly string[], asked: Asked): AnyNumbers {
  if (Object.keys(terms).join() !== names.join()) throw new RangeError(`numbers of ${Object.keys(terms).join()} for the terms ${names.join()}`);
  return {
    terms: Object.values(terms).map(({ width, write }) => ({ width, write: (one, to) => write(asked, one, to) })),
    finding: (row) => finding(asked, row),
    stands: (row) => stands(asked, row),
  };
}
