import { decisionBetween, priceInEuro, stabilityOf, type Order, type RankedPart, type Stability } from '../ranking/index.js';
import type { JudgedPart } from '../screening/index.js';
import type { Verdict } from '../verdicts/verdict.js';

/** Why one part stands before another: what decided, and what speaks for each. Numbers only; words come with the presenter. */
export interface WhyAhead {
  readonly first: string;
  readonly second: string;
  /** The step of the order that decided: tier, proof, merit, price, current, estimates, id, or the order asked for. */
  readonly decidedBy: string;
  readonly merits: readonly [number, number];
  readonly prices: readonly [number | null, number | null];
  readonly currents: readonly [number | null, number | null];
  /** Checks with offered values of both, where they differ by more than a tenth. */
  readonly better: readonly Difference[];
  readonly worse: readonly Difference[];
  /** How far a price or the weight of a share would have to move for the order to turn. */
  readonly stability: Stability;
}

/** One check where two parts offer different values; SI. */
export interface Difference {
  readonly check: string;
  readonly title: string;
  readonly first: number;
  readonly second: number;
  readonly unit: string;
}

const NOTABLE = 1.1;
/** Checks whose offered value means something to compare. */
const TOLD = new Set(['slew-rate', 'gain-bandwidth', 'dc-error', 'output-low', 'output-high', 'output-current', 'noise']);

/** Null when fewer than two fit. */
export function whyAhead(fit: readonly RankedPart[], order: Order): WhyAhead | null {
  const [first, second] = fit;
  if (first === undefined || second === undefined) return null;
  return {
    first: first.part.id,
    second: second.part.id,
    decidedBy: decisionBetween(order, [first, second]).by,
    merits: [first.merit.total, second.merit.total],
    prices: [priceInEuro(first), priceInEuro(second)],
    currents: [first.current, second.current],
    ...differencesOf(first, second),
    stability: stabilityOf(order, [first, second]),
  };
}

/** Checks in which the offered values of two parts differ notably, by whom they speak for. */
export function differencesOf(first: JudgedPart, second: JudgedPart): Pick<WhyAhead, 'better' | 'worse'> {
  const differences = first.verdicts.flatMap((verdict) => differenceOf(verdict, second) ?? []);
  const of = (isAhead: boolean): Difference[] => differences.filter(({ ahead }) => ahead === isAhead).map(({ difference }) => difference);
  return { better: of(true), worse: of(false) };
}

function differenceOf(mine: Verdict, second: JudgedPart): { difference: Difference; ahead: boolean } | null {
  const theirs = second.verdicts.find((verdict) => verdict.check === mine.check);
  if (!TOLD.has(mine.check) || typeof mine.offered !== 'number' || typeof theirs?.offered !== 'number' || mine.unit === null) return null;
  const [low, high] = [Math.min(mine.offered, theirs.offered), Math.max(mine.offered, theirs.offered)];
  if (low <= 0 || high / low < NOTABLE) return null;
  const ahead = mine.sense === 'at-least' ? mine.offered > theirs.offered : mine.offered < theirs.offered;
  return { ahead, difference: { check: mine.check, title: mine.title, first: mine.offered, second: theirs.offered, unit: mine.unit } };
}
