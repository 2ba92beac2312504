import { decisionBetween, dominatorsOf, meritOf, stabilityOf, type Merit, type Order, type Stability } from '../ranking/index.js';
import type { JudgedPart } from '../screening/index.js';
import type { Outcome, Verdict } from '../verdicts/verdict.js';
import { differencesOf, type Difference } from './why-ahead.js';

/** One of two parts that are held against each other. */
export interface ComparedPart {
  readonly judged: JudgedPart;
  /** Place among what fits. */
  readonly rank: number | null;
  /** What fits has a merit. */
  readonly merit: Merit | null;
}

/** One check of both; null: it does not apply to that part. */
export interface ComparedCheck {
  readonly check: string;
  readonly title: string;
  readonly verdicts: readonly [Verdict | null, Verdict | null];
  /** Which of the two stands better in it; null: neither. */
  readonly better: 0 | 1 | null;
}

/** How two parts stand to each other. */
export interface Standing {
  /** Which is ahead; null where neither has a place. */
  readonly ahead: 0 | 1 | null;
  /** `outcome`, or the step of the order; null with `ahead`. */
  readonly decidedBy: string | null;
  readonly checks: readonly ComparedCheck[];
  /** Notable differences, by the part they speak for. */
  readonly speaksFor: readonly [readonly Difference[], readonly Difference[]];
  /** Both fit: how firmly the one ahead stands there. */
  readonly stability: Stability | null;
  /** Both fit: the part that is nowhere better than the other in what the order counts. */
  readonly dominated: 0 | 1 | null;
}

/** Holds two judged parts of one stage against each other. */
export function compareParts(order: Order, [one, other]: readonly [JudgedPart, JudgedPart]): Standing {
  const { better, worse } = differencesOf(one, other);
  const place = placesOf(order, [one, other]);
  const pair = place.ahead === 1 ? ([other, one] as const) : ([one, other] as const);
  const bothFit = one.outcome === 'fits' && other.outcome === 'fits';
  return {
    ...place,
    checks: checksOf(one, other),
    speaksFor: [better, worse],
    stability: bothFit ? stabilityOf(order, pair) : null,
    dominated: bothFit ? dominatedOf([one, other]) : null,
  };
}

/** The merit of what fits. */
export const comparedPart = (judged: JudgedPart, rank: number | null): ComparedPart => ({ judged, rank, merit: judged.outcome === 'fits' ? meritOf(judged) : null });

const STANDINGS = ['fits', 'undecided', 'does-not-fit'] as const;

function placesOf(order: Order, pair: readonly [JudgedPart, JudgedPart]): Pick<Standing, 'ahead' | 'decidedBy'> {
  const [one, other] = pair.map(({ outcome }) => STANDINGS.indexOf(outcome)) as [number, number];
  if (one !== other) return { ahead: one < other ? 0 : 1, decidedBy: 'outcome' };
  // Only what fits has an order.
  if (one !== 0) return { ahead: null, decidedBy: null };
  const { by, sign } = decisionBetween(order, pair);
  return { ahead: sign < 0 ? 0 : 1, decidedBy: by };
}

function dominatedOf(pair: readonly [JudgedPart, JudgedPart]): 0 | 1 | null {
  const at = dominatorsOf(pair).findIndex((dominator) => dominator !== null);
  return at === 0 || at === 1 ? at : null;
}

function checksOf(one: JudgedPart, other: JudgedPart): ComparedCheck[] {
  const checks = [...new Set([...one.verdicts, ...other.verdicts].map(({ check }) => check))];
  const of = ({ verdicts }: JudgedPart, check: string): Verdict | null => verdicts.find((verdict) => verdict.check === check) ?? null;
  const pairs = checks.map((check) => ({ check, verdicts: [of(one, check), of(other, check)] as const }));
  return pairs.map(({ check, verdicts }) => ({ check, title: verdicts[0]?.title ?? verdicts[1]?.title ?? check, verdicts, better: betterOf(verdicts) }));
}

const OUTCOMES: readonly Outcome[] = ['pass', 'unknown', 'fail'];

/** Passing before open before failing, then the one with more to spare. */
function betterOf([one, other]: readonly [Verdict | null, Verdict | null]): 0 | 1 | null {
  if (one === null || other === null) return null;
  const outcomes = OUTCOMES.indexOf(one.outcome) - OUTCOMES.indexOf(other.outcome);
  const [mine, theirs] = [one.margin ?? one.spare, other.margin ?? other.spare];
  const difference = outcomes === 0 ? (theirs ?? Number.NaN) - (mine ?? Number.NaN) : outcomes;
  return difference < 0 ? 0 : difference > 0 ? 1 : null;
}
