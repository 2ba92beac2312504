import { describe, expect, it } from 'vitest';
import { halfPowerFrequency, magnitudeAt, peakOf } from '../../src/formulas/low-pass-response.js';
import { secondOrderBandwidth, secondOrderPeak, secondOrderPeakFrequency } from '../../src/formulas/second-order.js';
import { example } from '../support/examples.js';

describe('low-pass response', () => {
  const turn = 2 * Math.PI;
  example('halfPowerFrequency of Butterworth, ω0 = 1', () => halfPowerFrequency({ gain: 1, a: Math.SQRT2, b: 1, c: 0 }), 1 / turn);
  example('peakOf Q = 2', () => peakOf({ gain: 1, a: 0.5, b: 1, c: 0 }).gain, 2.06559);
  example('magnitudeAt the corner of one pole', () => magnitudeAt({ gain: 1, a: 1, b: 0, c: 0 }, 1 / turn), 0.70711);
  it('agrees with the closed second-order forms, and with one pole', () => {
    for (const q of [0.3, Math.SQRT1_2, 1, 10]) {
      const response = { gain: -3, a: 1 / q, b: 1, c: 0 };
      expect(halfPowerFrequency(response) * turn).toBeCloseTo(secondOrderBandwidth(q), 10);
      expect(peakOf(response).gain).toBeCloseTo(3 * secondOrderPeak(q), 10);
      expect(peakOf(response).frequency * turn).toBeCloseTo(secondOrderPeakFrequency(q), 6);
    }
    expect(halfPowerFrequency({ gain: 1, a: 1, b: 0, c: 0 }) * turn).toBeCloseTo(1, 12);
  });
  it('takes the first fall to −3 dB of a response that rises again behind it', () => {
    // One slow pole before a high resonance: (1 + s)(1 + s/500 + s²/100).
    const response = { gain: 1, a: 1 + 1 / 500, b: 1 / 500 + 1 / 100, c: 1 / 100 };
    expect(halfPowerFrequency(response) * turn).toBeCloseTo(1.021, 3);
    expect(peakOf(response).gain).toBeGreaterThan(1);
  });
});
