import { shortlist, shortlistJson, withWaysOut } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import { withCatalog } from './catalog-file.js';
import { commandContext } from './command-context.js';
import { exitOfCounts } from './exit-code.js';
import { judgingInput, type JudgingOptions } from './judging-input.js';
import { newFileProblem, refusedFile } from './new-file.js';
import { changingOf } from './rerun.js';
import { commandProblem, twoForms } from './request-error.js';
import { DEFAULT_TOP, type Outcome, type Session } from './session.js';
import { readStageOf } from './stage-input.js';

export interface ShortlistOptions extends JudgingOptions {
  /** What to look up instead of the list itself. */
  readonly lookups?: boolean;
  /** With it: a new file for the sheet to fill in. */
  readonly output?: string;
  readonly force?: boolean;
}

/** `railfit shortlist [STAGE]`: derive, judge the whole catalog, rank, explain; or what to look up. */
export async function runShortlist(session: Session, operand: string | undefined, options: ShortlistOptions): Promise<Outcome> {
  const { spec, stage, file, given } = await readStageOf(operand, { ...options, already: [...(options.already ?? []), ...twoForms(options), ...sheetProblems(options)] });
  return withCatalog(session, options, async (catalog) => {
    const { source, asking } = judgingInput(catalog, options);
    const report = withWaysOut(shortlist(stage, source, asking), source, changingOf(spec, given));
    const exit = exitOfCounts(report.counts);
    if (options.json === true && options.lookups !== true) return { text: shortlistJson(report, { top: options.top ?? DEFAULT_TOP, all: options.all === true }), exit };
    const { told } = await import('./shortlist-told.js');
    return { ...told(report, source, { session, options, context: commandContext(file, options) }), exit };
  });
}

function sheetProblems({ lookups, output, force, csv }: ShortlistOptions): Problem[] {
  const alone = lookups === true ? [] : [...(output === undefined ? [] : ['-o']), ...(force === undefined ? [] : ['--force'])];
  const problems = alone.map((option) => commandProblem('C106', `${option} belongs to --lookups`, { fix: 'railfit shortlist stage.yaml --lookups -o lookups.csv', path: option }));
  if (lookups === true && csv === true) problems.push(commandProblem('C106', '--lookups and --csv: the table of look-ups is the sheet to fill in', { fix: '--lookups -o lookups.csv', path: '--csv' }));
  const taken = lookups !== true || output === undefined ? null : newFileProblem(output, force === true);
  if (taken !== null && problems.length === 0) throw refusedFile(taken);
  return problems;
}
