import type { BriefVerdict } from '../verdicts/decide.js';
import { column } from './column.js';
import { shortness } from './nearest.js';

/** What the tally and the order need of a verdict; it holds for every part with the same pieces. */
export type Digest = Pick<BriefVerdict, 'check' | 'outcome' | 'basis' | 'standsOn' | 'margin' | 'spare'>;

/** How an answer counts in a part's sum: unknowns above, then what is not guaranteed, then failures. A check that does not apply adds nothing. */
export const COUNTS = { fail: 1, weak: 1 << 10, unknown: 1 << 20 } as const;

/** Verdicts of one check, by the number of the answer. */
export interface Digests {
  /** Called before anything else is asked of an answer. */
  settle(answer: number): void;
  /** By answer: what it adds to the part's sum. Replaced when an answer comes that has no place in it. */
  readonly counts: Int32Array;
  /** By answer: what it adds to the part's distance from fitting, as `counts`; null: it is worked out for few. */
  readonly distances: Float64Array | null;
  /** The same for one answer. */
  distance(answer: number): number;
  /** The verdict of an answer that fails or is open; null for any other. */
  miss(answer: number): BriefVerdict | null;
  /** What a pass is ranked by, one and the same object whenever it is asked for; null for any other answer. */
  pass(answer: number): Digest | null;
}

/** Digests that are put in answer by answer. */
export interface AddedDigests extends Digests {
  /** Null: the check does not apply. */
  add(verdict: BriefVerdict | null): number;
}

/**
 * Numbers in columns: there are as many answers as combinations, and of few of them more is asked than how they count. `verdictOf` judges an
 * answer that was not added.
 */
export function digests(nominalSupply: number, verdictOf: (answer: number) => BriefVerdict | null = none): AddedDigests {
  const counts = column(Int32Array, UNSETTLED);
  // Of a failure its distance, of a pass its margin.
  const values = column(Float64Array, 0);
  const spares = column(Float64Array, 0);
  const kinds = column(Uint8Array, 0);
  const kindList: Kind[] = [];
  const passes = new Map<number, Digest>();
  const misses = new Map<number, BriefVerdict>();
  const put = (answer: number, verdict: BriefVerdict | null): number => {
    counts.put(answer, verdict === null ? 0 : countOf(verdict));
    values.put(answer, verdict?.outcome === 'fail' ? shortness(verdict, nominalSupply) : (verdict?.margin ?? 0));
    spares.put(answer, verdict?.spare ?? 0);
    if (verdict !== null && verdict.outcome !== 'pass') misses.set(answer, verdict);
    kinds.put(answer, verdict?.outcome === 'pass' ? numberOf(kindOf(verdict), kindList) : 0);
    return answer;
  };
  let added = 0;
  return {
    get counts() { return counts.numbers(); },
    get distances() { return values.numbers(); },
    distance: (answer) => (counts.at(answer) === COUNTS.fail ? values.at(answer) : 0),
    miss: (answer) => misses.get(answer) ?? null,
    add: (verdict) => put(added++, verdict),
    settle(answer) {
      if (counts.at(answer) === UNSETTLED) put(answer, verdictOf(answer));
    },
    pass(answer) {
      const kind = kindList[kinds.at(answer) - 1];
      if (kind === undefined) return null;
      const known = passes.get(answer) ?? digestOf(kind, { margin: values.at(answer), spare: spares.at(answer) });
      passes.set(answer, known);
      return known;
    },
  };
}

/** The same where every part of a list has an answer of its own, numbered by its position: how far a failure is off and what a pass is ranked by are worked out when they are asked for. */
export function digestsByPart(size: number, { nominalSupply, verdictOf, countedOf = verdictOf }: ByPart): Digests {
  const counts = new Int32Array(size).fill(UNSETTLED);
  const passes = new Map<number, Digest | null>();
  return {
    counts,
    distances: null,
    distance(answer) {
      const verdict = counts[answer] === COUNTS.fail ? verdictOf(answer) : null;
      return verdict === null ? 0 : shortness(verdict, nominalSupply);
    },
    miss: (answer) => (counts[answer] === COUNTS.fail || counts[answer] === COUNTS.unknown ? verdictOf(answer) : null),
    settle(answer) {
      if (counts[answer] !== UNSETTLED) return;
      const counted = countedOf(answer);
      counts[answer] = counted === null ? 0 : countOf(counted);
    },
    pass(answer) {
      const before = passes.get(answer);
      if (before !== undefined) return before;
      const verdict = verdictOf(answer);
      const digest = verdict?.outcome === 'pass' ? digestFor(verdict) : null;
      passes.set(answer, digest);
      return digest;
    },
  };
}

interface ByPart {
  readonly nominalSupply: number;
  readonly verdictOf: (answer: number) => BriefVerdict | null;
  /** The same where no more is wanted than how an answer counts. */
  readonly countedOf?: (answer: number) => Counted | null;
}

/** How an answer counts. */
export type Counted = Pick<BriefVerdict, 'outcome' | 'basis'>;

const UNSETTLED = -1;
const none = (): null => null;

/** All of a digest but its numbers, and which of these there are: a check has few. */
interface Kind extends Pick<Digest, 'check' | 'outcome' | 'basis' | 'standsOn'> {
  readonly hasMargin: boolean;
  readonly hasSpare: boolean;
}

function kindOf({ check, outcome, basis, standsOn, margin, spare }: BriefVerdict): Kind {
  return { check, outcome, basis, standsOn, hasMargin: margin !== null, hasSpare: spare !== null };
}

/** Its number in the list, from 1. */
function numberOf(kind: Kind, list: Kind[]): number {
  const known = list.findIndex((one) => one.basis === kind.basis && one.standsOn === kind.standsOn && one.hasMargin === kind.hasMargin && one.hasSpare === kind.hasSpare);
  return known < 0 ? list.push(kind) : known + 1;
}

function digestOf({ hasMargin, hasSpare, check, outcome, basis, standsOn }: Kind, { margin, spare }: { readonly margin: number; readonly spare: number }): Digest {
  return { check, outcome, basis, standsOn, margin: hasMargin ? margin : null, spare: hasSpare ? spare : null };
}

/** A digest of its own, for an answer that one part has. */
function digestFor({ check, outcome, basis, standsOn, margin, spare }: BriefVerdict): Digest {
  return { check, outcome, basis, standsOn, margin, spare };
}

function countOf({ outcome, basis }: Pick<BriefVerdict, 'outcome' | 'basis'>): number {
  if (outcome === 'fail') return COUNTS.fail;
  if (outcome === 'unknown') return COUNTS.unknown;
  return basis === 'guaranteed' ? 0 : COUNTS.weak;
}
