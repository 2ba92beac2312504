import { input, select } from '@inquirer/prompts';
import { asciiText, renderKnown, renderRefusal, type Style } from '../../index.js';
import { BACK, type Asker } from './interview.js';

/** What the questions are put on: the terminal's talk, and what ends them early. */
export interface Talk {
  readonly output: NodeJS.WritableStream;
  readonly style: Style;
  readonly signal: AbortSignal;
}

/** Questions on a terminal, drawn by a prompt library. */
export function terminalAsker(talk: Talk): Asker {
  const { output, style, signal } = talk;
  const context = { output, signal };
  const theme = themeFor(style);
  const spelled = (text: string): string => (style.ascii ? asciiText(text) : text);
  return {
    text: ({ words, suggested, refuse }) =>
      input({
        message: spelled(words),
        theme,
        ...(suggested === null ? {} : { default: suggested }),
        validate: (text) => {
          const problems = refuse(text);
          return problems.length === 0 || renderRefusal(problems, style);
        },
      }, context),
    choose: ({ words, choices, canGoBack }) =>
      select({
        message: spelled(words),
        theme,
        choices: [...choices.map((choice) => ({ value: choice.value, name: spelled(choice.words) })), ...(canGoBack ? [{ value: BACK, name: 'back to the question before' }] : [])],
      }, context),
    tell: (known) => void output.write(`${renderKnown(known, style)}\n`),
  };
}

/** True for what the library throws when the terminal ends the questions. */
export function isInterruption(error: unknown): boolean {
  return error instanceof Error && ['ExitPromptError', 'AbortPromptError'].includes(error.name);
}

/** Plain marks, and colour only where the rest of the program has it. */
function themeFor({ colour, ascii }: Style) {
  const plain = (text: string): string => text;
  const painted = (code: number) => (text: string): string => (colour ? `\u001b[${code}m${text}\u001b[39m` : text);
  return {
    prefix: { idle: '?', done: '>' },
    icon: { cursor: '>' },
    style: {
      message: plain,
      answer: painted(36),
      highlight: painted(36),
      error: plain,
      defaultAnswer: (text: string): string => `(Enter: ${text})`,
      keysHelpTip: (): string => (ascii ? 'arrow keys, then Enter' : '↑↓, then Enter'),
    },
  };
}
