import { slewRateForSine } from '../formulas/slew-rate.js';
import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { SlewRateDemand } from './demand.js';

const SOURCE = 'M2: 2π·f·Vp, exact worst case for any signal band-limited to f (Bernstein; Boas, Entire Functions, 1954, ch. 11, from memory)';

/** Slew rate for the largest output swing at the top frequency, V/s. Null without a frequency. */
export function slewRate(stage: Stage): SlewRateDemand | null {
  if (stage.frequency === null) return null;
  const margin = stage.asked.margins.slewRate ?? 1;
  const required = stage.outputPeak === 0 ? 0 : slewRateForSine(stage.frequency, stage.outputPeak) * margin;
  const because = `${formatQuantity(stage.outputPeak, 'V', { digits: 4 })} peak at ${formatQuantity(stage.frequency, 'Hz')}${margin === 1 ? '' : `, × ${margin} asked by the team`}`;
  return { check: 'slew-rate', required, unit: 'V/s', sense: 'at-least', because, source: SOURCE, frequency: stage.frequency, noiseGain: stage.noiseGain.nominal };
}
