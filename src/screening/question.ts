import { CHECKS } from '../checks/index.js';
import { CHECK_IDS } from '../demands/index.js';
import { TRAIT_NUMBER, type ScreenView } from '../parts/screen-view.js';
import { TRAITS } from '../parts/traits.js';
import type { Readings } from '../parts/readings.js';
import { decisionTree, type DecisionTree, type Step } from './decision-tree.js';
import { digests, type Digests } from './digest.js';
import { notBuilt, verdictOn, type Judging } from './judge.js';
import { plainText } from './plain-text.js';
import { standIn } from './stand-in.js';

/** Something asked of every part of a view, with the answers found so far. */
export interface Question {
  readonly tree: DecisionTree;
  /** Answers the part whose codes these are; what it looked at goes to `path`. */
  answer(codeOf: (trait: number) => number, path: Step[]): number;
}

/** A check asked of every part. */
export interface CheckQuestion extends Question {
  readonly check: string;
  readonly digests: Digests;
}

type Both = readonly [Readings, Readings];

/** Every check the stage asks for, in the order of verdicts. What was found out for the stage asked before serves again where it asks the same. */
export function checkQuestions(run: Judging, view: ScreenView): CheckQuestion[] {
  const { demands, strict, classes } = run;
  const surroundings = plainText([demands.operating, strict, [...classes]]);
  const known = KEPT.get(view) ?? new Map<string, KeptQuestion>();
  KEPT.set(view, known);
  const built = CHECKS.filter((check) => check.isAsked(demands)).map((check) => {
    const text = plainText(check.asks(demands));
    const key = text === null || surroundings === null ? null : surroundings + text;
    const before = known.get(check.id);
    if (key !== null && before?.key === key) return before.question;
    const question = checkQuestion(run, view, { check: check.id, verdict: (readings: Both) => verdictOn(check, demands, readings) });
    if (key === null) known.delete(check.id);
    else known.set(check.id, { key, question });
    return question;
  });
  const unbuilt = demands.unbuilt.map((demand) => checkQuestion(run, view, { check: demand.check, verdict: () => notBuilt(demand) }));
  const order = ({ check }: CheckQuestion): number => (CHECK_IDS as readonly string[]).indexOf(check);
  return [...built, ...unbuilt].sort((a, b) => order(a) - order(b));
}

interface KeptQuestion {
  /** What the stage asked and in which surroundings, as text. */
  readonly key: string;
  readonly question: CheckQuestion;
}

/** The last question of each check about a view: a changed limit redoes the checks it touches, and no others. */
const KEPT = new WeakMap<ScreenView, Map<string, KeptQuestion>>();

interface Asked {
  readonly check: string;
  readonly verdict: (readings: Both) => ReturnType<typeof verdictOn>;
}

function checkQuestion(run: Judging, view: ScreenView, { check, verdict }: Asked): CheckQuestion {
  const found = digests(run.demands.operating.nominalSupply);
  return { check, digests: found, ...question(run, view, (readings) => found.add(verdict(readings))) };
}

/** A number read off the pessimistic readings of every part, by answer. */
export function valueQuestion(run: Judging, view: ScreenView, value: (worst: Readings) => number | null): Question & { readonly values: readonly (number | null)[] } {
  const values: (number | null)[] = [];
  return { values, ...question(run, view, ([worst]) => values.push(value(worst)) - 1) };
}

function question(run: Judging, view: ScreenView, decide: (readings: Both) => number): Question {
  const { demands, strict, classes } = run;
  const { readings, become } = standIn(view.tier, { operating: demands.operating, strict, classes });
  return {
    tree: decisionTree((trait) => view.width(TRAITS[trait] ?? 'class')),
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
