import type { Problem } from '../quantities/problem.js';
import type { ExitCode } from './exit-code.js';

/** A command that ends with problems instead of a result. */
export class RequestError extends Error {
  readonly problems: readonly Problem[];
  readonly exit: ExitCode;
  /** The last line the user reads: how many problems, and that nothing was done. */
  readonly summary: string;

  constructor(problems: readonly Problem[], exit: ExitCode, summary?: string) {
    super(problems[0]?.message ?? 'request refused');
    this.problems = problems;
    this.exit = exit;
    this.summary = summary ?? `${problems.length} problem${problems.length === 1 ? '' : 's'}, nothing was run. (exit ${exit})`;
  }
}

/** An answer has one form. */
export function twoForms({ json, csv }: { readonly json?: boolean; readonly csv?: boolean }): Problem[] {
  return json === true && csv === true ? [commandProblem('C106', '--json and --csv: an answer has one form', { fix: 'one of the two', path: '--csv' })] : [];
}

/** One problem of the command line. */
export function commandProblem(code: string, message: string, more: { readonly fix?: string; readonly path?: string } = {}): Problem {
  const place = more.path === undefined ? {} : { place: { path: more.path } };
  return { code, severity: 'error', message, ...(more.fix === undefined ? {} : { fix: more.fix }), ...place };
}
