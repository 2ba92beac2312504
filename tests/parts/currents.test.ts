import { describe, expect, it } from 'vitest';
import { inputCurrentReading } from '../../src/parts/currents.js';
import type { Figure } from '../../src/parts/figures.js';
import type { InputType } from '../../src/parts/part.js';
import type { Outlook } from '../../src/parts/reading.js';
import { AT_25, max, partOf, typ, under } from '../support/parts.js';

interface Asked {
  readonly inputType?: InputType;
  readonly outlook?: Outlook;
  readonly parameter?: 'biasCurrent' | 'offsetCurrent';
}

/** Value and basis of the bias current with the stage's top at so many °C. */
function bias(figures: readonly Figure[], hottest: number, asked: Asked = {}): [number, string] | null {
  const { inputType = null, outlook = 'pessimistic', parameter = 'biasCurrent' } = asked;
  const part = partOf(figures, { inputType });
  const reading = inputCurrentReading({ ...under([]), part, outlook, operating: { ...AT_25, hottest } }, parameter);
  return reading === null ? null : [reading.value, reading.basis];
}

const at = (value: number, temperature?: number | 'over'): Figure => max('biasCurrent', value, temperature === undefined ? {} : { temperature });

describe('the rating that counts', () => {
  const rated = [at(1e-12, 25), at(20e-12, 60), at(100e-12, 85), at(1e-9, 125)];

  it('is at the lowest temperature at or above the top of the stage', () => {
    expect(bias(rated, 25)).toEqual([1e-12, 'guaranteed']);
    expect(bias(rated, 59)).toEqual([20e-12, 'guaranteed']);
    expect(bias(rated, 60)).toEqual([20e-12, 'guaranteed']);
    expect(bias(rated, 60.1)).toEqual([100e-12, 'guaranteed']);
  });

  it('is at 25 °C when none is stated', () => {
    expect(bias([at(5e-9)], 25)).toEqual([5e-9, 'guaranteed']);
    expect(bias([at(5e-12)], 35, { inputType: 'fet' })).toEqual([10e-12, 'estimated']);
  });

  it('is of several at one temperature the worse of those on the strongest basis', () => {
    // Nothing stated is 25 °C too.
    const limits = [at(1e-12), at(5e-12, 25)];
    for (const figures of [limits, limits.toReversed()]) expect(bias(figures, 25)).toEqual([5e-12, 'guaranteed']);
    expect(bias([...limits, { ...at(9e-12, 25), assumed: true }], 25)).toEqual([5e-12, 'guaranteed']);
  });

  it('may be over temperature: that covers any top, after every stated one', () => {
    expect(bias([at(5e-9, 'over'), at(1e-12, 25)], 200)).toEqual([5e-9, 'guaranteed']);
    expect(bias([at(5e-9, 'over'), at(1e-12, 85)], 60)).toEqual([1e-12, 'guaranteed']);
  });

  it('is chosen by temperature before a limit is preferred to a typical', () => {
    expect(bias([typ('biasCurrent', 1e-12, { temperature: 60 }), at(50e-12, 85)], 60)).toEqual([4 * 1e-12, 'derated']);
    expect(bias([typ('biasCurrent', 1e-12, { temperature: 60 }), at(50e-12, 60)], 60)).toEqual([50e-12, 'guaranteed']);
  });
});

describe('only a cooler rating', () => {
  it('doubles per 10 K from the hottest of them with FET inputs, estimated even when guaranteed', () => {
    expect(bias([at(1e-12, 25), at(4e-12, 45)], 65, { inputType: 'fet' })).toEqual([4e-12 * 2 ** 2, 'estimated']);
  });

  it('stands as printed on the optimistic reading', () => {
    expect(bias([at(4e-12, 25)], 85, { inputType: 'fet', outlook: 'optimistic' })).toEqual([4e-12, 'estimated']);
  });

  it('is derated first when only typical', () => {
    expect(bias([typ('biasCurrent', 1e-12)], 45, { inputType: 'fet' })?.[0]).toBeCloseTo(4 * 1e-12 * 4, 24);
  });

  it('never doubles with bipolar inputs', () => {
    expect(bias([at(1e-12, 25)], 85, { inputType: 'bipolar' })).toEqual([1e-12, 'guaranteed']);
  });

  it('of an unknown input doubles when the printed bias current at its lowest temperature is below 1 nA, not at it', () => {
    expect(bias([at(0.999e-9, 25)], 35)).toEqual([2 * 0.999e-9, 'estimated']);
    expect(bias([at(1e-9, 25)], 35)).toEqual([1e-9, 'guaranteed']);
    // 1.2 nA at 45 °C but 0.3 nA at 25 °C: a FET.
    expect(bias([at(0.3e-9, 25), at(1.2e-9, 45)], 55)).toEqual([2 * 1.2e-9, 'estimated']);
  });

  it('of an unknown input asks the bias current as printed, not derated', () => {
    expect(bias([typ('biasCurrent', 0.9e-9, { temperature: 25 })], 35)?.[0]).toBeCloseTo(4 * 0.9e-9 * 2, 20);
  });

  it('of an offset current follows the bias current of the part', () => {
    const offset = (biasAt25: number): [number, string] | null => bias([at(biasAt25, 25), max('offsetCurrent', 1e-12)], 45, { parameter: 'offsetCurrent' });
    expect(offset(1e-12)).toEqual([4 * 1e-12, 'estimated']);
    expect(offset(1e-7)).toEqual([1e-12, 'guaranteed']);
    expect(bias([max('offsetCurrent', 1e-12)], 45, { parameter: 'offsetCurrent' })).toEqual([1e-12, 'guaranteed']);
  });
});
