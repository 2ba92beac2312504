import type { AnyCheck } from '../checks/index.js';
import type { Demands } from '../demands/index.js';
import type { ScreenView } from '../parts/screen-view.js';
import { BASES, type Basis } from '../parts/basis.js';
import { decideBriefly, type BriefVerdict } from '../verdicts/decide.js';
import { outcomeOf } from '../verdicts/standing.js';
import { codesOf, growing, segmentOf, type AskedParts } from './buffers.js';
import type { TermQuestion } from './composed-question.js';
import { digestsByPart, type Counted } from './digest.js';
import { numberTables, type BothFindings } from './number-tables.js';
import type { CheckQuestion } from './question.js';

/** Terms of a composed check, and the parts it is asked of. */
interface Composed {
  readonly check: AnyCheck;
  /** What a pass is ranked by is wanted of most parts that pass. */
  readonly ranksPasses: boolean;
  readonly terms: readonly TermQuestion[];
  readonly view: Pick<ScreenView, 'size' | 'segment' | 'codes'>;
}

const BRIEF = { brief: true } as const;

/**
 * A composed check asked of one part after the other. Figures are few, so its terms stand in tables; their combinations are nearly as many as
 * the parts, so that looking one up would take longer than adding it up. How a part counts is kept, whatever it was made of is not.
 */
export function partByPart(demands: Demands, { check, terms, view, ranksPasses }: Composed): CheckQuestion {
  const asked = askedColumns(terms);
  const one = onePart(terms, view);
  const { composition } = check;
  const numbers = composition?.inNumbers(demands) ?? null;
  const tables = numbers === null ? null : numberTables(numbers, terms);
  const known = Object.fromEntries((composition?.names ?? []).map((name, number) => [name, () => one.get(number)]));
  const finding = () => composition?.finding(demands, composition.whole(demands, known, BRIEF), BRIEF) ?? null;
  const fromTerms = (position: number): BothFindings | null => {
    one.start(position);
    const pessimistic = finding();
    const optimistic = one.differ() ? finding() : pessimistic;
    return pessimistic === null || optimistic === null ? null : { pessimistic, optimistic };
  };
  const verdictOf = (position: number): BriefVerdict | null => {
    const both = tables?.findings(one.columns(position), 0) ?? fromTerms(position);
    return both === null ? null : decideBriefly(check, both.pessimistic, both.optimistic);
  };
  const countedOf = (position: number): Counted | null => {
    const place = asked.placeOf(position);
    const side = tables?.sides?.(asked.columns(), place) ?? null;
    if (side !== null) return countedBy(side) ?? verdictOf(position);
    const both = tables?.findings(asked.columns(), place) ?? fromTerms(position);
    if (both === null) return null;
    return (ranksPasses ? null : countedBy(both)) ?? decideBriefly(check, both.pessimistic, both.optimistic);
  };
  const digests = digestsByPart(view.size, { nominalSupply: demands.operating.nominalSupply, verdictOf, countedOf });
  return {
    check: check.id,
    digests,
    settle: (answer) => digests.settle(answer),
    numbering: digests,
    classify(parts, into) {
      asked.over(parts);
      const { first, count, only = null } = parts;
      if (only === null) for (let at = 0; at < count; at += 1) into[at] = first + at;
      else for (const at of only) into[at] = first + at;
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

/** The answers of all terms for the parts that were asked about last; looked up when one of them is settled. */
function askedColumns(terms: readonly TermQuestion[]) {
  let parts: AskedParts | null = null;
  let isRead = false;
  let columns = terms.map(() => new Int32Array(0));
  const read = ({ count, codes, only }: AskedParts): void => {
    if ((columns[0]?.length ?? 0) < count) columns = terms.map(() => new Int32Array(count));
    terms.forEach((term, number) => term.tree.classify(segmentOf(term, { count, codes, only: only ?? null }), columns[number] ?? new Int32Array(count)));
  };
  return {
    over(asked: AskedParts): void {
      [parts, isRead] = [asked, false];
    },
    columns(): readonly Int32Array[] {
      if (!isRead && parts !== null) read(parts);
      isRead = true;
      return columns;
    },
    placeOf: (position: number): number => position - (parts?.first ?? 0),
  };
}

/** The terms of any one part, in one outlook and then in the other; each looked up when it is asked for. */
function onePart(terms: readonly TermQuestion[], view: Composed['view']) {
  const buffers = { codes: [] };
  const single = terms.map(() => new Int32Array(1));
  let at = 0;
  let codes: (trait: number) => Int32Array = () => new Int32Array(0);
  let outlook: 'worst' | 'best' = 'worst';
  let isSame = true;
  const go = (position: number): void => {
    const segment = Math.floor(position / view.segment);
    at = position - segment * view.segment;
    codes = codesOf(view, segment, buffers);
  };
  const answerOf = (term: TermQuestion): number => {
    const code = term.codes((trait, place) => codes(trait)[place] ?? 0);
    return term.tree.answer({ code, columns: term.looksAtTraits ? codes : null, grow: growing(term, code) }, at);
  };
  return {
    /** One answer each, at place 0. */
    columns(position: number): readonly Int32Array[] {
      go(position);
      terms.forEach((term, number) => void single[number]?.fill(answerOf(term)));
      return single;
    },
    start(position: number): void {
      go(position);
      [outlook, isSame] = ['worst', true];
    },
    get(number: number): unknown {
      const term = terms[number];
      if (term === undefined) throw new RangeError(`no term ${number} of ${terms.length}`);
      const answer = answerOf(term);
      if (outlook === 'best') return term.best[answer];
      const worst = term.worst[answer];
      if (worst !== term.best[answer]) isSame = false;
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
