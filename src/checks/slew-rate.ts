import type { SlewRateDemand } from '../demands/index.js';
import { thirdHarmonicBipolar } from '../formulas/input-pair-distortion.js';
import { formatQuantity } from '../quantities/format.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

/** Slew rate the largest swing needs at the top frequency against the part's. */
export const slewRate: Check<SlewRateDemand> = {
  id: 'slew-rate',
  title: 'slew rate',
  unit: 'V/s',
  reads: ['slewRate', 'gainBandwidth'],
  hasMargin: true,
  asks: (demands) => demands['slew-rate'],
  judge: (asked, readings) => {
    const rate = readings.figure('slewRate');
    const finding = compareFigure(asked, { figure: 'slewRate', kind: 'min', unit: 'V/s' }, rate);
    const caution = rate === null ? null : nearTheLimit(asked, rate.value, readings.figure('gainBandwidth')?.value ?? null);
    return caution === null ? finding : { ...finding, cautions: [caution] };
  },
};

/** Below this margin the distortion of the input pair is worth a word. */
const COMFORT = 1.5;

/** Third harmonic just below the slew limit, bipolar pair (method.md 2; Solomon, IEEE JSSC 9(6), 1974, from memory). */
function nearTheLimit(asked: SlewRateDemand, offered: number, gainBandwidth: number | null): string | null {
  const ratio = asked.required / offered;
  if (gainBandwidth === null || ratio <= 1 / COMFORT || ratio >= 1) return null;
  const harmonic = thirdHarmonicBipolar({ ratio, frequency: asked.frequency, gainBandwidth, noiseGain: asked.noiseGain });
  return `near the slew limit: third harmonic about ${formatQuantity(20 * Math.log10(harmonic), 'dB', { digits: 2 })} with a bipolar input pair (estimate)`;
}
