import type { Override, Stage, StageSpec } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import { EXIT, type ExitCode } from './exit-code.js';
import { commandProblem, RequestError } from './request-error.js';
import { STDIN } from './standard-input.js';
import { overridesOf, readStageOf, type StageOptions } from './stage-input.js';

/** A stage of a review before it is judged. */
export interface ReviewInput {
  readonly file: string | null;
  readonly text: string | null;
  readonly changes: readonly Override[];
  readonly spec: StageSpec;
  readonly stage: Stage;
}

/** Reads every stage of a review; what is wrong with any of them, and with the request, is reported at once. */
export async function readReviewStages(operands: readonly string[], options: StageOptions): Promise<ReviewInput[]> {
  const problems: Problem[] = [...(options.already ?? []), ...twice(operands)];
  let exit: ExitCode = EXIT.request;
  const read: ReviewInput[] = [];
  const changes = overridesOf(options).overrides;
  for (const operand of operands.length === 0 ? [undefined] : operands) {
    try {
      const { spec, stage, file, text } = await readStageOf(operand, { ...options, already: [] });
      read.push({ spec, stage, file, text, changes });
    } catch (error) {
      if (!(error instanceof RequestError)) throw error;
      problems.push(...error.problems);
      if (error.exit === EXIT.surroundings && problems.length === error.problems.length) exit = EXIT.surroundings;
    }
  }
  if (problems.length > 0) throw new RequestError(unlike(problems), exit);
  return read;
}

function twice(operands: readonly string[]): Problem[] {
  return operands.filter((operand) => operand === STDIN).length < 2 ? [] : [commandProblem('C102', '-: standard input can be read once', { fix: 'one stage from standard input, the others as files', path: '-' })];
}

/** An option that is wrong is wrong for every stage, and told once. */
function unlike(problems: readonly Problem[]): Problem[] {
  return [...new Map(problems.map((problem) => [JSON.stringify(problem), problem])).values()];
}
