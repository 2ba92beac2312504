import { CHECKS, type AnyCheck, type AnyComposition } from '../checks/index.js';
import { CHECK_IDS, markOf } from '../demands/index.js';
import { TRAIT_NUMBER, type ScreenView } from '../parts/screen-view.js';
import { TRAITS } from '../parts/traits.js';
import { byTree, type AskedParts } from './buffers.js';
import { composedQuestion, termQuestion, type TermQuestion, wholeQuestion } from './composed-question.js';
import { DecisionTree, type Step } from './decision-tree.js';
import { digests, type Digests } from './digest.js';
import { partByPart } from './part-by-part.js';
import type { BothReadings } from './remembering.js';
import { briefVerdictOn, notBuilt, type Judging } from './judge.js';
import { standIn, type StandIn } from './stand-in.js';
import type { SurveyRequest } from './survey.js';

/** The code of one part in a trait, or in whatever else a question looks at. */
export type CodeAt = (trait: number, at: number) => number;

/** Something asked of every part of a view, with the answers found so far. */
export interface Question {
  readonly tree: DecisionTree;
  /** Whether it looks at the traits themselves. */
  readonly looksAtTraits: boolean;
  /** What the question looks at, from the traits of the parts in one segment. */
  codes(traits: CodeAt): CodeAt;
  /** Answers the part whose codes these are; what it looked at goes to `path`. */
  answer(codeOf: (trait: number) => number, path: Step[]): number;
}

/** A check asked of every part. */
export interface CheckQuestion {
  readonly check: string;
  readonly digests: Digests;
  /** Writes the number of each part's answer to its place in the segment. */
  classify(parts: AskedParts, into: Int32Array): void;
  /** Called for every answer before its digest is used, while its segment is the one that was classified last; null: every answer has its verdict from the beginning. */
  readonly settle: ((answer: number) => void) | null;
  /** One and the same object for questions that number their answers alike. */
  readonly numbering: object;
}

/** Every check the stage asks for, in the order of verdicts. What was found out for the stage asked before serves again where it asks the same. */
export function checkQuestions(run: Judging, view: ScreenView, { circuit, outcomesOnly = false }: SurveyRequest): CheckQuestion[] {
  const { demands } = run;
  const kept = keptFor(run, view);
  const built = CHECKS.filter((check) => check.isAsked(demands)).map((check) => {
    const asked = check.asked(demands);
    const form = outcomesOnly && check.composition !== null ? `${check.id} of those open` : check.id;
    const before = kept.questions.get(form);
    if (before !== undefined && asked !== null && before.asked === asked && before.circuit === circuit) return before.question;
    const mark = markOf(asked, circuit);
    if (before?.mark === mark) return before.question;
    const question = check.composition === null
      ? checkQuestion(run, kept, { check: check.id, verdict: (readings) => briefVerdictOn(check, demands, readings) })
      : composedFor(run, kept, { check, circuit, composition: check.composition, outcomesOnly });
    kept.questions.set(form, { asked, circuit, mark, question });
    return question;
  });
  const unbuilt = demands.unbuilt.map((demand) => checkQuestion(run, kept, { check: demand.check, verdict: () => notBuilt(demand) }));
  const order = ({ check }: CheckQuestion): number => (CHECK_IDS as readonly string[]).indexOf(check);
  return [...built, ...unbuilt].sort((a, b) => order(a) - order(b));
}

/** What is kept of a view in the surroundings it was last asked about. */
interface Kept {
  readonly around: readonly unknown[];
  readonly surroundings: string;
  readonly view: ScreenView;
  readonly standIn: StandIn;
  /** The last question of each check, by what the stage asked: a changed limit redoes the checks it touches, and no others. */
  readonly questions: Map<string, { readonly asked: unknown; readonly circuit: string; readonly mark: string; readonly question: CheckQuestion }>;
  /** Terms and wholes of composed checks, by what the stage asks but for the limit. */
  readonly compositions: Map<string, KeptComposition>;
  /** Made when it is first asked. */
  current: ValueQuestion | null;
}

const KEPT = new WeakMap<ScreenView, Kept>();

