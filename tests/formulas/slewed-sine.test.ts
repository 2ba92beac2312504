import { describe, expect, it } from 'vitest';
import { slewedDistortion, slewedPeak, TRIANGLE_DISTORTION, TRIANGLE_RATIO } from '../../src/formulas/slewed-sine.js';
import { example, refuses } from '../support/examples.js';
import { harmonics, slewLimitedSine } from '../support/waveforms.js';

describe('sine through a slew limit', () => {
  example('slewedPeak(0.4)', () => slewedPeak(0.4), 0.62832);
  example('slewedPeak(0.73), slewing but of full height,', () => slewedPeak(0.73), 1);
  example('slewedDistortion(0.75)', () => slewedDistortion(0.75), 0.080757);
  it('is clean from a ratio of 1 on', () => {
    expect([slewedPeak(1), slewedDistortion(1), slewedDistortion(3)]).toEqual([1, 0, 0]);
  });
  it('is continuous where the output becomes a triangle', () => {
    expect(slewedDistortion(TRIANGLE_RATIO * 1.000001)).toBeCloseTo(TRIANGLE_DISTORTION, 4);
    expect(slewedPeak(TRIANGLE_RATIO * 1.000001)).toBeCloseTo((Math.PI / 2) * TRIANGLE_RATIO, 4);
  });
  it('agrees in height and distortion with a sine stepped through time, over the whole range', () => {
    for (const ratio of [0.3, 0.55, 0.6, 0.7, 0.8, 0.9, 0.95]) {
      const period = slewLimitedSine(ratio, 20_000);
      expect(slewedPeak(ratio)).toBeCloseTo(Math.max(...period), 3);
      expect(slewedDistortion(ratio)).toBeCloseTo(harmonics(period).distortion, 3);
    }
  });
  refuses(() => slewedPeak(0), 'slewedPeak: ratio must be finite, above 0, but is 0');
  refuses(() => slewedDistortion(-1), 'slewedDistortion: ratio must be finite, above 0, but is -1');
});
