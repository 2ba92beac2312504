import type { JudgedPart } from '../screening/index.js';
import { comfortOf, marginForOrder } from './comfort.js';
import { dominatorsOf } from './dominance.js';
import { linesOf } from './family.js';
import { meritOf, priceInEuro, type Merit, type ShareWeights } from './merit.js';
import type { Placed } from './placed.js';

export const ORDERS = ['merit', 'price', 'current', 'margin'] as const;
export type Order = (typeof ORDERS)[number];

/** A part that fits, with its place and what put it there. */
export interface RankedPart extends JudgedPart {
  readonly rank: number;
  readonly merit: Merit;
  /** The check with the least comfortable margin; null when none has one. */
  readonly tightest: string | null;
  /** Id of a part that is at least as good in every clamped margin, price and current, and better in one. */
  readonly dominatedBy: string | null;
  /** Other packages and channel counts of the same die that fit, in their order; they share this rank. */
  readonly variants: readonly JudgedPart[];
}

type Candidate = Omit<RankedPart, 'rank' | 'dominatedBy' | 'variants'>;

/** Total order of what fits, one line a family: approved before generic, limits before typical, then merit; never depends on who else is there. */
export function rank(fit: readonly JudgedPart[], order: Order = 'merit'): RankedPart[] {
  const candidates = fit.map((judged) => candidateOf(judged));
  candidates.sort((a, b) => compareIn(order, a, b));
  const lines = linesOf(candidates);
  const dominators = dominatorsOf(lines.map(({ first }) => first));
  return lines.map(({ first, variants }, at) => ({ ...first, rank: at + 1, dominatedBy: dominators[at]?.part.id ?? null, variants }));
}

/** The place one more part that fits would take among ranked lines, and how many lines there would be; a variant shares the line of its family. */
export function placeOf(judged: JudgedPart, fit: readonly RankedPart[], order: Order = 'merit'): { readonly rank: number; readonly of: number } {
  const candidate: Candidate = { ...judged, merit: meritOf(judged), tightest: tightestOf(judged) };
  const others = fit.filter((line) => line.part.id !== judged.part.id);
  const ahead = others.filter((line) => compareIn(order, line, candidate) < 0);
  const kin = others.find((line) => linesOf([line, candidate]).length === 1);
  const leader = kin !== undefined && ahead.includes(kin) ? ahead.indexOf(kin) + 1 : ahead.length + 1;
  return { rank: leader, of: others.length + (kin === undefined ? 1 : 0) };
}

function candidateOf(judged: JudgedPart): Candidate {
  return { ...judged, merit: meritOf(judged), tightest: tightestOf(judged) };
}

/** The step that decides between two parts that fit, and its sign: below zero, the first is ahead. The order asked for is a step of its own. */
export interface Decision {
  readonly by: string;
  readonly sign: number;
}

/** How two parts that fit stand to each other in this order, with shares weighed otherwise where that is asked. */
export function decisionBetween(order: Order, [one, other]: readonly [JudgedPart, JudgedPart], weights?: ShareWeights): Decision {
  const [a, b] = [placedOf(one, weights), placedOf(other, weights)];
  const asked = FIRST[order](a, b);
  if (asked !== 0) return { by: order, sign: Math.sign(asked) };
  for (const { name, compare } of STEPS) {
    const difference = compare(a, b);
    if (difference !== 0) return { by: name, sign: Math.sign(difference) };
  }
  return { by: 'id', sign: 0 };
}

/** What places a part in the order, with shares weighed as asked. */
function placedOf({ part, current, verdicts, proof, confirm }: JudgedPart, weights?: ShareWeights): Placed {
  return { part, current, verdicts, proof, confirm, merit: meritOf({ part, current, verdicts }, weights) };
}

