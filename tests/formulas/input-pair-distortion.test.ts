import { describe, expect, it } from 'vitest';
import { slewMarginForDistortion, thirdHarmonicBipolar, thirdHarmonicMos } from '../../src/formulas/input-pair-distortion.js';
import { example, refuses } from '../support/examples.js';
import { followerWithPair, harmonic } from '../support/waveforms.js';

describe('third harmonic of an input pair', () => {
  const drive = { frequency: 10e3, gainBandwidth: 1e6, noiseGain: 1 };
  example('thirdHarmonicBipolar at half the slew rate', () => thirdHarmonicBipolar({ ...drive, ratio: 0.5 }), 2.5651e-4);
  example('thirdHarmonicMos at half the slew rate', () => thirdHarmonicMos({ ...drive, ratio: 0.5 }), 9.08e-5);
  example('slewMarginForDistortion for -80 dB', () => slewMarginForDistortion({ ...drive, harmonic: 1e-4 }), 3.0139);
  it('tends to r²/12 and r²/32 of f/GBW', () => {
    expect(thirdHarmonicBipolar({ ...drive, ratio: 0.01 }) / (0.01 * 0.01 ** 2)).toBeCloseTo(1 / 12, 4);
    expect(thirdHarmonicMos({ ...drive, ratio: 0.01 }) / (0.01 * 0.01 ** 2)).toBeCloseTo(1 / 32, 4);
  });
  it('agrees with a follower of each input pair stepped through time', () => {
    const mos = (x: number): number => x * Math.sqrt(1 - x ** 2 / 4);
    for (const [pair, formula] of [[Math.tanh, thirdHarmonicBipolar], [mos, thirdHarmonicMos]] as const) {
      const period = followerWithPair(pair, 100, 0.5);
      const measured = harmonic(period, 3) / harmonic(period, 1);
      expect(formula({ ...drive, ratio: 0.5 }) / measured).toBeCloseTo(1, 2);
    }
  });
  it('asks for no margin when even full slewing current stays within the limit', () => {
    expect(slewMarginForDistortion({ ...drive, harmonic: 0.01 })).toBe(1);
  });
  refuses(
    () => thirdHarmonicBipolar({ ...drive, ratio: 1.1 }),
    'thirdHarmonicBipolar: ratio must be finite, above 0, at most 1, but is 1.1',
  );
  refuses(() => thirdHarmonicMos({ ...drive, ratio: 0 }), 'thirdHarmonicMos: ratio must be finite, above 0, at most 1, but is 0');
  refuses(
    () => thirdHarmonicMos({ ...drive, ratio: 0.5, noiseGain: 0.5 }),
    'thirdHarmonicMos: noiseGain must be finite, at least 1, but is 0.5',
  );
  refuses(
    () => slewMarginForDistortion({ ...drive, harmonic: 0 }),
    'slewMarginForDistortion: harmonic must be finite, above 0, but is 0',
  );
});
