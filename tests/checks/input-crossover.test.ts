import { describe, expect, it } from 'vitest';
import { crossoverPart } from '../../src/checks/input-crossover.js';
import type { DistortionDemand, InputSwing } from '../../src/demands/index.js';
import { readingsOf } from '../../src/parts/readings.js';
import { ENTRIES } from '../support/check-values.js';
import { max, min, under } from '../support/parts.js';

/** 2 V peak about 2.5 V on 5 V, as in INP-01. */
const SWING: InputSwing = { near: 0.5, far: 4.5, supply: 5, noiseGain: 1, outputPeak: 2 };
const asked = (...crossovers: InputSwing[]): DistortionDemand => ({ crossovers, closest: Math.min(...crossovers.map(({ near }) => near)) }) as unknown as DistortionDemand;
/** The step is at most supply/CMRR: 1 mV. */
const REJECTION = min('commonModeRejection', 5000);
const region = (from: number, to: number) => [min('inputCrossover', from), max('inputCrossover', to)];

describe('step of the input crossover', () => {
  it('is INP-01 where the hand-over stands 1.5 V below V+', () => {
    const { terms } = crossoverPart(asked(SWING), readingsOf(under([REJECTION, ...region(1.4999, 1.5001)])));
    expect(terms[0]!.value / (ENTRIES.find(({ id }) => id === 'INP-01')!.expected as number)).toBeCloseTo(1, 2);
    expect(terms[0]!.basis).toBe('estimated');
  });

  it('is the worst place of the region, at best nothing, and grows by the noise gain', () => {
    const wide = [REJECTION, ...region(1, 1.8)];
    const value = (swing: InputSwing, outlook: 'pessimistic' | 'optimistic' = 'pessimistic'): number => crossoverPart(asked(swing), readingsOf(under(wide, { outlook }))).terms[0]!.value;
    expect(value(SWING)).toBeGreaterThanOrEqual(crossoverPart(asked(SWING), readingsOf(under([REJECTION, ...region(1.4999, 1.5001)]))).terms[0]!.value);
    expect(value(SWING, 'optimistic')).toBe(0);
    // Ten times less swing at the inputs of a gain of ten: the same step weighs ten times as much.
    expect(value({ near: 1.2, far: 1.6, supply: 5, noiseGain: 10, outputPeak: 2 })).toBeGreaterThan(5 * value(SWING));
  });

  it('is none outside the region, and of inputs that stand still', () => {
    const readings = readingsOf(under([REJECTION, ...region(1, 1.8)]));
    expect(crossoverPart(asked({ ...SWING, near: 2, far: 4 }), readings)).toEqual({ terms: [], missing: [], cautions: [] });
    expect(crossoverPart({ crossovers: [] } as unknown as DistortionDemand, readings).terms).toEqual([]);
  });

  it('without a rejection is missing it', () => {
    expect(crossoverPart(asked(SWING), readingsOf(under(region(1, 1.8)))).missing).toEqual([{ figure: 'commonModeRejection', kind: 'min' }]);
  });

  it('not stated is taken as none within 2 V of V+, and said, unless the part has one pair only', () => {
    const none = crossoverPart(asked(SWING), readingsOf(under([])));
    expect(none.terms[0]).toMatchObject({ value: 0, basis: 'assumed' });
    expect(none.cautions[0]).toMatch(/no input crossover known/u);
    const silent = { terms: [], missing: [], cautions: [] };
    expect(crossoverPart(asked({ ...SWING, near: 2.1 }), readingsOf(under([])))).toEqual(silent);
    expect(crossoverPart(asked(SWING), readingsOf(under([max('inputHighHeadroom', 1.2)])))).toEqual(silent);
  });
});
