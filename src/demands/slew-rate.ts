import { edgeSlewRate } from '../formulas/edges.js';
import { slewRateForEdge } from '../formulas/settling.js';
import { stepPeakSlope, stepRiseTime } from '../formulas/step-response.js';
import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { OscillatorResponse } from '../stage/response.js';
import { hasEdge } from './bandwidth-criteria.js';
import { closedLoopOf, settledStep } from './closed-loop.js';
import { noiseGainAt } from './noise-gain.js';
import { outputSlope, type OutputSlope } from './output-slope.js';
import type { ClosedLoop, EdgeMotion, Loop, SlewNeed, SlewRateDemand } from './speed-demand.js';

const BERNSTEIN = 'M2: 2π·f·Vp, exact worst case for any signal band-limited to f (Bernstein; Boas, Entire Functions, 1954, ch. 11, from memory)';
const INTEGRATED = 'M2: |vi − Vref|/(RC), and through the resistor across the capacitor, exact bound for any waveform (I = C·dv/dt)';
const EDGE = 'M2: edge of a loop with a slew limit, exact, bisected (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ex. 6.7, from memory; own algebra)';
const SLEWED_EDGE = 'M2: 0.8·ΔV/t from 10 % to 90 % (common practice)';

/** Slew rate the stage asks, V/s. Null without a frequency, or of a step without an edge. */
export function slewRate(stage: Stage): SlewRateDemand | null {
  if (stage.response.kind === 'oscillator') return oscillatorSlewRate(stage, stage.response);
  return hasEdge(stage) ? edgeDemand(stage) : sineDemand(stage);
}

const marginOf = (stage: Stage): number => stage.asked.margins.slewRate ?? 1;
const marginText = (stage: Stage): string => (marginOf(stage) === 1 ? '' : `, × ${marginOf(stage)} asked by the team`);

/** Told where the bypass of the reference makes the swing larger than by the gain at DC. */
const bypassText = ({ signalPeak, outputPeak }: Stage): string =>
  signalPeak > outputPeak * (1 + 1e-9) ? `, where the bypass shorts the resistance of the reference (${formatQuantity(outputPeak, 'V', { digits: 4 })} with the gain at DC)` : '';

/** The largest output swing at the top frequency. */
function sineDemand(stage: Stage): SlewRateDemand | null {
  if (stage.frequency === null) return null;
  const steepest = outputSlope(stage, stage.frequency);
  const required = stage.signalPeak === 0 ? 0 : steepest.slope * marginOf(stage);
  const because = `${slopeText(stage, steepest, stage.frequency)}${marginText(stage)}`;
  const motion = { kind: 'sine', frequency: stage.frequency, noiseGainAt: noiseGainAt(stage, 3 * stage.frequency) } as const;
  return { check: 'slew-rate', required, unit: 'V/s', sense: 'at-least', because, source: steepest.by === 'input' ? INTEGRATED : BERNSTEIN, motion };
}

function slopeText(stage: Stage, steepest: OutputSlope, frequency: number): string {
  const swing = `${formatQuantity(stage.signalPeak, 'V', { digits: 4 })} peak at ${formatQuantity(frequency, 'Hz')}`;
  if (steepest.by === 'band' || stage.response.kind !== 'integrator') return `${swing}${bypassText(stage)}`;
  const { resistance, capacitance, bleed } = stage.response.steepest;
  const value = (number: number, unit: 'V' | 'Ω' | 'F'): string => formatQuantity(number, unit, { digits: 4 });
  const bled = Number.isFinite(bleed) ? `, and the output through ${value(bleed, 'Ω')},` : '';
  return `${value(steepest.input, 'V')} of input about the reference across ${value(resistance, 'Ω')}${bled} into ${value(capacitance, 'F')}: no waveform is steeper (${swing} would be)`;
}

