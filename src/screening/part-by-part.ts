import { STANDS, type AnyCheck } from '../checks/index.js';
import type { Demands } from '../demands/index.js';
import type { ScreenView } from '../parts/screen-view.js';
import { BASES } from '../parts/basis.js';
import { decideBriefly, type BriefVerdict } from '../verdicts/decide.js';
import { codesOf, growing, segmentOf, type AskedParts } from './buffers.js';
import type { TermQuestion } from './composed-question.js';
import { digestsByPart, type Counted } from './digest.js';
import { numberTables, type BothFindings, type BothStanding } from './number-tables.js';
import type { CheckQuestion } from './question.js';

/** Terms of a composed check, and the parts it is asked of. */
interface Composed {
  readonly check: AnyCheck;
  readonly terms: readonly TermQuestion[];
  readonly view: Pick<ScreenView, 'size' | 'segment' | 'codes'>;
}

const BRIEF = { brief: true } as const;

/**
 * A composed check asked of one part after the other. Figures are few, so its terms stand in tables; their combinations are nearly as many as
 * the parts, so that looking one up would take longer than adding it up. How a part counts is kept, whatever it was made of is not.
 */
export function partByPart(demands: Demands, { check, terms, view }: Composed): CheckQuestion {
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
    const isAtHand = asked.holds(position);
    const both = tables?.findings(isAtHand ? asked.columns() : one.columns(position), isAtHand ? asked.placeOf(position) : 0) ?? fromTerms(position);
    return both === null ? null : decideBriefly(check, both.pessimistic, both.optimistic);
  };
  const countedOf = (position: number): Counted | null => {
    const standing = tables?.stands(asked.columns(), asked.placeOf(position)) ?? UNTOLD;
    if (standing.worst !== STANDS.untold) return countedBy(standing);
    const both = fromTerms(position);
    return both === null ? null : decideBriefly(check, both.pessimistic, both.optimistic);
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

const UNTOLD: BothStanding = { worst: STANDS.untold, best: STANDS.untold };

/** The outcome as `outcomeOf` has it. */
function countedBy({ worst, best }: BothStanding): Counted {
  if (worst >= STANDS.passes && best >= STANDS.passes) return PASSES[worst - STANDS.passes] ?? OPEN;
  return best === STANDS.fails && worst < STANDS.passes ? FAILS : OPEN;
}

const OPEN: Counted = { outcome: 'unknown', basis: null };
const FAILS: Counted = { outcome: 'fail', basis: null };
/** By weakness. */
const PASSES: readonly Counted[] = BASES.map((basis) => ({ outcome: 'pass', basis }));

/** The answers of all terms for the parts that were asked about last; looked up when one of them is settled. */
function askedColumns(terms: readonly TermQuestion[]) {
  let parts: AskedParts | null = null;
  let isRead = false;
  let columns = terms.map(() => new Int32Array(0));
  /** By place: when it was read last. */
  let marks = new Int32Array(0);
  let reading = 0;
  const read = ({ count, codes, only }: AskedParts): void => {
    if (marks.length < count) {
      columns = terms.map(() => new Int32Array(count));
      marks = new Int32Array(count);
    }
    reading += 1;
    if (only == null) marks.fill(reading);
    else for (const at of only) marks[at] = reading;
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
    /** Whether the answers of this part are in the columns. */
    holds: (position: number): boolean => isRead && parts !== null && marks[position - parts.first] === reading,
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
