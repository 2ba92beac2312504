import { describe, expect, it } from 'vitest';
import { handbookGainBandwidth, multipleFeedbackShift, sallenKeyShift, twoIntegratorQ } from '../../src/formulas/filter-rules.js';
import { example, refuses } from '../support/examples.js';

describe('rules for filters', () => {
  const unit = 1 / (2 * Math.PI * 1e3 * 1e4);
  const equalR = { r1: 1e4, r2: 1e4, c1: 10 * unit, c2: unit / 10, gain: 1 };
  example('sallenKeyShift, unity gain, equal R, Q = 5, GBW = 1000·f0', () => sallenKeyShift(equalR, 1e6), -0.0051);
  const equalAll = { r1: 1e4, r2: 1e4, c1: unit, c2: unit, gain: 2.8 };
  example('sallenKeyShift of equal R and C, 1.5·K·f0/GBW,', () => sallenKeyShift(equalAll, 1e6), -0.0042);
  const stage = { q: 5, gain: 1, naturalFrequency: 10e3, gainBandwidth: 20e6 };
  example('multipleFeedbackShift, frequency', () => multipleFeedbackShift(stage).frequency, -0.00505);
  example('multipleFeedbackShift, Q', () => multipleFeedbackShift(stage).q, 0.00255);
  example('twoIntegratorQ', () => twoIntegratorQ({ q: 25, naturalFrequency: 10e3, gainBandwidth: 100e6 }), 25.2525);
  example('handbookGainBandwidth(1, 10e3, 5)', () => handbookGainBandwidth(1, 10e3, 5), 4.97468e6);
  example('handbookGainBandwidth of a Butterworth', () => handbookGainBandwidth(1, 10e3, Math.SQRT1_2), 1e6);
  it('equals the printed form of the handbook rule, 100·G·(fc/a)·√[(Q²−0.5)/(Q²−0.25)], with Q = √b/a and f0 = fc/√b', () => {
    const [a, b, corner] = [0.7673, 1.3827, 10e3];
    const q = Math.sqrt(b) / a;
    const printed = ((100 * corner) / a) * Math.sqrt((q * q - 0.5) / (q * q - 0.25));
    expect(handbookGainBandwidth(1, corner / Math.sqrt(b), q) / printed).toBeCloseTo(1, 12);
  });
  refuses(() => sallenKeyShift(equalR, 0), 'sallenKeyShift: gainBandwidth must be finite, above 0, but is 0');
  refuses(() => multipleFeedbackShift({ ...stage, gain: -1 }), 'multipleFeedbackShift: gain must be finite, at least 0, but is -1');
  refuses(
    () => twoIntegratorQ({ q: 25, naturalFrequency: 10e3, gainBandwidth: 1e6 }),
    'twoIntegratorQ: gainBandwidth must be finite, above 1000000, but is 1000000',
  );
  refuses(() => handbookGainBandwidth(1, 1, 0), 'handbookGainBandwidth: q must be finite, above 0, but is 0');
});
