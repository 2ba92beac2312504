import type { Miss } from '../screening/index.js';
import type { BriefVerdict } from '../verdicts/decide.js';
import type { Verdict } from '../verdicts/verdict.js';
import type { Change } from './changing.js';
import { factorOf, type Mover } from './movers.js';
import type { CountedChange, EmptySearch } from './nothing-fits.js';
import { fewDigits, printedAs, writtenValue } from './printed-value.js';

/** A limit moved up to so many times as far as the least that lets a part in is still the same idea. */
const WIDER = 5;

/**
 * After the least move of one upper limit that lets a part in, the one that lets in most for a little more: what the other parts need
 * that fail nothing but checks of this limit. Null where no more come in.
 */
export function widerOf(least: CountedChange, mover: Mover, { stage, misses }: Pick<EmptySearch, 'stage' | 'misses'>): Change | null {
  const [move] = least.moves;
  const { touches, input } = mover;
  if (least.moves.length !== 1 || move?.value == null || touches === null || mover.direction !== 'up' || input.form !== 'value') return null;
  const from = mover.from;
  const most = Math.min(mover.most, from + WIDER * (move.value - from));
  let wanted = -Infinity;
  for (const miss of misses) {
    const need = needOf(miss, { touches, from, most });
    if (need !== null && need <= most) wanted = Math.max(wanted, need);
  }
  if (!(wanted > move.value)) return null;
  const options = { digits: fewDigits(wanted, input.unit, 'up'), round: 'up' } as const;
  const value = printedAs(wanted, input.unit, options);
  const factor = factorOf(mover, value, stage);
  return { ...least, moves: [{ ...move, text: `${input.before ?? ''}${writtenValue(wanted, input.unit, options)}`, value, boundary: wanted, factor }], factor };
}

interface Within {
  readonly touches: readonly string[];
  readonly from: number;
  readonly most: number;
}

/** The limit with which a part passes that fails nothing else, as its worst readings say: to be judged again before it is told. Null: more than the most, or no limit helps. */
function needOf(miss: Miss, { touches, from, most }: Within): number | null {
  if (!miss.unmet.every((check) => touches.includes(check))) return null;
  // One reading of each is at hand: what it needs already, the other one needs at least as well.
  if (miss.unmet.some((check) => offeredOf(miss.verdict(check), from) > most)) return null;
  const needs = miss.judged().verdicts.flatMap((verdict) => (verdict.outcome === 'pass' ? [] : [offeredAtWorst(verdict, from)]));
  return needs.includes(null) ? null : Math.max(...needs.map(Number));
}

const offeredOf = (verdict: BriefVerdict | null, from: number): number =>
  typeof verdict?.offered === 'number' && typeof verdict.required === 'number' ? verdict.offered - verdict.required + from : 0;

/** Where the limit itself is compared, what is offered; else (room at a rail) the limit and what is short. */
function offeredAtWorst({ offered, offeredBest, required, sense }: Verdict, from: number): number | null {
  if (typeof offered !== 'number' || typeof offeredBest !== 'number' || typeof required !== 'number' || sense !== 'at-most') return null;
  return Math.max(offered, offeredBest) - required + from;
}
