import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { crossoverOf, boundedCrossover, falsePosition, laggingCrossover } from '../../src/checks/phase-margin-crossover.js';

describe('the crossover of a loop gain', () => {
  it('is exact for one pole: GBW/NG', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 1e9, noNaN: true }), fc.double({ min: 1, max: 1e6, noNaN: true }), (hertz, gain) => {
        expect(crossoverOf((frequency) => Math.log(hertz / gain / frequency), hertz)! / (hertz / gain)).toBeCloseTo(1, 11);
      }),
    );
  });

  it('is the highest of several', () => {
    // 1 at 1, 10 and 100 Hz, below 1 in between.
    const gain = (frequency: number): number => -Math.log(frequency) * Math.log(frequency / 10) * Math.log(frequency / 100);
    expect(crossoverOf(gain, 1e3)).toBeCloseTo(100, 8);
  });

  it('is none where the gain stays below 1', () => {
    expect(crossoverOf(() => -1, 1e6)).toBeNull();
  });

  it('lies above the gain bandwidth where the network lifts it', () => {
    expect(crossoverOf((frequency) => Math.log(1e9 / frequency), 1e6)! / 1e9).toBeCloseTo(1, 11);
  });
});

describe('the crossover of a loop that only lags', () => {
  const hertz = (from: number, to: number): fc.Arbitrary<number> => fc.double({ min: Math.log(from), max: Math.log(to), noNaN: true }).map(Math.exp);

  it('is that of the whole search, from fewer places', () => {
    fc.assert(
      fc.property(hertz(1e2, 1e9), hertz(1, 1e5), hertz(1e2, 1e9), hertz(1e2, 1e9), (gainBandwidth, noiseGain, pole, other) => {
        let looks = 0;
        const gain = (frequency: number): number => Math.log(gainBandwidth / noiseGain / frequency / Math.hypot(1, frequency / pole) / Math.hypot(1, frequency / other));
        const counted = (frequency: number): number => {
          looks += 1;
          return gain(frequency);
        };
        expect(laggingCrossover(counted, gainBandwidth / noiseGain) / crossoverOf(gain, gainBandwidth)!).toBeCloseTo(1, 10);
        expect(looks).toBeLessThan(16);
      }),
      { numRuns: 1000 },
    );
  });

  it('is the most there is where nothing takes from it', () => {
    expect(laggingCrossover((frequency) => Math.log(1e6 / frequency), 1e6) / 1e6).toBeCloseTo(1, 11);
  });
});

describe('the crossover of a loop that is bounded', () => {
  const hertz = (from: number, to: number): fc.Arbitrary<number> => fc.double({ min: Math.log(from), max: Math.log(to), noNaN: true }).map(Math.exp);

  it('is that of the whole search to the last bit, from fewer places', () => {
    fc.assert(
      fc.property(hertz(1e2, 1e9), hertz(1, 1e5), hertz(1e2, 1e9), (gainBandwidth, noiseGain, pole) => {
        const looks = { whole: 0, short: 0 };
        const gain = (by: 'whole' | 'short') => (frequency: number): number => {
          looks[by] += 1;
          return Math.log(gainBandwidth / noiseGain / frequency / Math.hypot(1, frequency / pole));
        };
        expect(boundedCrossover(gain('short'), gainBandwidth, gainBandwidth / noiseGain)).toBe(crossoverOf(gain('whole'), gainBandwidth));
        expect(looks.short).toBeLessThanOrEqual(looks.whole);
        if (noiseGain > 8) expect(looks.short).toBeLessThan(looks.whole - 6);
      }),
    );
  });

  it('is none where nothing comes back', () => {
    expect(boundedCrossover(() => -Infinity, 1e6, 0)).toBeNull();
  });
});

it('regula falsi finds a zero between two places, also of a function that is flat on one side', () => {
  const flat = (x: number): number => Math.min(1, 3 - x);
  expect(falsePosition(flat, { position: -50, left: 1 }, { position: 100, left: -97 })).toBeCloseTo(3, 10);
  expect(falsePosition((x) => x ** 3 - 8, { position: 0, left: -8 }, { position: 50, left: 124_992 })).toBeCloseTo(2, 10);
});
