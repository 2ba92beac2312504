import { movableInputs, predict, readSwept, sweepOver, sweptOverride, sweptValues, type Asking, type MovableInput, type PartSource, type ReviewedStage, type Stage, type StageSpec } from '../index.js';
import { rerunOf, type GivenStage } from './rerun.js';

/** What the figures of a reviewed stage are computed from. */
export interface Reviewed {
  readonly spec: StageSpec;
  readonly stage: Stage;
  readonly given: GivenStage;
  readonly source: PartSource;
  readonly asking: Asking;
  readonly chosen: ReviewedStage['chosen'];
}

/** What two of the plots are drawn from: the chosen part simulated on the stage, and what its first budget costs. */
export function reviewFigures(reviewed: Reviewed): Pick<ReviewedStage, 'prediction' | 'sweep'> {
  return { prediction: predictionOf(reviewed), sweep: sweepOf(reviewed) };
}

function predictionOf({ stage, source, asking, chosen }: Reviewed): ReviewedStage['prediction'] {
  if (chosen === null) return null;
  const { part } = chosen.judged;
  return { part: part.id, waveform: predict(stage, source, { part, asking }).prediction.waveform };
}

/** The budgets of a stage, the one most often bargained over first. */
const BUDGETS = ['limits.dcError', 'limits.supplyCurrent', 'limits.gainError', 'limits.outputNoise', 'limits.frequencyError'];
/** From a third to three times of what stands in the stage. */
const SPAN = 3;
const STEPS = 13;

type Budget = MovableInput & { readonly form: 'value' };

function sweepOf({ spec, given, source, asking }: Reviewed): ReviewedStage['sweep'] {
  const budget = budgetOf(spec);
  if (budget === null) return null;
  const { path, value, unit } = budget;
  const [from, to] = [value / SPAN, value * SPAN].map((end) => Number(end.toPrecision(6))) as [number, number];
  const field = readSwept(`${path}=${from}${inputUnit(unit)}..${to}${inputUnit(unit)}`, spec);
  if (!field.ok) return null;
  const rerun = rerunOf(given);
  const stageAt = (at: number): Stage | string => rerun([sweptOverride(field.field, at)]) ?? 'no stage';
  const { points, turns } = sweepOver(source, { values: sweptValues({ from, to, steps: STEPS, scale: 'log' }), stageAt, asking });
  return {
    over: path,
    unit: field.field.unit,
    points: points.flatMap(({ value: at, state }) => ('counts' in state ? [{ value: at, counts: state.counts, first: state.first }] : [])),
    turns: turns.flatMap(({ at, from: before, to: after }) => ('counts' in before && 'counts' in after && before.first !== after.first ? [{ at, from: before.first, to: after.first }] : [])),
    current: value,
  };
}

function budgetOf(spec: StageSpec): Budget | null {
  const inputs = movableInputs(spec).filter((input): input is Budget => input.form === 'value' && input.written && input.value > 0);
  return BUDGETS.flatMap((path) => inputs.filter((input) => input.path === path))[0] ?? null;
}

/** A share is typed as a plain number. */
const inputUnit = (unit: string): string => (unit === '%' || unit === '1' ? '' : unit);
