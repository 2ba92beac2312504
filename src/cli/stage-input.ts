import { readFile } from 'node:fs/promises';
import { buildStage, readStage, type Override, type Stage, type StageSpec } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import { EXIT } from './exit-code.js';
import { commandProblem, RequestError } from './request-error.js';
import { decodeStage } from './decode-stage.js';
import type { GivenStage } from './rerun.js';
import { readStandardInput, STDIN, STDIN_NAME } from './standard-input.js';

/** The options that override the stage file. */
export interface StageOptions {
  readonly supply?: string;
  readonly topology?: string;
  readonly gain?: string;
  readonly reference?: string;
  readonly temperature?: string;
  readonly input?: string;
  readonly frequency?: string;
  readonly load?: string;
  readonly set?: readonly string[];
  /** What was wrong with the command line before the stage was looked at; reported together with it. */
  readonly already?: readonly Problem[];
}

/** A stage with the text it was read from. */
export interface StageRead extends StageText {
  readonly spec: StageSpec;
  readonly stage: Stage;
  /** What it takes to read it again under further options. */
  readonly given: GivenStage;
}

/** What a stage is read from: a file's text (null: options say it all), its name, and the options over it. */
export interface StageText {
  readonly text: string | null;
  readonly file: string | null;
  readonly overrides: readonly Override[];
}

const SHORT: readonly (readonly [Exclude<keyof StageOptions, 'set' | 'already'>, string])[] = [
  ['topology', 'topology'],
  ['supply', 'supply'],
  ['gain', 'gain'],
  ['reference', 'reference'],
  ['input', 'signal.input'],
  ['frequency', 'signal.frequency'],
  ['load', 'load'],
  ['temperature', 'temperature'],
];

/** Options as overrides of stage fields, and what was wrong with them. */
export function overridesOf(options: StageOptions): { overrides: Override[]; problems: Problem[] } {
  const overrides: Override[] = [];
  const problems: Problem[] = [];
  for (const [option, path] of SHORT) {
    const text = options[option];
    if (text !== undefined) overrides.push({ path, text, option: `--${option}` });
  }
  for (const pair of options.set ?? []) {
    const at = pair.indexOf('=');
    if (at > 0) overrides.push({ path: pair.slice(0, at).trim(), text: pair.slice(at + 1).trim(), option: `--set ${pair.slice(0, at).trim()}` });
    else problems.push(commandProblem('C105', `--set ${pair}: no field and value`, { fix: '--set limits.dcError="20 mV"', path: '--set' }));
  }
  return { overrides, problems };
}

/** Reads the stage of a command: a file, `-` for standard input, or options alone. Everything wrong is reported at once. */
export async function readStageOf(operand: string | undefined, options: StageOptions): Promise<StageRead> {
  return stageFrom(await stageText(operand, options), options);
}

/** The text of a command's stage, its name and the options over it. */
export async function stageText(operand: string | undefined, options: StageOptions): Promise<StageText> {
  const { overrides } = overridesOf(options);
  if (operand === undefined) return { text: null, file: null, overrides };
  return { text: await textOf(operand), file: operand === STDIN ? STDIN_NAME : operand, overrides };
}

/** The stage that text and options describe, or a refusal with everything that is wrong. */
export function stageFrom({ text, file, overrides }: StageText, options: StageOptions): StageRead {
  const before = [...(options.already ?? []), ...overridesOf(options).problems];
  if (text === null && overrides.length === 0) throw refused([...before, noStage()]);
  const read = readStage(text, { overrides, ...(file === null ? {} : { file }) });
  if (!read.ok) throw refused([...before, ...read.problems]);
  const built = buildStage(read.spec);
  if (!built.ok) throw refused([...before, ...built.problems.map((problem) => inFile(problem, file))]);
  if (before.length > 0) throw refused(before);
  return { spec: read.spec, stage: built.stage, file, text, overrides, given: { text, overrides } };
}

function refused(problems: readonly Problem[]): RequestError {
  return new RequestError(problems, EXIT.request);
}

function inFile(problem: Problem, file: string | null): Problem {
  if (file === null || problem.place?.line === undefined) return problem;
  return { ...problem, place: { ...problem.place, file } };
}

function noStage(): Problem {
  return commandProblem('C103', 'no stage: neither a file nor options that describe one', { fix: 'railfit shortlist stage.yaml, or --topology follower --supply "5 V" --input "1..4 V"' });
}

async function textOf(operand: string): Promise<string> {
  try {
    return decodeStage(operand === STDIN ? await readStandardInput() : await readFile(operand), operand === STDIN ? STDIN_NAME : operand);
  } catch (error) {
    if (error instanceof RequestError) throw error;
    throw new RequestError([unreadable(operand, error)], EXIT.surroundings, `The stage could not be read. (exit ${EXIT.surroundings})`);
  }
}

/** A file that cannot be read, in words. */
export function unreadable(file: string, error: unknown): Problem {
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  const reasons: Record<string, string> = { ENOENT: 'no such file', EISDIR: 'it is a folder', EACCES: 'no permission to read it', EPERM: 'no permission to read it' };
  return commandProblem('E502', `${file}: ${reasons[code] ?? `cannot be read (${code})`}`, { fix: 'check the path', path: file });
}
