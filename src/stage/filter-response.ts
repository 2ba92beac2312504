import { magnitudeAt, peakOf, type LowPass } from '../formulas/low-pass-response.js';
import { secondOrderOvershoot } from '../formulas/second-order.js';
import { formatQuantity } from '../quantities/format.js';
import type { SignalSpec, StageSpec } from '../spec/spec.js';
import type { RatioCorner } from './circuit.js';
import type { InputPoint } from './stage.js';

/** Natural frequency (Hz) and Q of an ideal second-order low-pass; Q is negative or infinite when it oscillates. */
export function naturalOf({ a, b }: LowPass): { readonly corner: number; readonly q: number } {
  return { corner: 1 / (2 * Math.PI * Math.sqrt(b)), q: Math.sqrt(b) / a };
}

/**
 * How much larger than by its DC gain the output of an ideal second-order low-pass swings about its centre, at least 1. Sine and
 * band-limited: the largest magnitude within the band (the peak when the band contains it). Step: its overshoot, as twice that
 * share of half the step. Pulse: edges may follow each other at the filter's own ringing, each overshoot on top of the last,
 * (1 + o)/(1 − o), which is the largest answer to any input of that size (own algebra: the integral of |h|).
 */
export function swingGrowth(response: LowPass, signal: SignalSpec): number {
  if (signal.shape === 'sine' || signal.shape === 'band-limited') return bandPeak(response, signal.frequency);
  const overshoot = secondOrderOvershoot(naturalOf(response).q);
  return signal.shape === 'step' ? 1 + 2 * overshoot : (1 + overshoot) / (1 - overshoot);
}

/** A Butterworth response has no peak, whatever rounding says. */
const ROUNDING = 1e-9;

function bandPeak(response: LowPass, band: SignalSpec['frequency']): number {
  if (band === undefined) return 1;
  const peak = peakOf(response);
  const bottom = band.bottom ?? 0;
  const isInside = peak.frequency >= bottom && peak.frequency <= band.top;
  const largest = isInside ? peak.gain : Math.max(magnitudeAt(response, bottom), magnitudeAt(response, band.top));
  const growth = largest / Math.abs(response.gain);
  return growth > 1 + ROUNDING ? growth : 1;
}

/** Growth of the swing with nominal components, and the largest with them or at any ends of their tolerances. */
export interface Growth {
  readonly nominal: number;
  readonly largest: number;
}

/**
 * A stage whose output and inputs swing larger about the centre of the signal than by its gain alone. The pins of a Sallen-Key
 * follow the output; where they rest they do not move with the signal, so the same rule holds for them.
 */
export function grown(corner: RatioCorner, growth: number, centre: InputPoint): RatioCorner {
  const about = (of: 'output' | 'commonMode'): RatioCorner['output'] => (point, reference, supply) => {
    const rest = corner[of](centre, reference, supply);
    return growth === 1 ? corner[of](point, reference, supply) : rest + growth * (corner[of](point, reference, supply) - rest);
  };
  return { noiseGain: corner.noiseGain, output: about('output'), commonMode: about('commonMode') };
}

/** Every ratio corner without growth and with the largest. */
export function grownCorners(corners: readonly RatioCorner[], growth: Growth, centre: InputPoint): RatioCorner[] {
  const factors = growth.largest > 1 ? [1, growth.largest] : [1];
  return corners.flatMap((corner) => factors.map((factor) => grown(corner, factor, centre)));
}

/** Every combination of one value from each list. */
export function grid(ends: readonly (readonly number[])[]): number[][] {
  return ends.reduce<number[][]>((all, values) => all.flatMap((one) => values.map((value) => [...one, value])), [[]]);
}

/** A component at both ends of its tolerance, with something of its own tolerance in series; once when both are exact. */
export function toleranceEnds(value: number, tolerance: number, series: { readonly value: number; readonly tolerance: number } = EXACT): number[] {
  const signs = tolerance === 0 && series.tolerance === 0 ? [0] : [-1, 1];
  return signs.map((sign) => value * (1 + sign * tolerance) + series.value * (1 + sign * series.tolerance));
}

const EXACT = { value: 0, tolerance: 0 };
const DEFAULT_CAPACITOR_TOLERANCE = 0.05;

export function capacitorTolerance({ capacitors }: StageSpec): number {
  return capacitors?.tolerance?.value ?? DEFAULT_CAPACITOR_TOLERANCE;
}

/** Whatever is above this peaks: 0.707 as it is typed does not. */
const PEAKING = 0.7075;

/** What the response does to the swing, one sentence; none where nothing grows. */
export function growthNotes(signal: SignalSpec, q: number, growth: Growth): string[] {
  const times = (factor: number): string => formatQuantity(factor, '1', { digits: 4 });
  const isWave = signal.shape === 'sine' || signal.shape === 'band-limited';
  if (isWave && signal.frequency === undefined) return q > PEAKING ? ['no signal frequency: the peak of the filter is not counted in the swing'] : [];
  // What rounds to once is no growth anybody could see.
  const grows = (factor: number): boolean => factor > 1 && times(factor) !== times(1);
  if (!grows(growth.largest)) return [];
  const why = isWave ? 'the response peaks in the band' : signal.shape === 'step' ? 'a step overshoots' : 'pulses overshoot, each on top of the last at worst';
  const nominal = grows(growth.nominal) ? `${times(growth.nominal)} times what the gain alone gives, and ` : '';
  return [`${why}: the output swings ${nominal}${times(growth.largest)} times with components at the ends of their tolerances`];
}
