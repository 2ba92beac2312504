import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gainBandwidthForMagnitudeError, gainBandwidthForVectorError } from '../../src/formulas/gain-bandwidth.js';
import { gainBandwidthForLoopError, type GainDeviation } from '../../src/formulas/loop-error.js';
import { example, refuses } from '../support/examples.js';

describe('gain error of a loop', () => {
  const resistive = { re: 0, im: 200e3 };
  example("gainBandwidthForLoopError({re: 0, im: 200e3}, 0.01, 'magnitude')", () => gainBandwidthForLoopError(resistive, 0.01, 'magnitude'), 1.4036e6);

  it('is the one-pole form of a resistive network', () => {
    expect(gainBandwidthForLoopError(resistive, 0.01, 'magnitude')).toBeCloseTo(gainBandwidthForMagnitudeError(10, 20e3, 0.01), 5);
    expect(gainBandwidthForLoopError(resistive, 0.01, 'vector')).toBeCloseTo(gainBandwidthForVectorError(10, 20e3, 0.01), 5);
    expect(gainBandwidthForLoopError({ re: 0, im: 0 }, 0.01, 'magnitude')).toBe(0);
  });

  const deviation = (z: { re: number; im: number }, gainBandwidth: number, kind: GainDeviation): number => {
    const [re, im] = [1 + z.re / gainBandwidth, z.im / gainBandwidth];
    const square = re * re + im * im;
    return kind === 'magnitude' ? Math.abs(1 / Math.sqrt(square) - 1) : Math.hypot(1 - re / square, im / square);
  };

  it('is met there and upwards and not just below, with lead, with lag and with peaking', () => {
    const angle = fc.double({ min: -1.5, max: 1.5, noNaN: true });
    fc.assert(
      fc.property(angle, fc.double({ min: 1e-4, max: 0.3, noNaN: true }), fc.constantFrom<GainDeviation>('magnitude', 'vector'), (turn, error, kind) => {
        const z = { re: 1e5 * Math.sin(turn), im: 1e5 * Math.cos(turn) };
        const needed = gainBandwidthForLoopError(z, error, kind);
        for (const factor of [1, 1.001, 1.3, 3, 100]) expect(deviation(z, needed * factor, kind)).toBeLessThanOrEqual(error * (1 + 1e-8));
        expect(deviation(z, needed * (1 - 1e-6), kind)).toBeGreaterThan(error);
      }),
    );
  });

  refuses(() => gainBandwidthForLoopError(resistive, 1, 'vector'), 'gainBandwidthForLoopError: error must be finite, above 0, below 1, but is 1');
});
