import { describe, expect, it } from 'vitest';
import {
  gainBandwidthForTransimpedance,
  highFrequencyNoiseGain,
  intersectionCapacitor,
  maximallyFlatCapacitor,
  transimpedanceResponse,
} from '../../src/formulas/transimpedance.js';
import { example, refuses } from '../support/examples.js';

describe('transimpedance', () => {
  const bare = { feedback: 100e3, inputCapacitance: 50e-12, gainBandwidth: 10e6 };
  const stage = { ...bare, feedbackCapacitance: 3.986247e-12 };
  example('transimpedanceResponse, f0', () => transimpedanceResponse(stage).naturalFrequency, 542_939);
  example('transimpedanceResponse, Q', () => transimpedanceResponse(stage).q, Math.SQRT1_2);
  example('maximallyFlatCapacitor', () => maximallyFlatCapacitor(bare), 3.986247e-12);
  example('intersectionCapacitor', () => intersectionCapacitor(bare), 2.901648e-12);
  example('gainBandwidthForTransimpedance', () => gainBandwidthForTransimpedance(1e6, 100e3, 20e-12), 13.90869e6);
  example('highFrequencyNoiseGain', () => highFrequencyNoiseGain(50e-12, 3.986247e-12), 13.5431);
  it('needs no capacitor behind a slow amplifier', () => {
    expect(maximallyFlatCapacitor({ ...bare, gainBandwidth: 1e3 })).toBe(0);
  });
  it('reaches the bandwidth asked for with the capacitor it names', () => {
    const gainBandwidth = gainBandwidthForTransimpedance(1e6, 100e3, 20e-12);
    const parts = { feedback: 100e3, inputCapacitance: 20e-12, gainBandwidth };
    const built = transimpedanceResponse({ ...parts, feedbackCapacitance: maximallyFlatCapacitor(parts) });
    expect(built.bandwidth / 1e6).toBeCloseTo(1, 9);
  });
  refuses(
    () => transimpedanceResponse({ ...stage, feedbackCapacitance: 0 }),
    'transimpedanceResponse: feedbackCapacitance must be finite, above 0, but is 0',
  );
  refuses(() => maximallyFlatCapacitor({ ...bare, feedback: 0 }), 'maximallyFlatCapacitor: feedback must be finite, above 0, but is 0');
  refuses(
    () => intersectionCapacitor({ ...bare, gainBandwidth: 0 }),
    'intersectionCapacitor: gainBandwidth must be finite, above 0, but is 0',
  );
  it('refuses a stage that is flat without any capacitor', () => {
    expect(() => gainBandwidthForTransimpedance(1e3, 1e3, 1e-12)).toThrow(/^gainBandwidthForTransimpedance: 2π·B·Rf·Cin .* above 0, but is -0\.58/);
  });
  refuses(() => highFrequencyNoiseGain(0, 0), 'highFrequencyNoiseGain: feedbackCapacitance must be finite, above 0, but is 0');
});
