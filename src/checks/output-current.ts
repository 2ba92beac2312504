import type { DirectedPeak, OutputCurrentDemand } from '../demands/index.js';
import type { Readings } from '../parts/readings.js';
import type { NumberFinding, TurningPoint, UndecidedFinding, VertexFindings } from '../verdicts/finding.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

/**
 * Peak output current against the guaranteed usable one; without it each direction against 1.5 × the heaviest head-room
 * point of its own side. A short-circuit current is never usable current.
 */
export const outputCurrent: Check<OutputCurrentDemand> = {
  id: 'output-current',
  title: 'output current',
  unit: 'A',
  reads: ['outputCurrent', 'outputLowHeadroom', 'outputHighHeadroom'],
  hasMargin: true,
  asks: (demands) => demands['output-current'],
  judge: (asked, readings) => {
    const rated = readings.figure('outputCurrent');
    if (rated !== null) return compareFigure(asked, { figure: 'outputCurrent', kind: 'min', unit: 'A' }, rated);
    return asked.peaks.length === 0 ? noCurrent(asked) : fromHeadroom(asked, readings);
  },
};

/** Every corner and direction by its own side's points; all must hold. */
function fromHeadroom(asked: OutputCurrentDemand, readings: Readings): VertexFindings {
  return { kind: 'vertices', findings: asked.peaks.map((peak) => inDirection(asked, peak, readings)) };
}

/** Nothing flows, so any output gives it: a demand of zero needs no figure. */
function noCurrent(asked: OutputCurrentDemand): NumberFinding {
  const { required, unit, sense, corner } = asked;
  return { kind: 'numbers', required, unit, sense, corner, offered: 0, basis: 'guaranteed', how: 'no current is asked' };
}

function inDirection(asked: OutputCurrentDemand, peak: DirectedPeak, readings: Readings): NumberFinding | UndecidedFinding {
  const turnsAt: TurningPoint = { figure: 'outputCurrent', kind: 'min', value: asked.required, unit: 'A' };
  const common = { required: peak.amperes, unit: 'A', sense: 'at-least' as const, corner: peak.corner, turnsAt };
  const usable = readings.currentFromHeadroom(peak.side, peak.supply);
  if (usable === null) return { kind: 'undecided', ...common, cause: 'missing-figure', missing: [{ figure: 'outputCurrent', kind: 'min' }] };
  return { kind: 'numbers', ...common, offered: usable.value, basis: usable.basis, slot: usable.slot, how: usable.how };
}
