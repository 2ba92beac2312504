import { lookupsJson, renderLookups, renderShortlist, shortlist, shortlistCsv, shortlistJson, withLookups, withWaysOut, type Report } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import { withCatalog } from './catalog-file.js';
import { commandContext } from './command-context.js';
import { exitOfCounts } from './exit-code.js';
import { judgingInput, type JudgingOptions } from './judging-input.js';
import { lookupSheet } from './lookup-sheet.js';
import { newFileProblem, refusedFile, writeNewFile } from './new-file.js';
import { changingOf } from './rerun.js';
import { commandProblem, twoForms } from './request-error.js';
import { DEFAULT_TOP, styleFor, type Outcome, type Session } from './session.js';
import { readStageOf } from './stage-input.js';

export interface ShortlistOptions extends JudgingOptions {
  /** What to look up instead of the list itself. */
  readonly lookups?: boolean;
  /** With it: a new file for the sheet to fill in. */
  readonly output?: string;
  readonly force?: boolean;
}

/** With more undecided parts of the list than this the end of a shortlist does not search for what would decide them. */
const MOST_SEARCHED = 30;

/** `railfit shortlist [STAGE]`: derive, judge the whole catalog, rank, explain; or what to look up. */
export async function runShortlist(session: Session, operand: string | undefined, options: ShortlistOptions): Promise<Outcome> {
  const { spec, stage, file, given } = await readStageOf(operand, { ...options, already: [...(options.already ?? []), ...twoForms(options), ...sheetProblems(options)] });
  return withCatalog(session, options, (catalog) => {
    const { source, asking } = judgingInput(catalog, options);
    const report = withWaysOut(shortlist(stage, source, asking), source, changingOf(spec, given));
    const exit = exitOfCounts(report.counts);
    const context = commandContext(file, options);
    if (options.lookups === true) return { ...lookedUp(withLookups(report, source), session, { options, context }), exit };
    if (options.json === true) return { text: shortlistJson(report, { top: options.top ?? DEFAULT_TOP, all: options.all === true }), exit };
    if (options.csv === true) return { text: shortlistCsv(report), exit };
    const told = report.undecided.filter(({ part }) => part.tier === 'approved').length > MOST_SEARCHED ? report : withLookups(report, source);
    return { text: renderShortlist(told, styleFor(session, options), context), exit };
  });
}

interface Told {
  readonly options: ShortlistOptions;
  readonly context: ReturnType<typeof commandContext>;
}

function lookedUp(report: Report, session: Session, { options, context }: Told): Pick<Outcome, 'text'> {
  const written = writeSheetOf(report, options);
  if (options.json === true) return { text: lookupsJson(report, written) };
  return { text: renderLookups(report, styleFor(session, options), { context, written }) };
}

/** Nothing is written when there is nothing to fill in. */
function writeSheetOf({ lookups }: Report, { output, force }: ShortlistOptions): string | null {
  if (output === undefined || lookups === undefined || lookups.settled.parts === 0) return null;
  writeNewFile(output, lookupSheet(lookups), force === true);
  return output;
}

function sheetProblems({ lookups, output, force, csv }: ShortlistOptions): Problem[] {
  const alone = lookups === true ? [] : [...(output === undefined ? [] : ['-o']), ...(force === undefined ? [] : ['--force'])];
  const problems = alone.map((option) => commandProblem('C106', `${option} belongs to --lookups`, { fix: 'railfit shortlist stage.yaml --lookups -o lookups.csv', path: option }));
  if (lookups === true && csv === true) problems.push(commandProblem('C106', '--lookups and --csv: the table of look-ups is the sheet to fill in', { fix: '--lookups -o lookups.csv', path: '--csv' }));
  const taken = lookups !== true || output === undefined ? null : newFileProblem(output, force === true);
  if (taken !== null && problems.length === 0) throw refusedFile(taken);
  return problems;
}
