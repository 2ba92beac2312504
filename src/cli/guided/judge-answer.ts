import { buildStage, readStage, type Override, type Problem, type Stage } from '../../index.js';
import { closesCircuit, isSurrounding, QUESTIONS } from './questions.js';
import type { Answers, Question } from './question.js';

/** The texts of the stage file that the answers stand for, by dotted path. */
export function fieldsOf(answers: Answers): Map<string, string> {
  const asked = QUESTIONS.filter((question) => question.asked?.(answers) !== false);
  const filled = asked.flatMap((question): [string, string][] => {
    const text = answers.get(question.id) ?? '';
    const path = pathOf(question, text);
    return text === '' || path === null ? [] : [[path, text]];
  });
  return new Map(filled);
}

/** The stage as far as it is known; null while something is missing or wrong. */
export function stageSoFar(answers: Answers): Stage | null {
  const read = readStage(null, { overrides: overridesOf(answers) });
  if (!read.ok) return null;
  const built = buildStage(read.spec);
  return built.ok ? built.stage : null;
}

/** What is wrong with an answer in the light of those before it: as the reader of stage files says it, and what contradicts them. */
export function problemsOf(question: Question, text: string, answers: Answers): readonly Problem[] {
  if (question.refuse !== undefined) return question.refuse(text);
  if (text === '' && question.without?.(answers) == null) return missing(question, answers);
  const all = new Map([...answers, [question.id, text]]);
  const read = readStage(null, { overrides: overridesOf(all) });
  const path = pathOf(question, text);
  if (!read.ok) return read.problems.filter(({ place }) => place?.path === path);
  const built = buildStage(read.spec);
  if (built.ok) return [];
  const isClosed = isSurrounding(question) || closesCircuit(question, all);
  return built.problems.filter(({ code }) => isClosed || !OPEN_UNTIL_REFERENCE.includes(code));
}

/** Where the output lies is not known before gain and reference are. */
const OPEN_UNTIL_REFERENCE: readonly string[] = ['S201', 'S202', 'S204', 'S208'];

/** The reader's own words for what is missing, where a stage cannot do without. */
function missing(question: Question, answers: Answers): readonly Problem[] {
  const read = readStage(null, { overrides: overridesOf(answers) });
  const own = read.ok ? [] : read.problems.filter(({ place }) => place?.path === question.id);
  if (own.length > 0) return own;
  return [{ code: 'S102', severity: 'error', message: 'an answer is needed here', ...(question.example === undefined ? {} : { fix: question.example }) }];
}

function pathOf(question: Question, text: string): string | null {
  return question.field === undefined ? question.id : question.field(text);
}

function overridesOf(answers: Answers): Override[] {
  return [...fieldsOf(answers)].map(([path, text]) => ({ path, text, option: path }));
}
