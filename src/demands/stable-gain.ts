import { highFrequencyNoiseGain } from '../formulas/feedback-loop.js';
import type { PinNetwork } from '../formulas/pin-network.js';
import { highFrequencyNoiseGain as capacitorNoiseGain, maximallyFlatCapacitor } from '../formulas/transimpedance.js';
import { formatPercent, formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import { gainBandwidth } from './gain-bandwidth.js';
import type { OpenTransimpedance, StableGainDemand } from './loop-demand.js';

const SOURCE = 'M9: minimum stable gain against the noise gain at high frequency (Graeme, Photodiode Amplifiers: Op Amp Solutions, 1996, from memory)';

/**
 * Noise gain of the stage at high frequency, lower corner, V/V: a decompensated part must be stable down to it. Null for the
 * oscillator: no loop is closed at its crossover, it switches.
 */
export function stableGain(stage: Stage): StableGainDemand | null {
  if (stage.network === null || stage.response.kind === 'oscillator') return null;
  const open = openTransimpedance(stage);
  const required = open === null ? highFrequencyGain(stage) : leastOpenGain(stage, open);
  return { check: 'stable-gain', required, unit: 'V/V', sense: 'at-most', because: becauseOf(stage, required), source: SOURCE, open, capacitorTolerance: stage.capacitorTolerance };
}

/** The stage whose capacitor is the maximally flat one of the part at hand; null for every other. */
export function openTransimpedance({ response }: Stage): OpenTransimpedance | null {
  if (response.kind !== 'transimpedance' || response.feedbackCapacitance !== null) return null;
  return { feedback: response.feedback, inputCapacitance: response.inputCapacitance };
}

/**
 * Limit of the noise gain for f → ∞, V/V, lower corner: where capacitors decide, they divide alone (1 + Cin/Cf with Cf at its upper
 * tolerance end, 1 with no capacitance at the input); where resistors do, at their tolerance ends.
 */
export function highFrequencyGain(stage: Stage): number {
  const { network, noiseGain } = stage;
  if (network === null) return 1;
  const hasCapacitor = [...network.plus.elements, ...network.minus.elements].some(({ kind }) => kind === 'capacitor');
  if (!hasCapacitor) return noiseGain.min;
  const limit = highFrequencyNoiseGain({ ...network, minus: withLargest(network.minus, stage.capacitorTolerance) });
  // The amplifier's own input capacitance would make it more; without it a bare Rf over Cin has no limit, and unity is safe.
  if (!Number.isFinite(limit)) return 1;
  return Math.max(1, (limit * noiseGain.min) / noiseGain.nominal);
}

/** The capacitor across the feedback at its upper end; what a photodiode has at the input is no capacitor with a tolerance. */
function withLargest({ elements, pin }: PinNetwork, tolerance: number): PinNetwork {
  return { pin, elements: elements.map((one) => (one.name === 'feedback capacitor' ? { ...one, value: one.value * (1 + tolerance) } : one)) };
}

/** A faster part has the smaller capacitor and the larger noise gain: at the least gain bandwidth the stage asks it is least. */
function leastOpenGain(stage: Stage, open: OpenTransimpedance): number {
  const least = gainBandwidth(stage)?.required;
  return least === undefined ? 1 : openNoiseGain(open, least, stage.capacitorTolerance);
}

/**
 * 1 + Cin/Cf with the maximally flat capacitor of this gain bandwidth (Hz), at its upper tolerance end. 1 for a part so slow that its crossover lies below
 * the pole of Rf with Cin: the noise gain has not risen yet there, whatever it does further up.
 */
export function openNoiseGain(open: OpenTransimpedance, gainBandwidthHertz: number, tolerance = 0): number {
  if (2 * Math.PI * gainBandwidthHertz * open.feedback * open.inputCapacitance < 1) return 1;
  return capacitorNoiseGain(open.inputCapacitance, maximallyFlatCapacitor({ ...open, gainBandwidth: gainBandwidthHertz }) * (1 + tolerance));
}

function becauseOf(stage: Stage, required: number): string {
  const gain = `noise gain ${formatQuantity(required, 'V/V')}`;
  if (stage.response.kind === 'transimpedance') {
    const capacitor = stage.response.feedbackCapacitance;
    const upper = stage.capacitorTolerance === 0 ? '' : ` + ${formatPercent(stage.capacitorTolerance)}`;
    if (capacitor === null) return `${gain} or more at high frequency: 1 + Cin/Cf with the maximally flat capacitor of the part at hand${upper}`;
    return `${gain} at high frequency: 1 + Cin/Cf with ${formatQuantity(stage.response.inputCapacitance, 'F')} and ${formatQuantity(capacitor, 'F')}${upper}`;
  }
  return required === stage.noiseGain.min ? `${gain} at its lower corner` : `${gain} at high frequency, where capacitors alone divide`;
}
