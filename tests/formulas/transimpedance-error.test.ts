import { describe, expect, it } from 'vitest';
import { magnitudeAt } from '../../src/formulas/low-pass-response.js';
import { gainBandwidthForFlatBandwidth, gainBandwidthForTransimpedanceError, transimpedanceLowPass } from '../../src/formulas/transimpedance-error.js';
import { example, refuses } from '../support/examples.js';

const FLAT = { feedback: 100e3, inputCapacitance: 20e-12, feedbackCapacitance: null };
const magnitude = (frequency: number, error = 0.01) => ({ frequency, error, kind: 'magnitude' as const });

describe('gain error of a transimpedance stage', () => {
  example('transimpedanceLowPass(…).a', () => transimpedanceLowPass({ ...FLAT, inputCapacitance: 50e-12 }, 10e6).a, 4.1454e-7);
  example('gainBandwidthForTransimpedanceError(…) at −3 dB', () => gainBandwidthForTransimpedanceError(FLAT, magnitude(1e6, 1 - Math.SQRT1_2)), 13.9087e6);
  example('gainBandwidthForFlatBandwidth(…)', () => gainBandwidthForFlatBandwidth(FLAT, 1e6)!, 13.9087e6);

  it('leaves just the error with the maximally flat capacitor, also so slow that none is needed', () => {
    for (const frequency of [1e6, 200e3, 30e3, 3e3]) {
      const needed = gainBandwidthForTransimpedanceError(FLAT, magnitude(frequency));
      const error = (gainBandwidth: number): number => 1 - magnitudeAt(transimpedanceLowPass(FLAT, gainBandwidth), frequency) / FLAT.feedback;
      expect(error(needed)).toBeCloseTo(0.01, 9);
      expect(error(needed * 1.01)).toBeLessThan(0.01);
    }
  });

  it('with a given capacitor is the amplifier’s share, against the same stage with an ideal one', () => {
    const given = { ...FLAT, feedbackCapacitance: 1e-12 };
    const ideal = magnitudeAt(transimpedanceLowPass(given, Infinity), 200e3);
    const needed = gainBandwidthForTransimpedanceError(given, magnitude(200e3));
    const error = (gainBandwidth: number): number => Math.abs(magnitudeAt(transimpedanceLowPass(given, gainBandwidth), 200e3) / ideal - 1);
    expect(error(needed)).toBeCloseTo(0.01, 9);
    for (const factor of [1.01, 1.5, 4, 100]) expect(error(needed * factor)).toBeLessThan(0.01);
  });

  it('by the vector needs more, and the larger diode more', () => {
    const vector = gainBandwidthForTransimpedanceError(FLAT, { ...magnitude(100e3), kind: 'vector' });
    expect(vector).toBeGreaterThan(gainBandwidthForTransimpedanceError(FLAT, magnitude(100e3)));
    expect(gainBandwidthForTransimpedanceError({ ...FLAT, inputCapacitance: 40e-12 }, magnitude(1e6))).toBeGreaterThan(gainBandwidthForTransimpedanceError(FLAT, magnitude(1e6)));
  });

  it('without any capacitance is a follower', () => {
    expect(gainBandwidthForTransimpedanceError({ ...FLAT, inputCapacitance: 0 }, magnitude(1e6))).toBeCloseTo(1e6 / Math.sqrt(0.99 ** -2 - 1), 3);
  });

  refuses(() => gainBandwidthForTransimpedanceError(FLAT, magnitude(0)), 'gainBandwidthForTransimpedanceError: frequency must be finite, above 0, but is 0');
});
