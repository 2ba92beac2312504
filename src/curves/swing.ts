import { judgeHeadroom } from '../checks/output-headroom.js';
import type { Demands, HeadroomDemand } from '../demands/index.js';
import type { Part } from '../parts/part.js';
import type { Readings } from '../parts/readings.js';
import type { Stage } from '../stage/index.js';
import type { Rails, Span, SwingWindow } from './curves.js';

/** A stage and a part read both ways. */
export interface Standing {
  readonly stage: Stage;
  readonly demands: Demands;
  readonly part: Part;
  readonly worst: Readings;
  readonly best: Readings;
}

/** Room between the rails at every supply voltage the stage has corners at, and what signal and part take of it. */
export function swingWindows(of: Standing): SwingWindow[] {
  const supplies = [...new Set(of.stage.vertices.map(({ supply }) => supply))].sort((a, b) => a - b);
  return supplies.map((supply) => windowAt(of, supply));
}

function windowAt({ stage, demands, part, worst, best }: Standing, supply: number): SwingWindow {
  const here = stage.vertices.filter((vertex) => vertex.supply === supply);
  const needs = { low: needAt(demands['output-low'], 'low', { supply, readings: worst }), high: needAt(demands['output-high'], 'high', { supply, readings: worst }) };
  const printed = { low: needAt(demands['output-low'], 'low', { supply, readings: best }), high: needAt(demands['output-high'], 'high', { supply, readings: best }) };
  return {
    supply,
    output: {
      signal: span(here.map(({ output }) => output)),
      error: needs.low.error ?? needs.high.error,
      worst: { low: needs.low.headroom, high: needs.high.headroom },
      best: { low: printed.low.headroom, high: printed.high.headroom },
    },
    input: { signal: span(here.map(({ commonMode }) => commonMode)), worst: inputRails(worst), crossover: crossoverAt(part, supply) },
  };
}

interface Need {
  readonly headroom: number | null;
  readonly error: number | null;
}

/** Head-room at the vertex of this supply that leaves the least spare, as the check of the output has it. */
function needAt(asked: HeadroomDemand, side: 'low' | 'high', { supply, readings }: { readonly supply: number; readonly readings: Readings }): Need {
  const vertices = asked.vertices.filter((vertex) => vertex.supply === supply);
  const { findings } = judgeHeadroom({ ...asked, vertices }, side, readings);
  let tightest: { readonly spare: number; readonly headroom: number; readonly error: number } | null = null;
  for (const finding of findings) {
    const headroom = finding.kind === 'numbers' ? finding.terms?.[0]?.value : undefined;
    if (finding.kind !== 'numbers' || headroom === undefined) return { headroom: null, error: null };
    const spare = finding.required - finding.offered;
    if (tightest === null || spare < tightest.spare) tightest = { spare, headroom, error: finding.offered - headroom };
  }
  return tightest ?? { headroom: null, error: null };
}

function inputRails(readings: Readings): Rails {
  return { low: readings.figure('inputLowHeadroom')?.value ?? null, high: readings.figure('inputHighHeadroom')?.value ?? null };
}

/** The region is stated as distances below V+. */
function crossoverAt({ figures }: Part, supply: number): Span | null {
  const end = (kind: 'min' | 'max'): number | undefined => figures.find((figure) => figure.parameter === 'inputCrossover' && figure.kind === kind)?.value;
  const [nearest, farthest] = [end('min'), end('max')];
  return nearest === undefined || farthest === undefined ? null : { min: supply - farthest, max: supply - nearest };
}

const span = (values: readonly number[]): Span => ({ min: Math.min(...values), max: Math.max(...values) });
