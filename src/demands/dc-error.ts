import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { DcErrorDemand } from './demand.js';
import { farthestFrom25 } from './operating.js';

const SOURCE = 'M5: sum of magnitudes at the worst corner (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 5, from memory)';

/** Largest DC error at the output the stage allows, V, with all a part's terms are multiplied by. Null without a limit. */
export function dcError(stage: Stage): DcErrorDemand | null {
  const limit = stage.asked.limits.dcError;
  if (limit === undefined) return null;
  const far = farthestFrom25(stage);
  const distance = (of: 'commonMode' | 'output'): number => Math.max(...stage.vertices.map((at) => Math.abs(at[of] - at.supply / 2)));
  return {
    check: 'dc-error',
    required: limit.value,
    unit: 'V',
    sense: 'at-most',
    because: `DC error ${formatQuantity(limit.value, 'V')} allowed at the output, noise gain ${formatQuantity(stage.dcNoiseGain.max, 'V/V')} at its upper corner`,
    source: SOURCE,
    noiseGain: stage.dcNoiseGain.max,
    kelvin: far.kelvin,
    temperature: far.at,
    hottest: stage.temperature.max,
    positive: stage.seriesPositive,
    negative: stage.seriesNegative,
    tolerance: stage.resistorTolerance,
    sourceSpread: stage.sourceSpread,
    commonModeMove: distance('commonMode'),
    outputMove: distance('output'),
    supply: stage.supply,
  };
}
