import type { Command } from 'commander';
import type { Problem } from '../quantities/problem.js';
import { suggest } from '../quantities/suggest.js';
import { EXIT } from './exit-code.js';
import { commandProblem, RequestError } from './request-error.js';

/** The operands of a command line, and the words that are neither operands nor known options. */
export interface Operands {
  readonly operands: readonly string[];
  readonly problems: readonly Problem[];
}

/** Sorts the words commander left over. `most` is how many operands the command takes. */
export function operandsOf(command: Command, most: number): Operands {
  const literal = literalWords(command);
  const operands: string[] = [];
  const problems: Problem[] = [];
  let isValue = false;
  for (const word of command.args.slice(0, command.args.length - literal.length)) {
    if (isUnknownOption(word)) problems.push(unknownOption(command, word));
    else if (word !== '--' && (!isValue || looksLikeFile(word))) operands.push(word);
    isValue = isUnknownOption(word) && !word.includes('=');
  }
  operands.push(...literal);
  const extra = operands.slice(most).map((operand) =>
    commandProblem('C102', `${operand}: ${command.name()} takes ${most === 1 ? 'one operand' : `${most} operands`}`, { fix: `railfit help ${command.name()}`, path: operand }),
  );
  return { operands: operands.slice(0, most), problems: [...problems, ...extra] };
}

/** The operands, or a refusal when anything was left over. */
export function onlyOperands(command: Command, most: number): readonly string[] {
  const { operands, problems } = operandsOf(command, most);
  if (problems.length > 0) throw new RequestError(problems, EXIT.request);
  return operands;
}

/** What stands behind `--` is an operand, whatever it looks like. */
function literalWords({ args, parent }: Command): readonly string[] {
  const { rawArgs = [] } = (parent ?? {}) as { readonly rawArgs?: readonly string[] };
  const end = rawArgs.indexOf('--');
  return end < 0 ? [] : args.slice(Math.max(0, args.length - (rawArgs.length - end - 1)));
}

const isUnknownOption = (word: string): boolean => word.length > 1 && word !== '--' && word.startsWith('-') && !/^-[\d.]/u.test(word);
/** What follows an unknown option is taken as its value, unless it is plainly the stage or the list. */
const looksLikeFile = (word: string): boolean => word === '-' || /\.(?:ya?ml|json|csv)$/iu.test(word);

function unknownOption(command: Command, option: string): Problem {
  const bare = option.split('=')[0] ?? option;
  const known = command.options.flatMap((one) => (one.long == null ? [] : [one.long]));
  const near = suggest(bare, known);
  const fix = near.length === 0 ? `railfit help ${command.name()} lists the options` : `did you mean ${near.join(', ')}?`;
  return commandProblem('C101', `unknown option ${bare}`, { fix, path: bare });
}
