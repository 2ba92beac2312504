import { describe, expect, it } from 'vitest';
import { clippedSineDistortion, clippingDistortion, clippingRatio } from '../../src/formulas/clipping.js';
import { example, refuses } from '../support/examples.js';
import { harmonics } from '../support/waveforms.js';

describe('clipping', () => {
  example('clippingDistortion(0.9)', () => clippingDistortion(0.9), 0.0421993);
  example('clippingDistortion(1e-6), nearly a square wave,', () => clippingDistortion(1e-6), Math.sqrt(Math.PI ** 2 / 8 - 1));
  example('clippingRatio(0.001)', () => clippingRatio(0.001), 0.995786);
  example('clippedSineDistortion({top: 0.9, bottom: 1})', () => clippedSineDistortion({ top: 0.9, bottom: 1 }), 0.0321045);
  it('agrees with the Fourier sums of a sampled sine, one side or both, and with the form for equal sides', () => {
    for (const [top, bottom] of [[0.9, 1], [0.7, 0.95], [1, 0.5], [0.2, 0.2]] as const) {
      const samples = Array.from({ length: 20_000 }, (_none, k) => Math.max(-bottom, Math.min(top, Math.sin((2 * Math.PI * (k + 0.5)) / 20_000))));
      expect(clippedSineDistortion({ top, bottom }) / harmonics(samples).distortion).toBeCloseTo(1, 6);
    }
    expect(clippedSineDistortion({ top: 0.9, bottom: 0.9 })).toBeCloseTo(clippingDistortion(0.9), 12);
    expect(clippedSineDistortion({ top: 1, bottom: 1 })).toBe(0);
  });
  it('is clean without clipping', () => {
    expect(clippingDistortion(1)).toBeLessThan(1e-7);
  });
  refuses(() => clippingDistortion(1.1), 'clippingDistortion: ratio must be finite, above 0, at most 1, but is 1.1');
  refuses(() => clippedSineDistortion({ top: 0, bottom: 1 }), 'clippedSineDistortion: top must be finite, above 0, at most 1, but is 0');
  refuses(() => clippingRatio(0.5), 'clippingRatio: distortion must be finite, above 0.000001, below 0.48, but is 0.5');
});
