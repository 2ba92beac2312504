import { describe, expect, it } from 'vitest';
import {
  secondOrderBandwidth,
  secondOrderOvershoot,
  secondOrderPeak,
  secondOrderPeakFrequency,
  secondOrderSettling,
} from '../../src/formulas/second-order.js';
import { example, refuses } from '../support/examples.js';

describe('second-order low-pass', () => {
  example('secondOrderPeak(2)', () => secondOrderPeak(2), 2.06559);
  example('secondOrderPeakFrequency(1)', () => secondOrderPeakFrequency(1), 0.70711);
  example('secondOrderBandwidth(1/√2)', () => secondOrderBandwidth(Math.SQRT1_2), 1);
  example('secondOrderBandwidth(0.001), one pole at Q·f0,', () => secondOrderBandwidth(0.001), 0.001);
  example('secondOrderOvershoot(1)', () => secondOrderOvershoot(1), 0.163034);
  example('secondOrderSettling(1, 1e6, 0.01)', () => secondOrderSettling(1, 1e6, 0.01), 1.5116e-6);
  it('has neither peak nor overshoot where there is none', () => {
    expect([secondOrderPeak(0.7), secondOrderPeakFrequency(0.7), secondOrderOvershoot(0.5)]).toEqual([1, 0, 0]);
  });
  refuses(() => secondOrderPeak(0), 'secondOrderPeak: q must be finite, above 0, but is 0');
  refuses(() => secondOrderPeakFrequency(-1), 'secondOrderPeakFrequency: q must be finite, above 0, but is -1');
  refuses(() => secondOrderBandwidth(0), 'secondOrderBandwidth: q must be finite, above 0, but is 0');
  refuses(() => secondOrderOvershoot(0), 'secondOrderOvershoot: q must be finite, above 0, but is 0');
  refuses(() => secondOrderSettling(0.5, 1, 0.1), 'secondOrderSettling: q must be finite, above 0.5, but is 0.5');
});