function edgeDemand(stage: Stage): SlewRateDemand | null {
  const { edge, response } = stage;
  const step = settledStep(stage);
  const loop = closedLoopOf(stage);
  if (edge === null || loop === null) return null;
  if (response.kind === 'low-pass') return filterEdge(stage, edge, step * stepPeakSlope(response.responseAt(Infinity)));
  const margin = marginOf(stage);
  const required = edgeSlewRate(step, edge) * margin;
  const most = formatQuantity((0.9 * Math.log(9)) / 0.8, '1', { digits: 2 });
  const what = `${formatQuantity(step, 'V', { digits: 4 })} in ${formatQuantity(edge, 's')} from 10 % to 90 %`;
  const because = `${what}, the least for any amplifier; with the bandwidth of the part it grows, up to ${most} times where that is just enough${marginText(stage)}`;
  return { check: 'slew-rate', required, unit: 'V/s', sense: 'at-least', because, source: EDGE, motion: edgeMotion({ edge, step, margin, loop }) };
}

interface WantedEdge {
  readonly edge: number;
  readonly step: number;
  readonly margin: number;
  readonly loop: ClosedLoop;
}

function edgeMotion({ edge, step, margin, loop }: WantedEdge): EdgeMotion {
  const linearEdge = (at: Loop): number => (loop.form === 'one-pole' ? Math.log(9) * loop.at(at).a : stepRiseTime(loop.at(at)));
  const need = (at: Loop): SlewNeed => {
    const least = edgeSlewRate(step, edge);
    if (loop.form === 'one-pole') {
      const exact = step === 0 ? 0 : slewRateForEdge({ step, time: Math.max(edge, linearEdge(at)), timeConstant: loop.at(at).a });
      return { best: exact * margin, worst: exact * margin };
    }
    // With more poles slewing and settling do not part exactly: not slewing at all is enough, the mean slope is the least.
    return { best: least * margin, worst: Math.max(least, step * stepPeakSlope(loop.at(at))) * margin };
  };
  return { kind: 'edge', edge, linearEdge, slewRateAt: (at) => (linearEdge(at) > edge * (1 + 1e-9) ? null : need(at)) };
}

/** A filter makes its own edge; the amplifier must not slew in it. */
function filterEdge(stage: Stage, edge: number, slope: number): SlewRateDemand {
  const required = slope * marginOf(stage);
  const own = stage.response.kind === 'low-pass' ? stepRiseTime(stage.response.responseAt(Infinity)) : edge;
  const late = own > edge ? `, longer than the ${formatQuantity(edge, 's')} wanted, whatever the amplifier` : '';
  const because = `steepest slope of the filter's own edge of ${formatQuantity(settledStep(stage), 'V', { digits: 4 })} in ${formatQuantity(own, 's')}${late}${marginText(stage)}`;
  return { check: 'slew-rate', required, unit: 'V/s', sense: 'at-least', because, source: 'M2: peak slope of the step response (own algebra)', motion: { kind: 'given' } };
}

/** The output goes from rail to rail within the edge, and through the thresholds of the logic it drives. */
function oscillatorSlewRate(stage: Stage, { edge, drives }: OscillatorResponse): SlewRateDemand {
  const span = stage.supply.max;
  const ofEdge = edgeSlewRate(span, edge);
  const ofLogic = drives?.maxEdge == null ? 0 : ((drives.high - drives.low) * span) / drives.maxEdge;
  const across = `${formatQuantity(span, 'V')} from rail to rail in ${formatQuantity(edge, 's')} from 10 % to 90 %`;
  const through = drives === null ? '' : `${formatQuantity((drives.high - drives.low) * span, 'V')} between the thresholds of the logic in ${formatQuantity(drives.maxEdge ?? edge, 's')}`;
  const required = Math.max(ofEdge, ofLogic) * marginOf(stage);
  const because = `${ofLogic > ofEdge ? through : across}${marginText(stage)}`;
  return { check: 'slew-rate', required, unit: 'V/s', sense: 'at-least', because, source: SLEWED_EDGE, motion: { kind: 'given' } };
}