function keptFor({ demands: { operating }, strict, classes }: Judging, view: ScreenView): Kept {
  const around = [operating, strict, classes];
  const before = KEPT.get(view);
  if (before?.around.every((one, at) => one === around[at]) === true) return before;
  const surroundings = markOf([operating, strict, [...classes]], '');
  if (before?.surroundings === surroundings) return before;
  const kept: Kept = { around, surroundings, view, standIn: standIn(view.tier, { operating, strict, classes }), questions: new Map(), compositions: new Map(), current: null };
  KEPT.set(view, kept);
  return kept;
}

interface Asked {
  readonly check: string;
  readonly verdict: (readings: BothReadings) => ReturnType<typeof briefVerdictOn>;
}

function checkQuestion(run: Judging, kept: Kept, { check, verdict }: Asked): CheckQuestion {
  const found = digests(run.demands.operating.nominalSupply);
  return { check, digests: found, settle: null, ...byTree(question(kept, (readings) => found.add(verdict(readings)))) };
}

/** A number read off the pessimistic readings of every part, by answer. */
export interface ValueQuestion extends Question {
  readonly values: readonly (number | null)[];
}

/** What a part draws, for the order: pessimistic quiescent current, A. */
export function currentQuestion(run: Judging, view: ScreenView): ValueQuestion {
  const kept = keptFor(run, view);
  return (kept.current ??= valueQuestion(kept, ({ pessimistic }) => pessimistic.figure('quiescentCurrent')?.value ?? null));
}

function valueQuestion(kept: Kept, value: (readings: BothReadings) => number | null): ValueQuestion {
  const values: (number | null)[] = [];
  return { values, ...question(kept, (readings) => values.push(value(readings)) - 1) };
}

interface Composed {
  readonly check: AnyCheck;
  readonly composition: AnyComposition;
  readonly circuit: string;
  readonly outcomesOnly: boolean;
}

/** A changed limit leaves it as it is. */
interface KeptComposition {
  readonly mark: string;
  readonly terms: readonly TermQuestion[];
  /** Made for limits that change: it takes room, and of all parts of a list it is too much. */
  whole: TermQuestion | null;
  /** How many limits were asked about where only outcomes are wanted. */
  limits: number;
}

/** A check put together from terms: part by part, or, where one limit after the other is asked about the few that are open, from wholes that are kept. */
function composedFor(run: Judging, kept: Kept, of: Composed): CheckQuestion {
  const { check, composition, outcomesOnly } = of;
  const { demands } = run;
  const found = compositionFor(run, kept, of);
  if (outcomesOnly) found.limits += 1;
  // What is wanted once is made in less time than it is kept.
  const isKept = outcomesOnly && found.limits > 1;
  if (!isKept) return partByPart(demands, { check, terms: found.terms, view: kept.view });
  return composedQuestion(demands, check, (found.whole ??= wholeQuestion(demands, composition, found.terms)));
}

function compositionFor({ demands }: Judging, kept: Kept, { check, composition, circuit }: Composed): KeptComposition {
  const asked = check.asked(demands);
  const mark = markOf(typeof asked === 'object' ? { ...asked, required: null, because: null } : asked, circuit);
  const before = kept.compositions.get(check.id);
  if (before?.mark === mark) return before;
  const terms = composition.names.map((name) => termQuestion((ask) => question(kept, ask), (readings) => composition.term(name, demands, readings)));
  const made = { mark, terms, whole: null, limits: 0 };
  kept.compositions.set(check.id, made);
  return made;
}

function question({ view, standIn: { readings, become } }: Kept, decide: (readings: BothReadings) => number): Question {
  return {
    tree: new DecisionTree((trait) => view.width(TRAITS[trait] ?? 'class')),
    looksAtTraits: true,
    codes: (traits) => traits,
    answer(codeOf, path) {
      become((trait) => {
        const number = TRAIT_NUMBER.get(trait) ?? 0;
        const code = codeOf(number);
        path.push({ trait: number, code });
        return view.piece(trait, code);
      });
      return decide(readings);
    },
  };
}
