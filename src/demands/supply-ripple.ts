import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { SupplyRippleDemand } from './hazard-demand.js';
import { closedNoiseGainAt } from './noise-gain.js';

const SOURCE = 'M5: ripple over the supply rejection at its frequency, −20 dB per decade above its corner (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 5, from memory)';

/** Ripple of the supply at the output, V peak. Null without ripple, and of an oscillator. */
export function supplyRipple(stage: Stage): SupplyRippleDemand | null {
  const { supplyRipple: ripple, limits } = stage.asked;
  if (ripple === null || stage.response.kind === 'oscillator') return null;
  const limit = limits.supplyRipple;
  const allowed = limit === undefined ? 'no limit' : `${formatQuantity(limit.value, 'V')} peak allowed at the output`;
  return {
    check: 'supply-ripple',
    required: limit?.value ?? null,
    unit: 'V',
    sense: 'at-most',
    because: `${formatQuantity(ripple.amplitude.value, 'V')} peak of ripple at ${formatQuantity(ripple.frequency.value, 'Hz')}, ${allowed}`,
    source: SOURCE,
    amplitude: ripple.amplitude.value,
    frequency: ripple.frequency.value,
    noiseGainAt: closedNoiseGainAt(stage, ripple.frequency.value),
  };
}
