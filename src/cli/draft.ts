import { asciiText, document, draftFile, readStage, type Problem, type StageSpec, type Topology } from '../index.js';
import { EXIT } from './exit-code.js';
import { newFileProblem, writeNewFile } from './new-file.js';
import { commandProblem, RequestError } from './request-error.js';
import { styleFor, type CommonOptions, type Outcome, type Session } from './session.js';

export interface DraftOptions extends CommonOptions {
  /** AC-coupled. */
  readonly ac?: boolean;
  readonly ask?: boolean;
  readonly output?: string;
  readonly force?: boolean;
}

/** `railfit draft [TOPOLOGY]`: a commented stage file with every field, on stdout or in a new file; or guided entry. */
export async function runDraft(session: Session, word: string | undefined, options: DraftOptions): Promise<Outcome> {
  if (options.ask === true) return (await import('./guided/ask.js')).runAsk(session, word, options);
  const wanted = wantedOf(word ?? 'non-inverting', options);
  const text = draftFile(wanted);
  if (options.output === undefined) return { text: answer(styleFor(session, options).ascii ? asciiText(text) : text, { wanted, options }), exit: EXIT.yes };
  writeNewFile(options.output, options.ascii === true ? asciiText(text) : text, options.force === true);
  return { text: answer(text, { wanted, options }), talk: `wrote ${options.output}; next: railfit demands ${options.output}\n`, exit: EXIT.yes };
}

interface Wanted {
  readonly topology: Topology;
  readonly coupling: StageSpec['signal']['coupling'];
}

/** Refused by the reader of stage files, in its words: unknown topologies, and AC coupling where there is none. */
export function wantedOf(word: string, { ac, output, force }: DraftOptions): Wanted {
  const coupling = ac === true ? 'ac' : 'dc';
  const read = readStage(null, { overrides: [{ path: 'topology', text: word, option: 'topology' }, ...(ac === true ? [{ path: 'signal.coupling', text: coupling, option: '--ac' }] : [])] });
  const own = read.ok ? [] : read.problems.filter(({ place }) => place?.path === 'topology' || place?.path === '--ac');
  const file = output === undefined ? null : newFileProblem(output, force === true);
  if (own.length > 0) throw new RequestError([...own.map(asOption), ...(file === null ? [] : [file])], EXIT.request);
  return { topology: word as Topology, coupling };
}

/** `--ac` has no value to put right. */
function asOption(problem: Problem): Problem {
  if (problem.place?.path !== '--ac') return problem;
  return commandProblem(problem.code, problem.message, { fix: 'leave out --ac', path: '--ac' });
}

/** The draft itself; in JSON with what it is for; nothing when it went into a file. */
function answer(text: string, { wanted, options }: { wanted: Wanted; options: DraftOptions }): string {
  if (options.json === true) return document('draft', { ...wanted, file: options.output ?? null, text });
  return options.output === undefined ? text : '';
}

/** What guided entry refuses before the first question. */
export function askProblem(message: string): RequestError {
  return new RequestError([commandProblem('C111', message, { fix: 'railfit draft non-inverting -o stage.yaml, then edit the file' })], EXIT.request);
}
