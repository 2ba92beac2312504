import { gainBandwidthForMagnitudeError, gainBandwidthForVectorError } from '../formulas/gain-bandwidth.js';
import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { NumberDemand } from './demand.js';

const SOURCE = 'M3: one-pole amplifier, noise gain (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 6, from memory)';
const DEFAULT_ERROR = 0.01;

/** Gain bandwidth that keeps the gain error at the top frequency within its limit, Hz. Null without a frequency. */
export function gainBandwidth(stage: Stage): NumberDemand | null {
  if (stage.frequency === null) return null;
  const { gainError, gainErrorKind } = stage.asked.limits;
  const error = gainError?.value ?? DEFAULT_ERROR;
  const isVector = gainErrorKind === 'vector';
  const form = isVector ? gainBandwidthForVectorError : gainBandwidthForMagnitudeError;
  const margin = stage.asked.margins.gainBandwidth ?? 1;
  const required = form(stage.noiseGain.nominal, stage.frequency, error) * margin;
  const what = `noise gain ${formatQuantity(stage.noiseGain.nominal, 'V/V')}, ${isVector ? 'vector' : 'magnitude'} error ${formatQuantity(error * 100, '%')} at ${formatQuantity(stage.frequency, 'Hz')}`;
  return {
    check: 'gain-bandwidth',
    required,
    unit: 'Hz',
    sense: 'at-least',
    because: `${what}${margin === 1 ? '' : `, × ${margin} asked by the team`}${vectorNote(stage, required)}`,
    source: SOURCE,
  };
}

/**
 * Difference stage: with the least gain bandwidth the vector error at the top frequency is what the two paths differ by
 * at most, so it bounds how well common mode cancels there.
 */
function vectorNote(stage: Stage, required: number): string {
  if (stage.topology !== 'difference' || stage.frequency === null) return '';
  const ratio = (stage.noiseGain.nominal * stage.frequency) / required;
  const vector = ratio / Math.sqrt(1 + ratio * ratio);
  return `; at that bandwidth the vector error is ${formatQuantity(vector * 100, '%')}, which counts where this output is subtracted from another or closes a loop`;
}
