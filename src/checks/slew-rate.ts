import type { EdgeMotion, Loop, SineMotion, SlewRateDemand } from '../demands/index.js';
import { lowestHolding } from '../formulas/bisection.js';
import { thirdHarmonicBipolar } from '../formulas/input-pair-distortion.js';
import { weakest } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';
import { meets } from '../verdicts/compare.js';
import type { BoundFinding, NumberFinding, TurningPoint, UndecidedFinding } from '../verdicts/finding.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

type Judged = NumberFinding | BoundFinding | UndecidedFinding;

/** Slew rate the largest swing needs at the top frequency, or an edge with the part's own bandwidth, against the part's. */
export const slewRate: Check<SlewRateDemand> = {
  id: 'slew-rate',
  title: 'slew rate',
  unit: 'V/s',
  reads: ['slewRate', 'gainBandwidth', 'inputCapacitance'],
  hasMargin: true,
  asks: (demands) => demands['slew-rate'],
  judge: (asked, readings) => {
    const rate = readings.figure('slewRate');
    switch (asked.motion.kind) {
      case 'given':
        return compareFigure(asked, COMPARED, rate);
      case 'sine':
        return ofSine(asked, asked.motion, { rate, readings });
      case 'edge':
        return ofEdge(asked, asked.motion, { rate, readings });
    }
  },
};

const COMPARED = { figure: 'slewRate', kind: 'min', unit: 'V/s' } as const;

interface Known {
  readonly rate: Reading | null;
  readonly readings: Readings;
}

function ofSine(asked: SlewRateDemand, motion: SineMotion, { rate, readings }: Known): Judged {
  const finding = compareFigure(asked, COMPARED, rate);
  if (readings.brief) return finding;
  const bandwidth = readings.figure('gainBandwidth');
  const loop = bandwidth === null ? null : { gainBandwidth: bandwidth.value, inputCapacitance: readings.figure('inputCapacitance')?.value ?? 0 };
  const near = { offered: rate?.value ?? Number.POSITIVE_INFINITY, loop };
  const caution = nearTheLimit(asked.required, motion, near);
  return caution === null ? finding : { ...finding, cautions: [caution] };
}

/** Below this margin the distortion of the input pair is worth a word. */
const COMFORT = 1.5;

/** Third harmonic just below the slew limit, bipolar pair (Solomon, IEEE J. Solid-State Circuits 9(6), 1974, from memory). */
function nearTheLimit(required: number, { frequency, noiseGainAt }: SineMotion, near: { offered: number; loop: Loop | null }): string | null {
  const ratio = required / near.offered;
  const { loop } = near;
  if (loop === null || !Number.isFinite(loop.gainBandwidth) || ratio <= 1 / COMFORT || ratio >= 1) return null;
  const harmonic = thirdHarmonicBipolar({ ratio, frequency, gainBandwidth: loop.gainBandwidth, noiseGain: noiseGainAt(loop) });
  return `near the slew limit: third harmonic about ${formatQuantity(20 * Math.log10(harmonic), 'dB', { digits: 2 })} with a bipolar input pair (estimate)`;
}

/** The demand is the least of any amplifier; what this one needs goes by its own bandwidth. */
function ofEdge(asked: SlewRateDemand, motion: EdgeMotion, { rate, readings }: Known): Judged {
  const bandwidth = readings.figure('gainBandwidth');
  const least = compareFigure(asked, COMPARED, rate);
  const isShort = rate !== null && !meets(asked.required, rate.value, 'at-least');
  if (bandwidth === null) return isShort ? least : { ...least, ...NO_BANDWIDTH, kind: 'undecided' };
  if (!Number.isFinite(bandwidth.value)) return least;
  const loop = { gainBandwidth: bandwidth.value, inputCapacitance: readings.figure('inputCapacitance')?.value ?? 0 };
  const need = motion.slewRateAt(loop);
  if (need === null) return isShort || rate === null ? least : tooSlow(asked, motion, { rate, loop });
  const finding = compareFigure({ ...asked, required: readings.bounded(need.worst, need.best) }, COMPARED, rate);
  if (finding.kind !== 'numbers') return finding;
  const bases = [finding.basis, bandwidth.basis, ...(need.best === need.worst ? [] : (['estimated'] as const))];
  if (readings.brief) return { ...finding, basis: weakest(bases) };
  const how = [finding.how, `need found with a gain bandwidth of ${formatQuantity(bandwidth.value, 'Hz')}`, bandwidth.how].filter((step) => step !== null && step !== undefined);
  return { ...finding, basis: weakest(bases), how: how.join(', ') };
}

const NO_BANDWIDTH = { cause: 'missing-figure', missing: [{ figure: 'gainBandwidth', kind: 'min' }], turnsAt: null } as const satisfies Partial<UndecidedFinding>;

interface Slow {
  readonly rate: Reading;
  readonly loop: Loop;
}

/** The loop alone takes longer than the edge: no slew rate mends that, and none is asked. */
function tooSlow(asked: SlewRateDemand, motion: EdgeMotion, { rate, loop }: Slow): BoundFinding {
  const { required, unit, sense } = asked;
  const alone = formatQuantity(motion.linearEdge(loop), 's');
  const caution = `no slew rate makes this edge: with a gain bandwidth of ${formatQuantity(loop.gainBandwidth, 'Hz')} the loop alone takes ${alone}, see gain bandwidth`;
  return { kind: 'bound', required, unit, sense, known: rate.value, basis: rate.basis, missing: [], cause: 'beyond-data', turnsAt: bandwidthFor(motion, { rate, loop }), cautions: [caution] };
}

/** Far beyond any amplifier, as a factor. */
const BEYOND = 1e9;

/** The gain bandwidth with which the slew rate at hand would do; null where no one value does. */
function bandwidthFor(motion: EdgeMotion, { rate, loop }: Slow): TurningPoint | null {
  const does = (gainBandwidth: number): boolean => {
    const need = motion.slewRateAt({ ...loop, gainBandwidth });
    return need !== null && need.worst <= rate.value;
  };
  const high = loop.gainBandwidth * BEYOND;
  return does(high) ? { figure: 'gainBandwidth', kind: 'min', value: lowestHolding(does, high), unit: 'Hz' } : null;
}
