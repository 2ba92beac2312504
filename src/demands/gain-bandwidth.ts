import { gainBandwidthForMagnitudeError, gainBandwidthForVectorError, vectorErrorAt } from '../formulas/gain-bandwidth.js';
import { formatDecibels, formatQuantity } from '../quantities/format.js';
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
 * Difference stage: the vector error of the amplifier multiplies both paths alike, so common mode still cancels; what is
 * left of it comes from the resistors (method.md 1, resistor-limited rejection).
 */
function vectorNote(stage: Stage, required: number): string {
  if (stage.topology !== 'difference' || stage.frequency === null) return '';
  const error = vectorErrorAt(stage.noiseGain.nominal, stage.frequency, required);
  const rejection = stage.resistorRejection;
  const resistors = rejection === null || !Number.isFinite(rejection) ? '' : `, which the resistors limit to ${formatDecibels(rejection)}`;
  return `; the vector error of ${formatQuantity(error * 100, '%')} there acts on both inputs alike and leaves the common-mode rejection${resistors}`;
}