/** What decides between two: the steps of the order, each 0 when they are equal there. */
export const STEPS: readonly { readonly name: string; readonly compare: (a: Placed, b: Placed) => number }[] = [
  { name: 'tier', compare: (a, b) => Number(a.part.tier === 'generic') - Number(b.part.tier === 'generic') },
  { name: 'proof', compare: (a, b) => Number(a.proof === 'typical') - Number(b.proof === 'typical') },
  { name: 'merit', compare: (a, b) => b.merit.total - a.merit.total },
  { name: 'price', compare: (a, b) => unknownLast(priceInEuro(a), priceInEuro(b)) },
  { name: 'current', compare: (a, b) => unknownLast(a.current, b.current) },
  { name: 'estimates', compare: (a, b) => (isOneDie(a, b) ? 0 : a.confirm.length - b.confirm.length) },
  { name: 'id', compare: (a, b) => (a.part.id < b.part.id ? -1 : a.part.id > b.part.id ? 1 : 0) },
];

/** Verdicts that are shared come from the same figures: there is the same to confirm, and no need to find out how much. */
const isOneDie = (a: Placed, b: Placed): boolean => a.verdicts.every((verdict, at) => verdict === b.verdicts[at]);

const FIRST: Record<Order, (a: Placed, b: Placed) => number> = {
  merit: () => 0,
  price: (a, b) => unknownLast(priceInEuro(a), priceInEuro(b)),
  current: (a, b) => unknownLast(a.current, b.current),
  margin: (a, b) => leastMargin(b) - leastMargin(a),
};

/** From here on a part that was only surveyed has to be read. */
const READ_FROM = STEPS.findIndex(({ name }) => name === 'estimates');
const KNOWN_STEPS = STEPS.slice(0, READ_FROM);
const READ_STEPS = STEPS.slice(READ_FROM);

/** Step by step: the later ones cost more and seldom decide. */
export function compareIn(order: Order, a: Placed, b: Placed): number {
  return compareRoughly(order, a, b) || firstDifference(READ_STEPS, a, b);
}

/** Order without reading. */
export function compareRoughly(order: Order, a: Placed, b: Placed): number {
  return FIRST[order](a, b) || firstDifference(KNOWN_STEPS, a, b);
}

function firstDifference(steps: typeof STEPS, a: Placed, b: Placed): number {
  for (const { compare } of steps) {
    const difference = compare(a, b);
    if (difference !== 0) return difference;
  }
  return 0;
}

/** The first in the order, step by step: of those a step leaves behind nothing further is asked. Null of none. */
export function firstIn<P extends Placed>(order: Order, all: readonly P[]): P | null {
  let left = all;
  for (const compare of [FIRST[order], ...STEPS.map((step) => step.compare)]) {
    if (left.length < 2) break;
    left = leastBy(left, compare);
  }
  return left[0] ?? null;
}

/** All that nothing comes before. */
function leastBy<P extends Placed>(all: readonly P[], compare: (a: Placed, b: Placed) => number): readonly P[] {
  let least: P[] = [];
  for (const one of all) {
    const [first] = least;
    const difference = first === undefined ? -1 : compare(one, first);
    if (difference < 0) least = [one];
    else if (difference === 0) least.push(one);
  }
  return least;
}

function unknownLast(a: number | null, b: number | null): number {
  if (a === null || b === null) return Number(a === null) - Number(b === null);
  return a - b;
}

function leastMargin(judged: Placed): number {
  const margins = judged.verdicts.map(marginForOrder).filter((margin) => margin !== null);
  return Math.min(...margins, Number.MAX_VALUE);
}

/** The check with the least comfortable margin. */
export function tightestOf(judged: JudgedPart): string | null {
  const scored = judged.verdicts.flatMap((verdict) => {
    const score = comfortOf(verdict);
    return score === null ? [] : [{ check: verdict.check, score, margin: marginForOrder(verdict) ?? 0 }];
  });
  scored.sort((a, b) => a.score - b.score || a.margin - b.margin);
  const budget = judged.verdicts.find((verdict) => verdict.check === 'supply-current' && verdict.margin !== null);
  const least = scored[0];
  if (budget?.margin != null && (least === undefined || budget.margin < least.margin)) return budget.check;
  return least?.check ?? null;
}
