import { isatty } from 'node:tty';
import { asciiText, draftFile, type StageSpec, type Topology } from '../../index.js';
import { askProblem, wantedOf, type DraftOptions } from '../draft.js';
import { EXIT } from '../exit-code.js';
import { newFileProblem, refusedFile, writeNewFile } from '../new-file.js';
import { styleFor, type Outcome, type Session } from '../session.js';
import { interview, type Asker } from './interview.js';
import { fieldsOf } from './judge-answer.js';
import type { Answers, Question } from './question.js';

/** `railfit draft --ask`: asks in the engineer's words, tells what becomes known, ends with a stage file and its shortlist. */
export async function runAsk(session: Session, word: string | undefined, options: DraftOptions): Promise<Outcome> {
  if (!isatty(0) || !session.stderr.isTTY) throw askProblem('--ask asks on a terminal, and this is none');
  const given = givenBy(word, options);
  const file = options.output === undefined ? null : newFileProblem(options.output, options.force === true);
  if (file !== null) throw refusedFile(file);
  const answers = await asked(session, { given, options });
  if (answers === null) return { text: '', talk: INTERRUPTED, exit: EXIT.interrupted };
  const made = options.output ?? answers.get('file') ?? '';
  writeNewFile(made, fileText(answers, options), options.force === true);
  session.tell(`\nwrote ${made}\n`);
  const { runShortlist } = await import('../shortlist.js');
  const { text, talk } = await runShortlist(session, made, options);
  return { text, ...(talk === undefined ? {} : { talk }), exit: EXIT.yes };
}

const INTERRUPTED = `\ninterrupted: nothing was written (exit ${EXIT.interrupted})\n`;
const HOW = 'Each answer is checked as it is given; back returns to the question before.\nCtrl-C ends, and nothing is written before the last answer.\n';

/** What the command line says already. */
function givenBy(word: string | undefined, options: DraftOptions): Map<string, string> {
  if (word !== undefined) wantedOf(word, options);
  return new Map([...(word === undefined ? [] : [['topology', word] as const]), ...(options.ac === true ? [['signal.coupling', 'ac'] as const] : [])]);
}

/** The answers; null when the questions were broken off. */
async function asked(session: Session, { given, options }: { given: Answers; options: DraftOptions }): Promise<Answers | null> {
  const { isInterruption, terminalAsker } = await import('./prompts.js');
  const style = styleFor(session, options, 'stderr');
  const ended = new AbortController();
  const stop = (): void => { ended.abort(); };
  // A signal from outside or between two questions; and a terminal that is gone, after which nothing would ever answer.
  process.prependListener('SIGINT', leave);
  process.once('beforeExit', stop);
  session.tell(HOW);
  try {
    const asker: Asker = terminalAsker({ output: process.stderr, style, signal: ended.signal });
    return await interview(asker, { given, last: options.output === undefined ? [fileQuestion(options.force === true)] : [] });
  } catch (error) {
    if (isInterruption(error)) return null;
    throw error;
  } finally {
    process.removeListener('SIGINT', leave);
    process.removeListener('beforeExit', stop);
  }
}

/** Ends at once, with the cursor shown again. */
function leave(): void {
  process.stderr.write(`\u001b[?25h${INTERRUPTED}`);
  process.exit(EXIT.interrupted);
}

function fileQuestion(force: boolean): Question {
  return {
    id: 'file',
    words: 'Which file shall it be written to?',
    suggested: fileNameOf,
    refuse: (file) => [newFileProblem(file, force)].filter((problem) => problem !== null),
  };
}

/** `Tank level, first amplifier` → `tank-level-first-amplifier.yaml`. */
function fileNameOf(answers: Answers): string {
  const words = (answers.get('name') || answers.get('topology') || 'stage').toLowerCase().match(/[\p{L}\p{N}]+/gu) ?? ['stage'];
  return `${words.join('-').slice(0, 60)}.yaml`;
}

function fileText(answers: Answers, options: DraftOptions): string {
  const values = fieldsOf(answers);
  const coupling = (values.get('signal.coupling') ?? 'dc') as StageSpec['signal']['coupling'];
  const text = draftFile({ topology: values.get('topology') as Topology, coupling, values });
  return options.ascii === true ? asciiText(text) : text;
}
