import { CommanderError } from 'commander';
import { problemsJson, renderProblems } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import { suggest } from '../quantities/suggest.js';
import { EXIT } from './exit-code.js';
import { reportFault } from './fault.js';
import { commandProblem, RequestError } from './request-error.js';
import type { Process } from './run.js';
import { styleFor, type CommonOptions, type Session } from './session.js';
import type { ColourWish } from './terminal.js';

/** The command line that failed. */
export interface Failure {
  readonly argv: readonly string[];
  readonly session: Session;
  readonly world: Process;
  readonly names: readonly string[];
}

/** Answers what went wrong, on stdout as JSON where that was asked for, and gives the exit code. Loaded only then. */
export function answerFor(error: unknown, failure: Failure): number {
  if (error instanceof RequestError) return refuse(error, failure);
  if (!(error instanceof CommanderError)) return reportFault(error, failure.argv, failure.session);
  return refuse(new RequestError([fromCommander(error, failure)], EXIT.request), failure);
}

function refuse(error: RequestError, { argv, session, world }: Failure): number {
  if (asksForJson(argv)) {
    world.write('stdout', problemsJson(error.problems));
    return error.exit;
  }
  world.write('stderr', renderProblems(error.problems, styleFor(session, colourOf(argv), 'stderr'), error.summary));
  return error.exit;
}

/** `--json` behind `--` is an operand. */
function asksForJson(argv: readonly string[]): boolean {
  const end = argv.indexOf('--');
  return argv.slice(0, end < 0 ? argv.length : end).includes('--json');
}

/** The options that matter for how problems are written, read from the raw words since parsing may have failed. */
function colourOf(argv: readonly string[]): CommonOptions {
  const at = argv.findIndex((word) => word === '--color' || word.startsWith('--color='));
  const said = at < 0 ? undefined : (argv[at]?.split('=')[1] ?? argv[at + 1]);
  const color: ColourWish = said === 'always' || said === 'never' ? said : 'auto';
  return { color, ascii: argv.includes('--ascii') };
}

function fromCommander(error: CommanderError, { argv, names }: Failure): Problem {
  if (error.code === 'commander.help') return noCommand(argv, names);
  const plain = error.message.replace(/^error: /u, '').replace(/\.$/u, '');
  const value = /^option '(?:-\w, )?(--[\w-]+)[^']*' argument '(.*)' is invalid\.\s*(.*)$/su.exec(plain);
  if (value !== null) return commandProblem('C104', `${value[1] ?? ''} ${value[2] ?? ''}: ${(value[3] ?? '').replace(/^Allowed choices are /u, 'accepted: ')}`, { fix: `railfit help ${argv[0] ?? ''}`.trim(), path: value[1] ?? '' });
  if (error.code !== 'commander.unknownCommand') return commandProblem('C104', plain, { fix: `railfit help ${argv[0] ?? ''}`.trim() });
  const word = argv.find((one) => !one.startsWith('-')) ?? '';
  const near = suggest(word, names);
  return commandProblem('C100', `unknown command ${word}`, { fix: near.length === 0 ? `one of ${names.join(', ')}` : `did you mean ${near.join(', ')}?` });
}

/** Options alone. */
function noCommand(argv: readonly string[], names: readonly string[]): Problem {
  return commandProblem('C100', `no command: ${argv.join(' ')} says how, not what`, { fix: `one of ${names.join(', ')}` });
}
