import { select } from '@inquirer/prompts';
import type { Style } from '../../index.js';
import { asciiText } from '../../index.js';
import type { ListAnswer, ListOptions, ListQuestion, ListResult, RefusedList } from '../../intake/list.js';
import { readList } from '../../intake/read-list.js';

export interface Asking {
  readonly bytes: Uint8Array;
  /** With what the list was read so far. */
  readonly asked: ListOptions;
  readonly style: Style;
  /** Whoever answers: the terminal, or a test. */
  readonly choose?: Choose;
}

/** Puts one question; the answer is the index of a choice. */
export type Choose = (message: string, choices: readonly { readonly value: number; readonly name: string }[]) => Promise<number>;

/** Questions answered again and again would be a fault of the reader. */
const MOST_ROUNDS = 50;

/** Asks the open questions of a list one by one, each with three of its cells, and reads the list again with every answer. */
export async function answerQuestions(first: RefusedList, { bytes, asked, style, choose = terminal(style) }: Asking): Promise<ListResult> {
  let read: ListResult = first;
  let options = asked;
  for (let round = 0; round < MOST_ROUNDS && !read.ok; round += 1) {
    const [question] = read.questions;
    if (question === undefined) return read;
    options = withAnswer(options, await put(question, choose, style));
    read = readList(bytes, options);
  }
  return read;
}

async function put(question: ListQuestion, choose: Choose, style: Style): Promise<ListAnswer> {
  const spelled = (text: string): string => (style.ascii ? asciiText(text) : text);
  const samples = question.samples.length === 0 ? '' : `\n  cells: ${question.samples.join('   ')}`;
  const choices = question.choices.map(({ words }, value) => ({ value, name: spelled(words) }));
  const chosen = await choose(spelled(question.words + samples), choices);
  return question.choices[chosen]?.answer ?? {};
}

/** What was answered before stays; of two answers about one column the new one counts. */
function withAnswer(options: ListOptions, answer: ListAnswer): ListOptions {
  const map = [...(answer.map ?? []), ...(options.map ?? [])];
  const words = new Map([...(options.words ?? []), ...(answer.words ?? [])]);
  return { ...options, ...answer, map, words };
}

function terminal(style: Style): Choose {
  return (message, choices) => select({ message, choices, theme: { prefix: { idle: '?', done: '>' }, icon: { cursor: '>' }, style: { keysHelpTip: () => (style.ascii ? 'arrow keys, then Enter' : '↑↓, then Enter') } } }, { output: process.stderr });
}
