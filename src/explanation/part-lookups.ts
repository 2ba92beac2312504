import { assumedFigure, hasTwoEnds, limitKindOf, withAssumed } from '../parts/assumption.js';
import { figureSlot, PARAMETERS, type Condition, type LimitKind, type Parameter } from '../parts/figures.js';
import type { ListCell, Part, PartSource } from '../parts/part.js';
import { placeOf, type Order, type RankedPart } from '../ranking/index.js';
import type { JudgedPart } from '../screening/index.js';
import { readersOf, type Candidate } from './candidates.js';
import { judgedWith, passesWith, settle, told, type Answered, type Settled, type Settling } from './settle.js';
import { endsOf, isMoreBetter, spanOf, type Span } from './span.js';
import { isIdentity, type Answer, type IdentityField } from './supposed.js';
import { turnOf, type Turn } from './figure-turn.js';

/** One figure of one part to look up: where it belongs and what its answer decides. SI units. */
export interface Lookup {
  readonly figure: Parameter | IdentityField;
  readonly kind: LimitKind | null;
  readonly unit: string | null;
  /** Of the cell it belongs in. */
  readonly condition: Condition;
  /** Open checks it was asked for by. */
  readonly checks: readonly string[];
  /** Where the verdict turns, the other figures of the part at good values; null when any sensible value decides it. */
  readonly turn: Turn | null;
  /** Identity fields: what the stage wants. */
  readonly wanted: Answer | null;
  readonly span: Span | null;
  /** Null: the list has no column for it. */
  readonly cell: ListCell | null;
}

/** A figure to assume for one run, SI. */
export interface Assumption {
  readonly figure: Parameter;
  /** Only where the parameter has two ends. */
  readonly kind: LimitKind | null;
  readonly value: number;
  readonly side: 'less' | 'more';
}

export interface Place {
  readonly rank: number;
  readonly of: number;
}

/** What would decide one undecided part. */
export interface PartLookups {
  readonly part: Part;
  readonly likely: boolean;
  /** Its row in the team's list; null where no list is kept. */
  readonly row: ListCell | null;
  readonly lookups: readonly Lookup[];
  /** Good answers to all of them make it fit, but for `remains`. */
  readonly settles: boolean;
  /** Checks that stay open whatever is looked up. */
  readonly remains: readonly string[];
  /** Its place with the figures just good enough (or at the worst of their class where that is good enough), and at the best of it; null when checks remain. */
  readonly place: (Place & { readonly best: number }) | null;
  /** Values that, assumed together, make it fit in this run; null where an assumption cannot say it. */
  readonly assume: readonly Assumption[] | null;
}

export interface LookupContext extends Settling {
  readonly cells?: PartSource['cells'];
  readonly fit: readonly RankedPart[];
  readonly order: Order;
}

/** Every figure that would decide a part, with its cell, the value at which it turns, and the place the part would take. */
export function lookupsOf(context: LookupContext, judged: JudgedPart): PartLookups {
  const settled = settle(context, judged);
  const { part, likely } = judged;
  const about = { part, likely, row: context.cells?.(part.id, 'id')[0] ?? null, remains: settled.remains };
  if (settled.answers.length === 0) {
    return { ...about, settles: false, lookups: settled.named.map((candidate) => unsettled(candidate, context, part)), place: null, assume: null };
  }
  const answers = placed(context, part, settled);
  const found = answers.map((one) => ({ one, lookup: lookupOf(context, { part, settled, answers, one }) }));
  const lookups = found.map(({ lookup }) => lookup);
  return { ...about, settles: true, lookups, place: placeWith(context, { judged, settled, answers, lookups }), assume: assumptionsOf(context, { part, settled, answers, lookups }) };
}

/** Each answer in the empty cell of the list where one is that would do, else in a column of its own. */
function placed(context: LookupContext, part: Part, { answers, remains }: Settled): Answered[] {
  return answers.map((one) => {
    const others = answers.filter((other) => other !== one);
    const works = ({ condition }: ListCell): boolean => {
      const there = { ...one, candidate: { ...one.candidate, condition } };
      return passesWith(context.run, told(part, [...others, there]), { remains });
    };
    const cell = cellsFor(context, part, one.candidate).find(works);
    return cell === undefined ? one : { ...one, candidate: { ...one.candidate, condition: cell.condition } };
  });
}

/** Empty cells of the part that could hold it: columns of this limit kind, or of none, before others. */
function cellsFor({ cells }: LookupContext, part: Part, { figure, kind }: Candidate): readonly ListCell[] {
  const found = (cells?.(part.id, figure) ?? []).filter((cell) => cell.empty && (isIdentity(figure) || cell.kind === null || cell.kind === kind));
  return [...found.filter((cell) => cell.kind === kind), ...found.filter((cell) => cell.kind !== kind)];
}

interface Answering {
  readonly part: Part;
  readonly settled: Settled;
  readonly answers: readonly Answered[];
  readonly one: Answered;
}

function lookupOf(context: LookupContext, { part, settled, answers, one }: Answering): Lookup {
  const { candidate, answer } = one;
  const others = answers.filter((other) => other !== one);
  const passes = (value: number): boolean => passesWith(context.run, told(part, [...others, { candidate, answer: value }]), { remains: settled.remains, only: checksOf(candidate) });
  return { ...plainly(candidate, context, part), turn: isIdentity(candidate.figure) ? null : turnOf({ parameter: candidate.figure, kind: candidate.kind, passes, good: Number(answer), guess: candidate.guess }) };
}

