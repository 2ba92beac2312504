import { expect, it } from 'vitest';
import { spectrumOf } from '../../src/prediction/spectrum.js';
import { harmonics } from '../support/waveforms.js';

const POINTS = 1024;
const wave = (of: (angle: number) => number): number[] => Array.from({ length: POINTS }, (_, k) => of((2 * Math.PI * k) / POINTS));

it('a fundamental of 2 with harmonics of 0.03 and 0.04: distortion 2.5 %, whatever the mean', () => {
  const found = spectrumOf(wave((angle) => 7 + 2 * Math.sin(angle + 0.4) + 0.03 * Math.cos(2 * angle) + 0.04 * Math.sin(5 * angle)));
  expect(found.fundamental).toBeCloseTo(2, 12);
  expect(found.distortion).toBeCloseTo(0.025, 12);
});

it('a triangle: 12.1 %, as by plain Fourier sums', () => {
  const triangle = wave((angle) => Math.asin(Math.sin(angle)));
  expect(spectrumOf(triangle).distortion).toBeCloseTo(0.1212, 3);
  expect(spectrumOf(triangle).distortion).toBeCloseTo(harmonics(triangle).distortion, 9);
});

it('nothing at all has no distortion', () => {
  expect(spectrumOf(wave(() => 3))).toEqual({ fundamental: 0, distortion: 0 });
});
