import { describe, expect, it } from 'vitest';
import { gainBandwidthForShift, multipleFeedback, sallenKey, sallenKeyLoading, stopBandFloor } from '../../src/formulas/filters.js';
import { halfPowerFrequency } from '../../src/formulas/low-pass-response.js';
import { example, refuses } from '../support/examples.js';

describe('active filters', () => {
  const butterworth = { r1: 11_253.95, r2: 11_253.95, c1: 2e-9, c2: 1e-9, gain: 1 };
  const feedback = { r1: 10e3, r2: 10e3, r3: 5e3, c1: 4e-9, c2: 1e-9 };
  example('−3 dB of an ideal 10 kHz Butterworth Sallen-Key', () => halfPowerFrequency(sallenKey(butterworth, Infinity)), 10_000);
  example('−3 dB of the same at GBW = 300 kHz', () => halfPowerFrequency(sallenKey(butterworth, 300e3)), 9978.9);
  example('gain of a multiple-feedback stage', () => multipleFeedback(feedback, Infinity).gain, -1);
  example('gainBandwidthForShift of 1 %', () => gainBandwidthForShift((gbw) => sallenKey(butterworth, gbw), 0.01), 132_830);
  example('stopBandFloor(10e3, 10e3, 100)', () => stopBandFloor(10e3, 10e3, 100), 0.0098039);
  example('sallenKeyLoading at its corner, in phase: 1/R1', () => sallenKeyLoading(butterworth, 10e3).conductance, 1 / 11_253.95);
  example('sallenKeyLoading with K = 2 as a capacitance: C1/2', () => sallenKeyLoading({ ...butterworth, gain: 2 }, 10e3).capacitance, 1e-9);
  it('stands exactly at the shift it was asked for', () => {
    const responseAt = (gbw: number) => multipleFeedback(feedback, gbw);
    const found = gainBandwidthForShift(responseAt, 0.02);
    expect(Math.abs(halfPowerFrequency(responseAt(found)) / halfPowerFrequency(responseAt(Infinity)) - 1)).toBeCloseTo(0.02, 9);
  });
  refuses(() => sallenKey({ ...butterworth, gain: 0.5 }, 1e6), 'sallenKey: gain must be finite, at least 1, but is 0.5');
  refuses(() => sallenKey(butterworth, 0), 'sallenKey: gainBandwidth must be finite, above 0, but is 0');
  refuses(() => multipleFeedback({ ...feedback, c2: 0 }, 1e6), 'multipleFeedback: c2 must be finite, above 0, but is 0');
  refuses(
    () => gainBandwidthForShift((gbw) => sallenKey(butterworth, gbw), 0),
    'gainBandwidthForShift: shift must be finite, above 0, below 1, but is 0',
  );
  refuses(() => stopBandFloor(10e3, 10e3, 0), 'stopBandFloor: outputResistance must be finite, above 0, but is 0');
});
