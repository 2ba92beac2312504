import { demandsOf, type Known } from '../../index.js';
import { stageSoFar } from './judge-answer.js';
import { CIRCUIT_SHOWS, closesCircuit, isSurrounding, QUESTIONS } from './questions.js';
import type { Answers, Question } from './question.js';

/** Remembers what was told, so that each thing is told when it becomes known or changes, and not again. */
export class News {
  readonly #told = new Set<string>();

  /** What the last answer made known; null when nothing. */
  after(question: Question, answers: Answers): Known | null {
    const closes = closesCircuit(question, answers);
    const stage = closes || isSurrounding(question) ? stageSoFar(answers) : null;
    if (stage === null) return null;
    const shown: readonly string[] = [...(question.shows ?? []), ...(closes ? CIRCUIT_SHOWS : [])];
    const demands = demandsOf(stage).demands.filter(({ check, required }) => shown.includes(check) && this.#isNew(`${check} ${String(required)}`));
    const assumptions = stage.assumptions.filter((sentence) => !isPending(sentence, answers) && this.#isNew(sentence));
    const moves = this.#isNew(JSON.stringify([stage.outputNominal, stage.output, stage.commonMode]));
    return moves || demands.length + assumptions.length > 0 ? { stage: moves ? stage : null, demands, assumptions } : null;
  }

  #isNew(what: string): boolean {
    const isNew = !this.#told.has(what);
    this.#told.add(what);
    return isNew;
  }
}

/** An assumption that a question still to come may replace. */
function isPending(sentence: string, answers: Answers): boolean {
  return QUESTIONS.some(({ id, pending = [] }) => !answers.has(id) && pending.some((start) => sentence.startsWith(start)));
}
