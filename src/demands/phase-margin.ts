import { gainBandwidthForMagnitudeError } from '../formulas/gain-bandwidth.js';
import { formatQuantity } from '../quantities/format.js';
import { USUAL, type Stage } from '../stage/index.js';
import type { FeedbackPlace, PhaseMarginDemand } from './loop-demand.js';
import { highFrequencyGain, openTransimpedance } from './stable-gain.js';

const SOURCE = 'M7: margin at the true crossover (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 8, from memory)';

/**
 * Phase margin of the loop, degrees: asked where the stage writes a limit or hangs a capacitance on the output. Null otherwise,
 * and for the oscillator, whose loop is meant to switch.
 */
export function phaseMargin(stage: Stage): PhaseMarginDemand | null {
  const { network, response, load } = stage;
  const capacitance = load?.capacitance ?? 0;
  const limit = stage.asked.limits.phaseMargin;
  if (network === null || response.kind === 'oscillator' || (limit === undefined && capacitance === 0)) return null;
  const required = limit?.value ?? USUAL.phaseMargin;
  const why = limit === undefined ? `usual for a load of ${formatQuantity(capacitance, 'F')}` : 'the stage asks it';
  return {
    check: 'phase-margin',
    required,
    unit: '°',
    sense: 'at-least',
    because: `phase margin ${formatQuantity(required, '°')} at the crossover of the loop: ${why}`,
    source: SOURCE,
    network,
    open: openTransimpedance(stage),
    load: { capacitance, resistance: load?.resistance ?? null, isolation: load?.isolation ?? 0 },
    noiseGain: highFrequencyGain(stage),
    feedback: feedbackPlace(stage),
  };
}

/** Across a feedback resistor that sets a plain gain or carries a photocurrent; its pole may take no more of the top frequency than the gain error. */
function feedbackPlace(stage: Stage): FeedbackPlace | null {
  const resistor = stage.network?.minus.elements.find(({ name, kind }) => name === 'feedback' && kind === 'resistor');
  const isPlain = stage.response.kind === 'amplifier' || stage.response.kind === 'transimpedance';
  if (!isPlain || resistor === undefined || openTransimpedance(stage) !== null) return null;
  const error = stage.asked.limits.gainError?.value ?? USUAL.gainError;
  const pole = stage.frequency === null ? 0 : gainBandwidthForMagnitudeError(1, stage.frequency, error);
  return { resistance: resistor.value, largest: 1 / (2 * Math.PI * resistor.value * pole) };
}
