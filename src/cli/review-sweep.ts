import { movableInputs, readSwept, sweepOver, sweptOverride, sweptValues, type Asking, type MovableInput, type PartSource, type ReviewedStage, type Stage, type StageSpec } from '../index.js';
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

/** The budgets of a stage, the one most often bargained over first. */
const BUDGETS = ['limits.dcError', 'limits.supplyCurrent', 'limits.gainError', 'limits.outputNoise', 'limits.frequencyError'] as const;
type BudgetPath = (typeof BUDGETS)[number];

/** From a third to three times of what stands in the stage. */
const SPAN = 3;
const STEPS = 13;

type Budget = MovableInput & { readonly form: 'value'; readonly path: BudgetPath };

/** What the first budget of the stage costs; null where none is written. */
export function reviewSweep(reviewed: Reviewed): ReviewedStage['sweep'] {
  const budget = budgetOf(reviewed.spec);
  if (budget === null) return null;
  const { path, value, unit } = budget;
  const [from, to] = [value / SPAN, value * SPAN].map((end) => Number(end.toPrecision(6))) as [number, number];
  const field = readSwept(`${path}=${typed(from, unit)}..${typed(to, unit)}`, reviewed.spec);
  if (!field.ok) return null;
  const rerun = rerunOf(reviewed.given);
  const stageAt = (at: number): Stage | string => rerun([sweptOverride(field.field, at)]) ?? 'no stage';
  const { points, turns } = sweepOver(reviewed.source, { values: sweptValues({ from, to, steps: STEPS, scale: 'log' }), stageAt, asking: reviewed.asking, turnsOf: 'first' });
  // A share is read in percent.
  const [shown, scale] = unit === '%' ? ['%', 100] : [field.field.unit, 1];
  return {
    over: path,
    unit: shown,
    points: points.flatMap(({ value: at, state }) => ('counts' in state ? [{ value: at * scale, counts: state.counts, first: state.first }] : [])),
    turns: turns.flatMap(({ at, from: before, to: after }) => ('counts' in before && 'counts' in after && before.first !== after.first ? [{ at: at * scale, from: before.first, to: after.first }] : [])),
    current: value * scale,
  };
}

function budgetOf(spec: StageSpec): Budget | null {
  const isBudget = (input: MovableInput): input is Budget => input.form === 'value' && input.written && input.value > 0 && (BUDGETS as readonly string[]).includes(input.path);
  const inputs = movableInputs(spec).filter(isBudget);
  return BUDGETS.flatMap((path) => inputs.filter((input) => input.path === path))[0] ?? null;
}

/** An end as it is typed. */
const typed = (value: number, unit: string): string => (unit === '%' ? `${Number((100 * value).toPrecision(6))}%` : `${value}${unit === '1' ? '' : unit}`);
