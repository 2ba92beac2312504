import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { NumberDemand } from './demand.js';

/** Noise gain of the stage at high frequency, lower corner, V/V: a decompensated part must be stable down to it. */
export function stableGain(stage: Stage): NumberDemand {
  const required = stage.noiseGain.min;
  return {
    check: 'stable-gain',
    required,
    unit: 'V/V',
    sense: 'at-most',
    because: `noise gain ${formatQuantity(required, 'V/V')} at its lower corner`,
    source: 'M9: minimum stable gain against the noise gain at high frequency',
  };
}
