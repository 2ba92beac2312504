import type { Demands } from '../demands/index.js';
import { headroomPoints, pointCurrent, type HeadroomPoint } from '../parts/headroom.js';
import type { Part } from '../parts/part.js';

/** What can go wrong with a part on this stage though every check passes. Numbers only; words come with the presenter. SI. */
export type PartHazard =
  /** The output jumps to the other rail when an input leaves its range. */
  | { readonly kind: 'phase-reversal' }
  /** Diodes join the inputs. */
  | { readonly kind: 'clamp' }
  /** The stage takes the inputs where one input pair hands over to the other: both as distances below V+, V. */
  | { readonly kind: 'crossover'; readonly region: Span; readonly inputs: Span }
  /** Near V- the output sinks no more than `current`; beyond, it stays `beyond` above V- instead of `within`. */
  | { readonly kind: 'sink-limit'; readonly current: number; readonly within: number; readonly beyond: number };

interface Span {
  readonly min: number;
  readonly max: number;
}

/** Hazards of the input and output stages (M9); a word that is not known raises none, and pins that rest at the reference reverse no phase. */
export function hazardsOf(part: Part, demands: Demands): PartHazard[] {
  return [
    ...(part.phaseReversal === true && !demands['input-high'].still ? [{ kind: 'phase-reversal' } as const] : []),
    ...(part.inputClamp === true ? [{ kind: 'clamp' } as const] : []),
    ...crossover(part, demands),
    ...sinkLimit(part, demands),
  ];
}

function crossover(part: Part, { 'input-high': asked }: Demands): PartHazard[] {
  const end = (kind: 'min' | 'max'): number | undefined => part.figures.find((figure) => figure.parameter === 'inputCrossover' && figure.kind === kind)?.value;
  const [min, max] = [end('min'), end('max')];
  if (min === undefined || max === undefined) return [];
  const inputs = { min: asked.required, max: asked.farthest };
  return inputs.max > min && inputs.min < max ? [{ kind: 'crossover', region: { min, max }, inputs }] : [];
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
