import type { Known, Problem } from '../../index.js';
import { News } from './news.js';
import { problemsOf } from './judge-answer.js';
import { QUESTIONS } from './questions.js';
import type { Answers, Choice, Question } from './question.js';

/** Typed instead of an answer: return to the question before. */
export const BACK = 'back';

/** Whoever puts the questions: a terminal, or a test. */
export interface Asker {
  /** The text that was typed, once `refuse` has nothing against it. */
  text(asking: { readonly words: string; readonly suggested: string | null; readonly refuse: (text: string) => readonly Problem[] }): Promise<string>;
  choose(asking: { readonly words: string; readonly choices: readonly Choice[]; readonly canGoBack: boolean }): Promise<string>;
  tell(known: Known): void;
}

/** What is known beforehand, and what is asked after the stage. */
export interface Around {
  readonly given: Answers;
  readonly last: readonly Question[];
}

/** Asks every question that the answers before it call for, each until its answer is right. */
export async function interview(asker: Asker, { given, last }: Around = { given: new Map(), last: [] }): Promise<Answers> {
  const questions = [...QUESTIONS, ...last];
  const answers = new Map(given);
  const asked: string[] = [];
  const news = new News();
  for (;;) {
    const question = questions.find((one) => !answers.has(one.id) && one.asked?.(answers) !== false);
    if (question === undefined) return answers;
    const text = (await put(question, { answers, asker, canGoBack: asked.length > 0 })).trim();
    if (text === BACK) {
      answers.delete(asked.pop() ?? '');
      continue;
    }
    answers.set(question.id, text);
    asked.push(question.id);
    const known = news.after(question, answers);
    if (known !== null) asker.tell(known);
  }
}

interface Putting {
  readonly answers: Answers;
  readonly asker: Asker;
  readonly canGoBack: boolean;
}

function put(question: Question, { answers, asker, canGoBack }: Putting): Promise<string> {
  if (question.choices !== undefined) return asker.choose({ words: question.words, choices: question.choices, canGoBack });
  const refuse = (text: string): readonly Problem[] => (text.trim() === BACK && canGoBack ? [] : problemsOf(question, text.trim(), answers).map(orBack));
  return asker.text({ words: wordsOf(question, answers), suggested: question.suggested?.(answers) ?? null, refuse });
}

/** A contradiction may be the fault of an answer before this one. */
function orBack(problem: Problem): Problem {
  if (!problem.code.startsWith('S2')) return problem;
  return { ...problem, fix: `${problem.fix === undefined ? '' : `${problem.fix}\n`}or ${BACK}, to change an answer before this one` };
}

/** The question; in a line of its own what an answer looks like and what Enter alone means, and there the answer is typed. */
function wordsOf(question: Question, answers: Answers): string {
  const without = question.without?.(answers) ?? null;
  const hints = [...(question.example === undefined ? [] : [question.example]), ...(without === null ? [] : [`Enter: ${without}`])];
  return hints.length === 0 ? question.words : `${question.words}\n  [${hints.join('; ')}]`;
}