const checksOf = ({ figure, checks }: Candidate): ReadonlySet<string> => new Set([...checks, ...readersOf(figure)]);

function unsettled(candidate: Candidate, context: LookupContext, part: Part): Lookup {
  const { figure, kind, guess } = candidate;
  const turn: Turn | null = guess === null || isIdentity(figure) ? null : { value: guess, side: isMoreBetter(figure, kind) ? 'more' : 'less', until: null };
  return { ...plainly(candidate, context, part), turn };
}

function plainly(candidate: Candidate, context: LookupContext, part: Part): Omit<Lookup, 'turn'> {
  const { figure, kind, condition, checks, wanted } = candidate;
  const isWord = isIdentity(figure);
  const slot = isWord ? null : figureSlot({ parameter: figure, kind: kind ?? 'typ', condition });
  const cell = cellsFor(context, part, candidate).find((one) => slot === null || figureSlot({ parameter: figure as Parameter, kind: kind ?? 'typ', condition: one.condition }) === slot);
  return { figure, kind, condition, checks, wanted: isWord ? wanted : null, unit: isWord ? null : PARAMETERS[figure].unit, span: isWord ? null : spanOf(figure, kind, { part, parts: context.parts }), cell: cell ?? null };
}

interface Placing {
  readonly judged: JudgedPart;
  readonly settled: Settled;
  readonly answers: readonly Answered[];
  readonly lookups: readonly Lookup[];
}

function placeWith({ run, fit, order }: LookupContext, { judged, settled, answers, lookups }: Placing): PartLookups['place'] {
  if (settled.remains.length > 0) return null;
  const judgedAt = (value: (lookup: Lookup, answer: Answer) => Answer): JudgedPart => judgedWith(run, judged.part, answers.map((one, at) => ({ ...one, answer: lookups[at] === undefined ? one.answer : value(lookups[at], one.answer) })));
  const enough = [judgedAt(worstOfClass), judgedAt(justEnough)].find(isFit) ?? judgedAt((_, answer) => answer);
  const best = judgedAt(bestOfClass);
  const place = placeOf(enough, fit, order);
  return { ...place, best: isFit(best) ? Math.min(place.rank, placeOf(best, fit, order).rank) : place.rank };
}

const isFit = ({ outcome }: JudgedPart): boolean => outcome === 'fits';

function worstOfClass({ figure, kind, span }: Lookup, answer: Answer): Answer {
  return span === null || isIdentity(figure) ? answer : endsOf(span, isMoreBetter(figure, kind)).worst;
}

function bestOfClass({ figure, kind, span }: Lookup, answer: Answer): Answer {
  return span === null || isIdentity(figure) ? answer : endsOf(span, isMoreBetter(figure, kind)).best;
}

/** A hair on the good side of where it turns. */
function justEnough({ turn }: Lookup, answer: Answer): Answer {
  if (turn === null) return answer;
  return turn.value + (turn.side === 'more' ? 1 : -1) * Math.abs(turn.value) * 1e-7;
}

/** Assumed figures hold without condition, so the value may be another than that of the cell. Of several the good answers are assumed together. */
function assumptionsOf(context: LookupContext, { part, settled, answers, lookups }: Omit<Placing, 'judged'> & { readonly part: Part }): readonly Assumption[] | null {
  const figures = answers.flatMap(({ candidate, answer }, at) => (isIdentity(candidate.figure) ? [] : [{ candidate, figure: candidate.figure, answer: Number(answer), turn: lookups[at]?.turn ?? null }]));
  if (figures.length < answers.length || context.run.strict || !figures.every(({ candidate, figure }) => canAssume(figure, candidate.kind))) return null;
  const passes = (values: readonly number[]): boolean => passesWith(context.run, figures.reduce((known, { figure, candidate }, at) => withAssumed(known, assumedFigure(figure, values[at] ?? 0, kindFor(figure, candidate.kind))), part), { remains: settled.remains });
  const good = figures.map(({ answer }) => answer);
  if (!passes(good)) return null;
  return figures.map(({ candidate, figure, answer, turn }, at): Assumption => {
    const side = isMoreBetter(figure, candidate.kind) ? 'more' : 'less';
    const kind = hasTwoEnds(figure) ? candidate.kind : null;
    if (figures.length > 1) return { figure, kind, value: answer, side };
    const own = turnOf({ parameter: figure, kind: candidate.kind, passes: (value) => passes(good.map((one, other) => (other === at ? value : one))), good: answer, guess: turn?.value ?? null });
    return { figure, kind, value: own?.value ?? answer, side: own?.side ?? side };
  });
}

/** An assumption stands for the limit on the bad side, and of a range for the end that is named. */
const canAssume = (figure: Parameter, kind: LimitKind | null): boolean => hasTwoEnds(figure) || kind === limitKindOf(figure);
const kindFor = (figure: Parameter, kind: LimitKind | null): LimitKind => (hasTwoEnds(figure) && kind !== null ? kind : limitKindOf(figure));
