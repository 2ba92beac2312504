import type { AnyCheck } from '../checks/index.js';
import type { Demands } from '../demands/index.js';
import { BASES, type Basis } from '../parts/basis.js';
import { decideBriefly, outcomeOf, type BriefVerdict } from '../verdicts/decide.js';
import { segmentOf, type AskedParts } from './buffers.js';
import type { TermQuestion } from './composed-question.js';
import { digestsByPart, type Counted } from './digest.js';
import { numberTables, type BothFindings } from './number-tables.js';
import type { CheckQuestion } from './question.js';

/** Terms of a composed check, and how many parts there are. */
interface Composed {
  readonly check: AnyCheck;
  readonly terms: readonly TermQuestion[];
  readonly size: number;
}

const BRIEF = { brief: true } as const;

/**
 * A composed check asked of one part after the other. Figures are few, so its terms stand in tables; their combinations are nearly as many as
 * the parts, so that looking one up would take longer than adding it up. How a part counts is kept, whatever it was made of is not.
 */
export function partByPart(demands: Demands, { check, terms, size }: Composed): CheckQuestion {
  const looked = lookedUp(terms);
  const { composition } = check;
  const numbers = composition?.inNumbers(demands) ?? null;
  const tables = numbers === null ? null : numberTables(numbers, terms);
  const known = Object.fromEntries((composition?.names ?? []).map((name, number) => [name, () => looked.get(number)]));
  const finding = () => composition?.finding(demands, composition.whole(demands, known, BRIEF), BRIEF) ?? null;
  const fromTerms = (position: number): BothFindings | null => {
    looked.start(position);
    const pessimistic = finding();
    const optimistic = looked.differ() ? finding() : pessimistic;
    return pessimistic === null || optimistic === null ? null : { pessimistic, optimistic };
  };
  const findingsOf = (position: number): BothFindings | null => tables?.findings(looked.columns(), looked.placeOf(position)) ?? fromTerms(position);
  const verdictOf = (position: number): BriefVerdict | null => {
    const both = findingsOf(position);
    return both === null ? null : decideBriefly(check, both.pessimistic, both.optimistic);
  };
  const countedOf = (position: number): Counted | null => {
    const side = tables?.sides?.(looked.columns(), looked.placeOf(position)) ?? null;
    if (side !== null) return countedBy(side) ?? verdictOf(position);
    const both = findingsOf(position);
    return both === null ? null : (countedBy(both) ?? decideBriefly(check, both.pessimistic, both.optimistic));
  };
  const digests = digestsByPart(size, { nominalSupply: demands.operating.nominalSupply, verdictOf, countedOf });
  return {
    check: check.id,
    digests,
    settle: (answer) => digests.settle(answer),
    numbering: digests,
    classify(parts, into) {
      looked.over(parts);
      for (let at = 0; at < parts.count; at += 1) into[at] = parts.first + at;
    },
  };
}

/** A pass or an open answer is no more than itself; null: of anything else the numbers are asked. */
function countedBy({ pessimistic, optimistic }: BothFindings): Counted | null {
  const outcome = outcomeOf(pessimistic, optimistic);
  if (outcome === 'unknown') return OPEN;
  return outcome === 'pass' && pessimistic.kind === 'numbers' ? PASSES[pessimistic.basis] : null;
}

const OPEN: Counted = { outcome: 'unknown', basis: null };
const PASSES = Object.fromEntries(BASES.map((basis) => [basis, { outcome: 'pass', basis }])) as unknown as Record<Basis, Counted>;

/** The terms of one part after the other, in one outlook and then in the other. A term is looked up for a whole segment when one of its parts asks for it. */
function lookedUp(terms: readonly TermQuestion[]) {
  let segment: AskedParts | null = null;
  const columns = terms.map(() => new Int32Array(0));
  const isRead = terms.map(() => false);
  let place = 0;
  let outlook: 'worst' | 'best' = 'worst';
  let isSame = true;
  const read = (number: number): Int32Array => {
    const term = terms[number];
    if (term === undefined || segment === null) throw new RangeError(`no term ${number} of ${terms.length}, or no segment`);
    const column = (columns[number]?.length ?? 0) < segment.count ? new Int32Array(segment.count) : (columns[number] ?? new Int32Array(0));
    term.tree.classify(segmentOf(term, { count: segment.count, codes: segment.codes }), column);
    columns[number] = column;
    isRead[number] = true;
    return column;
  };
  return {
    /** Of every term, for the whole segment. */
    columns(): readonly Int32Array[] {
      for (let number = 0; number < isRead.length; number += 1) if (isRead[number] !== true) read(number);
      return columns;
    },
    placeOf: (position: number): number => position - (segment?.first ?? 0),
    over(parts: AskedParts): void {
      segment = parts;
      isRead.fill(false);
    },
    start(position: number): void {
      place = position - (segment?.first ?? 0);
      [outlook, isSame] = ['worst', true];
    },
    get(number: number): unknown {
      const column = isRead[number] === true ? columns[number] : read(number);
      const answer = column?.[place] ?? 0;
      const term = terms[number];
      if (outlook === 'best') return term?.best[answer];
      const worst = term?.worst[answer];
      if (isSame && worst !== term?.best[answer]) isSame = false;
      return worst;
    },
    /** Goes over to the optimistic outlook, where anything looked at so far differs in it. */
    differ(): boolean {
      if (isSame) return false;
      outlook = 'best';
      return true;
    },
  };
}
