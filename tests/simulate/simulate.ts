import { dcError } from './dc-error.js';
import type { Draw } from './draw.js';
import type { SimulatedCheck } from './draw-part.js';
import { gainBandwidth } from './gain-bandwidth.js';
import { inputRange } from './input-range.js';
import type { Bench, Both, Measured } from './measured.js';
import { outputCurrent } from './output-current.js';
import { outputHeadroom } from './output-headroom.js';
import { READINGS, type Reading } from './reading.js';
import { slewRate } from './slew-rate.js';
import { stableGain } from './stable-gain.js';

/** One bench a check. Supply, temperature, supply current and words compare two printed figures: there is nothing to simulate. */
const BENCHES: Readonly<Record<SimulatedCheck, Bench>> = {
  'input-low': inputRange('low'),
  'input-high': inputRange('high'),
  'output-low': outputHeadroom('low'),
  'output-high': outputHeadroom('high'),
  'output-current': outputCurrent,
  'slew-rate': slewRate,
  'gain-bandwidth': gainBandwidth,
  'stable-gain': stableGain,
  'dc-error': dcError,
};

/**
 * How a reading of a verdict fares. `agreed`: at every real corner. `by-rule`: only with what the written rules simplify.
 * `unseen`: closer to the edge than the simulator resolves. `not-simulated`: no figure to build an amplifier from.
 */
export type Standing = 'agreed' | 'by-rule' | 'unseen' | 'not-simulated' | 'disagreed';

export interface Confirmed {
  readonly reading: Reading;
  readonly standing: Standing;
  readonly expected: 'clean' | 'violated';
  readonly real: Measured | null;
  /** Looked at only where the real corners disagree. */
  readonly rule: Measured | null;
}

export interface Confirmation {
  readonly draw: Draw;
  readonly readings: readonly Confirmed[];
  readonly simplification: string | null;
}

/** Both readings of one verdict in the simulator: pass is clean on both, fail violated on both, unknown violated on the worse only. */
export async function confirm(draw: Draw): Promise<Confirmation> {
  const bench = BENCHES[draw.check];
  const real = await bench.measure(draw, 'real');
  const isOff = READINGS.some((reading) => real[reading] !== null && said(real[reading]) !== expected(draw, reading));
  const rule = isOff && bench.simplification !== null ? await bench.measure(draw, 'agreed') : null;
  return { draw, simplification: bench.simplification, readings: READINGS.map((reading) => standingOf(draw, reading, { real, rule })) };
}

function said({ excess }: Measured): 'clean' | 'violated' {
  if (Number.isNaN(excess)) throw new RangeError('a measurement came to nothing');
  return excess > 0 ? 'violated' : 'clean';
}

function expected({ verdict }: Draw, reading: Reading): 'clean' | 'violated' {
  if (verdict.outcome === 'unknown') return reading === 'pessimistic' ? 'violated' : 'clean';
  return verdict.outcome === 'pass' ? 'clean' : 'violated';
}

function standingOf(draw: Draw, reading: Reading, of: { real: Both; rule: Both | null }): Confirmed {
  const [real, rule] = [of.real[reading], of.rule?.[reading] ?? null];
  const wanted = expected(draw, reading);
  const common = { reading, expected: wanted, real, rule };
  if (real === null) return { ...common, standing: 'not-simulated' };
  if (said(real) === wanted) return { ...common, standing: 'agreed' };
  if (rule !== null && said(rule) === wanted) return { ...common, standing: 'by-rule' };
  const isUnseen = [real, rule].some((one) => one !== null && Math.abs(one.excess) < one.resolution);
  return { ...common, standing: isUnseen ? 'unseen' : 'disagreed' };
}
