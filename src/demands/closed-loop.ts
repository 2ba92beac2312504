import type { LowPass } from '../formulas/low-pass-response.js';
import { maximallyFlatCapacitor } from '../formulas/transimpedance.js';
import { transimpedanceLowPass } from '../formulas/transimpedance-error.js';
import type { Stage } from '../stage/index.js';
import type { TransimpedanceResponse } from '../stage/response.js';
import type { ClosedLoop, Loop } from './speed-demand.js';

/** The stage as a low-pass with the amplifier at hand; null of an integrator and an oscillator, which follow no step. */
export function closedLoopOf(stage: Stage): ClosedLoop | null {
  const { response } = stage;
  switch (response.kind) {
    case 'amplifier':
      return amplifierLoop(stage);
    case 'transimpedance':
      return {
        form: 'more-poles',
        countsInput: true,
        at: ({ gainBandwidth, inputCapacitance }) => transimpedanceLowPass({ ...response, inputCapacitance: response.inputCapacitance + inputCapacitance }, gainBandwidth),
        idealAt: (loop) => idealTransimpedance(response, loop),
      };
    case 'low-pass':
      return { form: 'more-poles', countsInput: false, at: ({ gainBandwidth }) => response.responseAt(gainBandwidth), idealAt: () => response.responseAt(Infinity) };
    case 'integrator':
    case 'oscillator':
      return null;
  }
}

/** With the capacitor fitted, or the one chosen for the part, about an endless amplifier. */
function idealTransimpedance(response: TransimpedanceResponse, { gainBandwidth, inputCapacitance }: Loop): LowPass {
  const { feedback } = response;
  const total = response.inputCapacitance + inputCapacitance;
  const flat = (): number => (total === 0 || gainBandwidth === Infinity ? 0 : maximallyFlatCapacitor({ feedback, inputCapacitance: total, gainBandwidth }));
  return { gain: feedback, a: feedback * (response.feedbackCapacitance ?? flat()), b: 0, c: 0 };
}

/**
 * One pole at GBW/NG; with a feedback capacitor 1 + s(Rf·Cf + NG/ωt) + s²·Rf·Cf/ωt. The zero of a non-inverting stage, at NG times the
 * feedback pole, only makes it faster and is left out.
 */
function amplifierLoop(stage: Stage): ClosedLoop {
  const feedback = (stage.resistors?.feedback ?? 0) * feedbackCapacitance(stage);
  const at = (gainBandwidth: number): LowPass => {
    const slowness = 1 / (2 * Math.PI * gainBandwidth);
    return { gain: stage.gain, a: feedback + stage.noiseGain.nominal * slowness, b: feedback * slowness, c: 0 };
  };
  return { form: feedback === 0 ? 'one-pole' : 'more-poles', countsInput: false, at: ({ gainBandwidth }) => at(gainBandwidth), idealAt: () => at(Infinity) };
}

/** V from one final value to the other: what a filter overshoots is in the swing of its output, not in its step. */
export function settledStep({ response, outputStep }: Stage): number {
  return response.kind === 'low-pass' ? outputStep / response.growth : outputStep;
}

/** F across the feedback resistor of an amplifier stage; 0 without. */
export function feedbackCapacitance({ network }: Stage): number {
  const fitted = network?.minus.elements.find(({ kind, between }) => kind === 'capacitor' && between.includes('output'));
  return fitted?.value ?? 0;
}
