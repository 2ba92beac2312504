import { buildStage, readStage, readSwept, renderSweep, sweepCsv, sweepJson, sweepOver, sweptOverride, sweptValues, type Stage, type SweepReport, type SweptField } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import { withCatalog } from './catalog-file.js';
import { EXIT } from './exit-code.js';
import { judgingInput, type JudgingOptions } from './judging-input.js';
import { commandProblem, RequestError, twoForms } from './request-error.js';
import { rerunOf } from './rerun.js';
import { styleFor, type Outcome, type Session } from './session.js';
import { readSweptStage, type SweptStage } from './swept-stage.js';

export interface SweepOptions extends JudgingOptions {
  /** `PATH=A..B`, as often as it was given. */
  readonly over?: readonly string[];
  /** How many values, both ends included. */
  readonly steps?: number;
  readonly log?: boolean;
  readonly linear?: boolean;
}

const DEFAULT_STEPS = 21;

/** `railfit sweep [STAGE] --over PATH=A..B`: what the values of one field cost. */
export async function runSweep(session: Session, operand: string | undefined, options: SweepOptions): Promise<Outcome> {
  const wrong = [...(options.already ?? []), ...twoForms(options), ...overProblems(options)];
  const swept = await readSweptStage(operand, { ...options, already: wrong });
  const { field } = swept;
  const scale = scaleOf(field, options);
  if (scale === 'log' && field.from <= 0) throw new RequestError([commandProblem('C114', `--log: even ratios need values above 0, and ${field.path} starts at ${field.from}`, { fix: '--linear', path: '--log' })], EXIT.request);
  const values = sweptValues({ from: field.from, to: field.to, steps: options.steps ?? DEFAULT_STEPS, scale });
  return withCatalog(session, options, (catalog) => {
    const { source, asking } = judgingInput(catalog, options);
    const rerun = rerunOf(swept);
    const stageAt = (value: number): Stage | string => rerun([sweptOverride(field, value)]) ?? reasonAt(swept, value);
    const answer = sweepOver(source, { values, stageAt, asking });
    if (answer.points.every(({ state }) => 'contradiction' in state)) throw new RequestError(problemsAt(swept, field.from), EXIT.request, `At none of these values of ${field.path} is this a stage. (exit ${EXIT.request})`);
    const { path, from, to, unit, kind, keeps } = field;
    const isShare = kind === 'fraction' || kind === 'share';
    const report: SweepReport = { ...answer, stage: swept.stage === null ? null : assumingThroughout(swept.stage, [field.from, field.to].map(stageAt)), over: { path, from, to, unit, isShare, scale, keeps }, asking };
    return { text: written(report, session, options), exit: EXIT.yes };
  });
}

/** What is assumed at one value of the field and not at another is no assumption of the sweep. */
function assumingThroughout(stage: Stage, ends: readonly (Stage | string)[]): Stage {
  const built = ends.filter((end) => typeof end !== 'string');
  return { ...stage, assumptions: stage.assumptions.filter((sentence) => built.every(({ assumptions }) => assumptions.includes(sentence))) };
}

function written(report: SweepReport, session: Session, options: SweepOptions): string {
  if (options.json === true) return sweepJson(report);
  return options.csv === true ? sweepCsv(report) : renderSweep(report, styleFor(session, options));
}

/** One field, and in a form that can be read; what ends it has is known with the stage. */
function overProblems({ over = [], log, linear }: SweepOptions): Problem[] {
  const [first, second] = over;
  const problems = log === true && linear === true ? [commandProblem('C106', '--log and --linear: values have one spacing', { fix: 'one of the two', path: '--log' })] : [];
  if (first === undefined) return [...problems, commandProblem('C114', 'sweep: nothing is swept', { fix: '--over supply=2.7V..5.5V', path: '--over' })];
  if (second !== undefined) return [...problems, commandProblem('C114', `--over ${second}: one field is swept at a time; ${first} is given already`, { fix: `one sweep for each, or a value of the other: --set ${second.split('=')[0] ?? ''}=…`, path: '--over' })];
  const read = readSwept(first, null);
  return read.ok ? problems : [...problems, ...read.problems];
}

/** Over a decade or more in even ratios, unless said. */
function scaleOf({ kind, from, to }: SweptField, { log, linear }: SweepOptions): 'linear' | 'log' {
  if (log === true || linear === true) return log === true ? 'log' : 'linear';
  return kind !== 'temperature' && kind !== 'ratio' && from > 0 && to >= 10 * from ? 'log' : 'linear';
}

/** Why there is no stage at this value: the first thing that is wrong, and how much more. */
function reasonAt(swept: SweptStage, value: number): string {
  const [first, ...others] = problemsAt(swept, value);
  return `${first?.message ?? 'it contradicts itself'}${others.length === 0 ? '' : `, and ${others.length} more`}`;
}

function problemsAt({ text, file, overrides, field }: SweptStage, value: number): readonly Problem[] {
  const read = readStage(text, { overrides: [...overrides, sweptOverride(field, value)], ...(file === null ? {} : { file }) });
  if (!read.ok) return read.problems;
  const built = buildStage(read.spec);
  return built.ok ? [] : built.problems;
}
