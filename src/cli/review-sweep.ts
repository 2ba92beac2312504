import { movableInputs, readSwept, sweepOver, sweptOverride, sweptValues, type Asking, type MovableInput, type PartSource, type Report, type ReviewedStage, type Stage, type StageSpec } from '../index.js';
import { rerunOf, type GivenStage } from './rerun.js';

/** What the figures of a reviewed stage are computed from. */
export interface Reviewed {
  readonly spec: StageSpec;
  readonly stage: Stage;
  readonly given: GivenStage;
  readonly source: PartSource;
  readonly asking: Asking;
  readonly chosen: ReviewedStage['chosen'];
  /** The stage judged as it stands, with all its verdicts. */
  readonly report: Pick<Report, 'fit' | 'undecided' | 'rejected'>;
}

/** The budgets of a stage, the one most often bargained over first, each with the one check that it limits; null: several. */
const BUDGETS = { 'limits.dcError': 'dc-error', 'limits.supplyCurrent': 'supply-current', 'limits.gainError': null, 'limits.outputNoise': 'noise', 'limits.frequencyError': null } as const;
type BudgetPath = keyof typeof BUDGETS;

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
  // Views know from the shortlist what each check found; part by part those that are out anyway are left out.
  const { source, out } = reviewed.source.screening === undefined ? stillOpen(reviewed, path) : { source: reviewed.source, out: 0 };
  const { points, turns } = sweepOver(source, { values: sweptValues({ from, to, steps: STEPS, scale: 'log' }), stageAt, asking: reviewed.asking, turnsOf: 'first' });
  // A share is read in percent.
  const [shown, scale] = unit === '%' ? ['%', 100] : [field.field.unit, 1];
  return {
    over: path,
    unit: shown,
    points: points.flatMap(({ value: at, state }) => ('counts' in state ? [{ value: at * scale, counts: { ...state.counts, parts: state.counts.parts + out, rejected: state.counts.rejected + out }, first: state.first }] : [])),
    turns: turns.flatMap(({ at, from: before, to: after }) => ('counts' in before && 'counts' in after && before.first !== after.first ? [{ at: at * scale, from: before.first, to: after.first }] : [])),
    current: value * scale,
  };
}

/**
 * The parts that the budget decides about, with how many are out whatever it is: those that fail another check, which the budget does
 * not reach. The generic sets of their classes stay, since figures are borrowed from them.
 */
function stillOpen({ source, report }: Reviewed, path: BudgetPath): { readonly source: PartSource; readonly out: number } {
  const check = BUDGETS[path];
  if (check === null) return { source, out: 0 };
  const isOut = new Set(report.rejected.filter(({ verdicts }) => verdicts.some((verdict) => verdict.outcome === 'fail' && verdict.check !== check)).map(({ part }) => part.id));
  const classes = new Set(source.parts.flatMap((part) => (isOut.has(part.id) || part.class === null ? [] : [part.class])));
  const parts = source.parts.filter((part) => !isOut.has(part.id) || (part.tier === 'generic' && part.class !== null && classes.has(part.class)));
  return { source: { ...source, parts }, out: source.parts.length - parts.length };
}

function budgetOf(spec: StageSpec): Budget | null {
  const isBudget = (input: MovableInput): input is Budget => input.form === 'value' && input.written && input.value > 0 && input.path in BUDGETS;
  const inputs = movableInputs(spec).filter(isBudget);
  return Object.keys(BUDGETS).flatMap((path) => inputs.filter((input) => input.path === path))[0] ?? null;
}

/** An end as it is typed. */
const typed = (value: number, unit: string): string => (unit === '%' ? `${Number((100 * value).toPrecision(6))}%` : `${value}${unit === '1' ? '' : unit}`);
