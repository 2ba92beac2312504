import { describe, expect, it } from 'vitest';
import { clippingDistortion, clippingRatio } from '../../src/formulas/clipping.js';
import { example, refuses } from '../support/examples.js';

describe('clipping', () => {
  example('clippingDistortion(0.9)', () => clippingDistortion(0.9), 0.0421993);
  example('clippingDistortion(1e-6), nearly a square wave,', () => clippingDistortion(1e-6), Math.sqrt(Math.PI ** 2 / 8 - 1));
  example('clippingRatio(0.001)', () => clippingRatio(0.001), 0.995786);
  it('is clean without clipping', () => {
    expect(clippingDistortion(1)).toBeLessThan(1e-7);
  });
  refuses(() => clippingDistortion(1.1), 'clippingDistortion: ratio must be finite, above 0, at most 1, but is 1.1');
  refuses(() => clippingRatio(0.5), 'clippingRatio: distortion must be finite, above 0.000001, below 0.48, but is 0.5');
});
