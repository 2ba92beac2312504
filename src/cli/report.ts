import { basename } from 'node:path';
import { reportCsv, reportJson, reportMarkdown, shortlist, type Review, type ReviewedStage, type Symbols } from '../index.js';
import type { Catalog } from '../catalog/index.js';
import type { Problem } from '../quantities/problem.js';
import { withCatalog } from './catalog-file.js';
import { chosenFor, type ChoiceOptions } from './chosen.js';
import { EXIT } from './exit-code.js';
import { judgingInput } from './judging-input.js';
import { newFileProblem, writeNewFile } from './new-file.js';
import { pageOf, sha256Of } from './page-file.js';
import { reportCommand } from './report-command.js';
import { readReviewStages, type ReviewInput } from './report-stages.js';
import { commandProblem } from './request-error.js';
import { timeOf } from './report-time.js';
import { reviewFigures } from './review-figures.js';
import { DEFAULT_TOP, type Outcome, type Session } from './session.js';
import { VERSION } from './version.js';

export const FORMATS = ['html', 'md', 'csv'] as const;

export interface ReportOptions extends ChoiceOptions {
  readonly output?: string;
  readonly force?: boolean;
  readonly format?: (typeof FORMATS)[number];
  readonly symbols?: Symbols;
  readonly time?: string;
}

/** `railfit report STAGE… -o FILE`: the design review of one stage or several, as a page, for a pull request, or as a table. */
export async function runReport(session: Session, operands: readonly string[], options: ReportOptions): Promise<Outcome> {
  const { time, problem: timeProblem } = timeOf(options, session.env);
  const already = [...(options.already ?? []), ...requestProblems(operands, options), ...(timeProblem === null ? [] : [timeProblem])];
  const inputs = await readReviewStages(operands, { ...options, already });
  return withCatalog(session, options, (catalog) => {
    const made = reviewOf({ inputs, catalog, options, time });
    for (const note of made.notes) session.tell(note);
    const text = textOf(made.review, options);
    const { output } = options;
    if (output !== undefined) writeNewFile(output, text, options.force === true);
    const talk = output === undefined ? {} : { talk: `wrote ${output}${(options.format ?? 'html') === 'html' ? `; railfit verify ${output} judges it again` : ''}\n` };
    return { text: options.json === true ? reportJson(made.review) : output === undefined ? text : '', exit: EXIT.yes, ...talk };
  });
}

function requestProblems(operands: readonly string[], { output, force, format, json, part }: ReportOptions): Problem[] {
  const file = output === undefined ? null : newFileProblem(output, force === true);
  return [
    ...(file === null ? [] : [file]),
    ...(json === true && format !== undefined && output === undefined ? [commandProblem('C106', '--json and --format: stdout has one form', { fix: 'one of the two, or -o FILE for the format', path: '--format' })] : []),
    ...(part !== undefined && operands.length > 1 ? [commandProblem('C106', '--part names the chosen part of one stage, and there are several', { fix: 'railfit stages add FILE --part ID keeps one for each stage', path: '--part' })] : []),
  ];
}

function textOf(review: Review, { format, json, output }: ReportOptions): string {
  if (json === true && output === undefined) return '';
  if (format === 'md') return reportMarkdown(review);
  return format === 'csv' ? reportCsv(review) : pageOf(review);
}

interface Making {
  readonly inputs: readonly ReviewInput[];
  readonly catalog: Catalog;
  readonly options: ReportOptions;
  readonly time: string;
}

function reviewOf({ inputs, catalog, options, time }: Making): { review: Review; notes: readonly string[] } {
  const { source, asking } = judgingInput(catalog, options);
  const notes: string[] = [];
  const stages = inputs.map(({ file, text, changes, spec, stage }): ReviewedStage => {
    const report = shortlist(stage, source, asking);
    const { chosen, origin, note } = chosenFor({ file, inFile: spec.part ?? null, report, source, catalog, options });
    if (note !== null) notes.push(note);
    return { file, text, sha256: text === null ? null : sha256Of(text), changes, chosen, report: { ...report, origin }, ...reviewFigures({ spec, stage, given: { text, overrides: changes }, source, asking, chosen }) };
  });
  const { output, symbols = 'iec', top = DEFAULT_TOP, all = false } = options;
  const command = reportCommand({ files: inputs.flatMap(({ file }) => (file === null ? [] : [file])), options, time });
  return { review: { stages, name: output === undefined ? null : basename(output), time, tool: VERSION, command, symbols, top, all }, notes };
}
