import { reaches, stepOf, type CrossoverStep } from '../checks/crossover.js';
import { staysWithinRails } from '../checks/phase-reversal.js';
import type { Demands } from '../demands/index.js';
import { headroomPoints, pointCurrent, type HeadroomPoint } from '../parts/headroom.js';
import type { Part } from '../parts/part.js';
import { readingsOf, type Readings } from '../parts/readings.js';
import { circumstancesOf, type Circumstance } from './circumstances.js';

/** What can go wrong with a part on this stage though every check passes. Numbers only; words come with the presenter. SI. */
export type PartHazard =
  /** The output jumps to the other rail when an input leaves its range. */
  | { readonly kind: 'phase-reversal' }
  /** Diodes join the inputs. */
  | { readonly kind: 'clamp' }
  /** The stage takes the inputs where one input pair hands over to the other: both as distances below V+, V; Hz; what the step amounts to. */
  | { readonly kind: 'crossover'; readonly region: Span; readonly inputs: Span; readonly moves: boolean; readonly frequency: number | null; readonly step: CrossoverStep | null }
  | Circumstance
  /** Near V- the output sinks no more than `current`; beyond, it stays `beyond` above V- instead of `within`. */
  | { readonly kind: 'sink-limit'; readonly current: number; readonly within: number; readonly beyond: number };

interface Span {
  readonly min: number;
  readonly max: number;
}

/**
 * Hazards of the input and output stages (M9), and of what the stage says can happen to it. A word that is not known raises none by
 * itself, and pins that rest at the reference reverse no phase. What the stage avoids is a verdict, no caution.
 */
export function hazardsOf(part: Part, demands: Demands): PartHazard[] {
  const readings = readingsOf({ part, operating: demands.operating, strict: false, classWorst: null, outlook: 'pessimistic' });
  return [
    ...reversal(part, demands),
    ...(part.inputClamp === true && !demands.clamp.avoided ? [{ kind: 'clamp' } as const] : []),
    ...crossover(part, demands, readings),
    ...sinkLimit(part, demands),
    ...circumstancesOf(part, demands, readings),
  ];
}

function reversal(part: Part, { 'phase-reversal': asked }: Demands): PartHazard[] {
  if (part.phaseReversal !== true || asked.avoided || asked.reach.still || staysWithinRails(asked)) return [];
  return [{ kind: 'phase-reversal' }];
}

function crossover(part: Part, { crossover: asked }: Demands, readings: Readings): PartHazard[] {
  const end = (kind: 'min' | 'max'): number | undefined => part.figures.find((figure) => figure.parameter === 'inputCrossover' && figure.kind === kind)?.value;
  const [min, max] = [end('min'), end('max')];
  if (asked.avoided || part.crossoverFree === true || min === undefined || max === undefined) return [];
  const region = { min, max };
  if (!reaches(asked, region)) return [];
  const rejection = readings.figure('commonModeRejection');
  const { inputs, moves, frequency } = asked;
  return [{ kind: 'crossover', region, inputs, moves, frequency, step: rejection === null ? null : stepOf(asked, region, rejection) }];
}

/** A resistance loses at most as many times more as the current grows; a step beyond three times that is another device taking over. */
const STEP = 3;
/** Below this a current is no sinking, A. */
const NO_SINKING = 1e-12;

/** The step in the low-side rows of the supply nearest to the stage's, where the stage sinks current at all. */
function sinkLimit(part: Part, { 'output-low': asked, operating }: Demands): PartHazard[] {
  if (asked.vertices.every(({ current }) => current <= NO_SINKING)) return [];
  const rows = nearestRows(headroomPoints({ part, operating, strict: false, classWorst: null, outlook: 'optimistic' }, 'low'), operating.nominalSupply);
  for (const [at, next] of rows.slice(1).entries()) {
    const row = rows[at];
    if (row !== undefined && next.headroom / row.headroom > (STEP * next.current) / row.current) {
      return [{ kind: 'sink-limit', current: row.current, within: row.headroom, beyond: next.headroom }];
    }
  }
  return [];
}

interface Row {
  readonly current: number;
  readonly headroom: number;
}

/** Unassisted rows with a current and a loss, lightest first; of several supplies the one nearest as a ratio. */
function nearestRows(points: readonly HeadroomPoint[], nominal: number): Row[] {
  const own = points.filter(({ assisted }) => !assisted);
  const away = ({ supply }: HeadroomPoint): number => Math.abs(Math.log((supply ?? nominal) / nominal));
  const nearest = Math.min(...own.map(away));
  return own
    .filter((point) => away(point) === nearest)
    .map((point) => ({ current: pointCurrent(point, 'low', point.supply ?? nominal), headroom: point.printed }))
    .filter(({ current, headroom }) => current > 0 && headroom > 0)
    .sort((a, b) => a.current - b.current);
}
