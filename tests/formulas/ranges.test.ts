import { describe, expect, it } from 'vitest';
import { difference, differenceSourceLimit, follower, inverting, nonInverting, summing } from '../../src/formulas/ranges.js';
import { example, refuses } from '../support/examples.js';

describe('where a stage stands', () => {
  it('follower: everything is the input', () => {
    expect(follower(1.2)).toEqual({ output: 1.2, commonMode: 1.2, noiseGain: 1 });
  });
  it('non-inverting: the signal is amplified about the reference', () => {
    const point = nonInverting({ input: 2.8, reference: 2.5, ratio: 4 });
    expect(point.output).toBeCloseTo(4, 12);
    expect([point.commonMode, point.noiseGain]).toEqual([2.8, 5]);
  });
  it('inverting: a grounded source makes it idle above the reference', () => {
    expect(inverting({ input: 0, reference: 2.5, ratio: 2 })).toEqual({ output: 7.5, commonMode: 2.5, noiseGain: 3 });
  });
  it('summing: a grounded leg counts in the noise gain', () => {
    const legs = [{ input: 1, ratio: 1 }, { input: 0, ratio: 2 }];
    expect(summing({ legs, reference: 0 })).toEqual({ output: -1, commonMode: 0, noiseGain: 4 });
  });
  const bridge = { positive: 12, negative: 11.9, reference: 0, negativeRatio: 10, positiveRatio: 10 };
  example('difference, output', () => difference(bridge).output, 1);
  example('difference, common mode at the pins', () => difference(bridge).commonMode, 10.909);
  it('difference: unequal ratios let the common mode through', () => {
    const point = difference({ positive: 1, negative: 1, reference: 0, negativeRatio: 1, positiveRatio: 3 });
    expect(point.output).toBeCloseTo(0.75 * 2 - 1, 12);
  });
  example('differenceSourceLimit(3.5, 0, 0.25)', () => differenceSourceLimit(3.5, 0, 0.25), 17.5);
  refuses(() => follower(NaN), 'follower: input must be finite, but is NaN');
  refuses(() => nonInverting({ input: 1, reference: 0, ratio: -1 }), 'nonInverting: ratio must be finite, at least 0, but is -1');
  refuses(() => inverting({ input: 1, reference: 0, ratio: -1 }), 'summing: ratio must be finite, at least 0, but is -1');
  refuses(() => summing({ legs: [], reference: Infinity }), 'summing: reference must be finite, but is Infinity');
  refuses(() => difference({ ...bridge, positiveRatio: -1 }), 'difference: positiveRatio must be finite, at least 0, but is -1');
  refuses(() => differenceSourceLimit(1, 0, 0), 'differenceSourceLimit: gain must be finite, above 0, but is 0');
});
