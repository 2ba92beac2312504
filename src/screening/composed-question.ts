import type { AnyCheck, AnyComposition } from '../checks/index.js';
import type { Demands } from '../demands/index.js';
import type { Readings } from '../parts/readings.js';
import { decideBriefly, type BriefVerdict } from '../verdicts/decide.js';
import { byTree, growing } from './buffers.js';
import { DecisionTree, type Step } from './decision-tree.js';
import { digests } from './digest.js';
import type { CheckQuestion, Question } from './question.js';
import type { BothReadings } from './remembering.js';

/** A term of a composed check, worked out once for every distinct set of figures it looks at. */
export interface TermQuestion extends Question {
  /** By answer, in the pessimistic and the optimistic outlook: one and the same object where they do not differ. */
  readonly worst: readonly unknown[];
  readonly best: readonly unknown[];
}

/** `asking` makes a question of what is to be found out from a part's readings. */
export function termQuestion(asking: (find: (readings: BothReadings) => number) => Question, term: (readings: Readings) => unknown): TermQuestion {
  const worst: unknown[] = [];
  const best: unknown[] = [];
  const asked = asking(({ pessimistic, optimistic, differ }) => {
    const low = term(pessimistic);
    const high = differ() ? term(optimistic) : low;
    best.push(alike(low, high) ? low : high);
    return worst.push(low) - 1;
  });
  return { ...asked, worst, best };
}

/** Equal in every member; functions are alike when they are the same one. */
function alike(one: unknown, other: unknown): boolean {
  if (Object.is(one, other)) return true;
  if (typeof one !== 'object' || typeof other !== 'object' || one === null || other === null) return false;
  const [members, others] = [one as Readonly<Record<string, unknown>>, other as Readonly<Record<string, unknown>>];
  const [names, otherNames] = [Object.keys(members), Object.keys(others)];
  return names.length === otherNames.length && names.every((name, at) => name === otherNames[at] && alike(members[name], others[name]));
}

/** The whole of a composed check: made once for every combination of answers of its terms. */
export function wholeQuestion(demands: Demands, { names, whole }: AnyComposition, terms: readonly TermQuestion[]): TermQuestion {
  const looked = lookedAt(terms);
  const known = Object.fromEntries(names.map((name, number) => [name, () => looked.get(number)]));
  const [worst, best]: [unknown[], unknown[]] = [[], []];
  return {
    worst, best,
    // How many answers a term will have is not known beforehand.
    tree: new DecisionTree(() => null),
    looksAtTraits: false,
    codes(traits) {
      const segments = terms.map((term) => ({ code: traits, columns: null, grow: growing(term, traits) }));
      return (number, at) => {
        const [term, segment] = [terms[number], segments[number]];
        return term === undefined || segment === undefined ? 0 : term.tree.answer(segment, at);
      };
    },
    answer(codeOf, path) {
      looked.start(codeOf, path);
      const pessimistic = whole(demands, known, BRIEF);
      best.push(looked.differ() ? whole(demands, known, BRIEF) : pessimistic);
      return worst.push(pessimistic) - 1;
    },
  };
}

const BRIEF = { brief: true } as const;

/** A composed check: each of its wholes is held against the limit when a part turns up that has it. */
export function composedQuestion(demands: Demands, check: AnyCheck, whole: TermQuestion): CheckQuestion {
  const findingOf = (one: unknown) => check.composition?.finding(demands, one, BRIEF) ?? null;
  const verdictOf = (answer: number): BriefVerdict | null => {
    const [low, high] = [whole.worst[answer], whole.best[answer]];
    const pessimistic = findingOf(low);
    const optimistic = low === high ? pessimistic : findingOf(high);
    return pessimistic === null || optimistic === null ? null : decideBriefly(check, pessimistic, optimistic);
  };
  const found = digests(demands.operating.nominalSupply, verdictOf);
  return { check: check.id, digests: found, settle: (answer) => found.settle(answer), ...byTree(whole) };
}

/** The terms of one part after the other, in one outlook and then in the other; what is asked for goes to the path. */
function lookedAt(terms: readonly TermQuestion[]) {
  const answers = new Int32Array(terms.length);
  let outlook: 'worst' | 'best' = 'worst';
  let isSame = true;
  let find: (number: number) => number = () => 0;
  return {
    start(codeOf: (number: number) => number, path: Step[]): void {
      answers.fill(-1);
      [outlook, isSame] = ['worst', true];
      find = (number) => {
        const answer = codeOf(number);
        answers[number] = answer;
        path.push({ trait: number, code: answer });
        const term = terms[number];
        isSame &&= term?.worst[answer] === term?.best[answer];
        return answer;
      };
    },
    get(number: number): unknown {
      const known = answers[number] ?? -1;
      return terms[number]?.[outlook][known < 0 ? find(number) : known];
    },
    /** Goes over to the optimistic outlook, where anything looked at so far differs in it. */
    differ(): boolean {
      if (isSame) return false;
      outlook = 'best';
      return true;
    },
  };
}
