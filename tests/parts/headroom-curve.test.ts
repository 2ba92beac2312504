import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import { headroomCurve, heaviestPoint, type HeadroomReading } from '../../src/parts/headroom-curve.js';
import { amperes, assumed, max, ohms, typ, under } from '../support/parts.js';

const low = (volts: number, current: number, supply?: number): Figure => max('outputLowHeadroom', volts, amperes(current, supply));

/** Head-room at a current on a supply of 5 V. */
function at(figures: readonly Figure[], current: number, more: { supply?: number; assistingLoad?: number | null; outlook?: 'optimistic' } = {}): HeadroomReading {
  const { supply = 5, assistingLoad = null, outlook = 'pessimistic' } = more;
  return headroomCurve(under(figures, { outlook }), 'low')({ supply, current, assistingLoad });
}

describe('one set of points', () => {
  const CURVE = [low(0.05, 1e-3, 5), low(0.2, 4e-3, 5)];

  it('is piecewise linear in current', () => {
    expect(at(CURVE, 2e-3)).toMatchObject({ basis: 'guaranteed' });
    expect(at(CURVE, 2e-3).value).toBeCloseTo(0.05 + (0.15 * 1) / 3, 15);
    expect(at(CURVE, 1e-3).value).toBe(0.05);
    expect(at(CURVE, 4e-3).value).toBe(0.2);
  });

  it('holds its lightest value below its lightest point', () => {
    expect(at(CURVE, 0.5e-3).value).toBe(0.05);
    expect(at(CURVE, 0).value).toBe(0.05);
  });

  it('is a straight line on, estimated, up to 1.5 × the heaviest current, exactly that included', () => {
    expect(at(CURVE, 5e-3).value).toBeCloseTo(0.2 + (0.15 * 1) / 3, 15);
    expect(at(CURVE, 5e-3).basis).toBe('estimated');
    expect(at(CURVE, 6e-3).value).toBeCloseTo(0.2 + (0.15 * 2) / 3, 15);
    expect(at(CURVE, 5e-3, { outlook: 'optimistic' }).value).toBe(0.2);
  });

  it('is unknown further out, with the heaviest point as bound', () => {
    expect(at(CURVE, 6.001e-3)).toMatchObject({ value: null, bound: 0.2 });
  });

  it('of one point goes through the origin', () => {
    expect(at([low(0.1, 2e-3, 5)], 3e-3).value).toBeCloseTo(0.15, 15);
    expect(at([low(0.1, 2e-3, 5)], 1e-3).value).toBe(0.1);
  });

  it('never falls below the heaviest point', () => {
    expect(at([low(0.3, 1e-3, 5), low(0.2, 2e-3, 5)], 2.5e-3).value).toBe(0.2);
  });

  it('has the larger value at equal current', () => {
    // 2 kΩ to mid-supply at 5 V with 0.1 V: (2.5 - 0.1)/2 kΩ = 1.2 mA.
    const same = [low(0.15, 1.2e-3, 5), max('outputLowHeadroom', 0.1, ohms(2e3, 'mid-supply', 5))];
    expect(at(same, 1.2e-3).value).toBe(0.15);
    expect(at([...same].reverse(), 1.2e-3).value).toBe(0.15);
  });

  it('has the weaker basis of the two points it lies between', () => {
    const mixed = [typ('outputLowHeadroom', 0.1, amperes(1e-3, 5)), low(0.3, 3e-3, 5)];
    expect(at(mixed, 2e-3)).toMatchObject({ basis: 'derated' });
    expect(at(mixed, 2e-3).value).toBeCloseTo((0.15 + 0.3) / 2, 15);
    expect(at(mixed, 2e-3, { outlook: 'optimistic' }).value).toBeCloseTo((0.1 + 0.3) / 2, 15);
    expect(at(mixed, 3e-3).basis).toBe('guaranteed');
  });

  it('that stands at no current says nothing of any other', () => {
    expect(at([low(0.1, 0, 5)], 0).value).toBe(0.1);
    expect(at([low(0.1, 0, 5)], 1e-6).value).toBeNull();
  });

  it('without points is unknown without a bound', () => {
    expect(at([], 1e-3)).toMatchObject({ value: null, bound: null });
  });
});

describe('sets at several supplies', () => {
  const scaled = (volts: number, from: number, to: number): number => (volts * (from - 0.7)) / (to - 0.7);

  it('count at or below the supply as they are', () => {
    expect(at([low(0.1, 1e-3, 3)], 1e-3)).toMatchObject({ value: 0.1, basis: 'guaranteed' });
    expect(at([low(0.1, 1e-3, 5)], 1e-3)).toMatchObject({ value: 0.1, basis: 'guaranteed' });
  });

  it('count above it scaled by (VS1 - 0.7)/(VS2 - 0.7), estimated; at best as printed', () => {
    const one = [low(0.1, 1e-3, 10)];
    expect(at(one, 1e-3).value).toBeCloseTo(scaled(0.1, 10, 5), 15);
    expect(at(one, 1e-3).basis).toBe('estimated');
    expect(at(one, 1e-3, { outlook: 'optimistic' }).value).toBe(0.1);
  });

  it('are the smaller of the nearest below and the nearest above', () => {
    // 0.1 V at 10 V is 0.216 V at 5 V.
    const limit = scaled(0.1, 10, 5);
    expect(at([low(limit + 0.001, 1e-3, 3), low(0.1, 1e-3, 10)], 1e-3).value).toBeCloseTo(limit, 15);
    expect(at([low(limit - 0.001, 1e-3, 3), low(0.1, 1e-3, 10)], 1e-3)).toMatchObject({ value: limit - 0.001, basis: 'guaranteed' });
  });

  it('are only the nearest on each side', () => {
    expect(at([low(0.01, 1e-3, 2.7), low(0.2, 1e-3, 3)], 1e-3).value).toBe(0.2);
    expect(at([low(0.1, 1e-3, 10), low(0.0001, 1e-3, 15)], 1e-3).value).toBeCloseTo(scaled(0.1, 10, 5), 15);
  });

  it('that end before the current count only if the other does too', () => {
    // The lower set would give 0.03 V on its line, but it ends at 1 mA.
    const sets = [low(0.02, 1e-3, 3), low(0.1, 2e-3, 10)];
    expect(at(sets, 1e-3).value).toBe(0.02);
    expect(at(sets, 1.4e-3).value).toBeCloseTo(scaled(0.1, 10, 5), 15);
    // Beyond both: the smaller of both lines that still reach there.
    expect(at(sets, 2.5e-3).value).toBeCloseTo((scaled(0.1, 10, 5) * 2.5) / 2, 15);
    expect(at([low(0.02, 1e-3, 3), low(0.1, 1.2e-3, 10)], 1.4e-3).value).toBeCloseTo((0.02 * 1.4) / 1, 15);
  });

  it('give the smaller bound when both are left behind', () => {
    expect(at([low(0.2, 1e-3, 3), low(0.05, 1e-3, 10)], 2e-3)).toMatchObject({ value: null });
    expect(at([low(0.2, 1e-3, 3), low(0.05, 1e-3, 10)], 2e-3).bound).toBeCloseTo(scaled(0.05, 10, 5), 15);
    expect(at([low(0.2, 1e-3, 3), low(0.05, 1e-3, 10)], 2e-3, { outlook: 'optimistic' }).bound).toBe(0.05);
  });

  it('join points without a supply at the supply asked', () => {
    const reading = at([low(0.1, 1e-3), low(0.3, 3e-3, 5)], 2e-3);
    expect(reading.value).toBeCloseTo(0.2, 15);
    expect(reading.basis).toBe('assumed');
    expect(at([low(0.1, 1e-3), low(0.3, 1e-3, 3)], 1e-3, { supply: 4 }).value).toBe(0.1);
  });

  it('are not scaled onto a supply that the threshold uses up', () => {
    expect(at([low(0.1, 1e-3, 5)], 1e-3, { supply: 0.7 })).toMatchObject({ value: null, bound: null });
  });
});

it('of several head-rooms assumed without a load the worse counts, at any current', () => {
  const points = [assumed(max('outputLowHeadroom', 0.02, { supply: 3 })), assumed(max('outputLowHeadroom', 0.06, { supply: 10 }))];
  for (const figures of [points, points.toReversed()]) expect(at(figures, 5e-3)).toMatchObject({ value: 0.06, basis: 'assumed' });
});

describe('assisted points', () => {
  const helped = max('outputLowHeadroom', 0.005, ohms(10e3, 'ground', 5));

  it('count only where a load helps that is no larger than theirs', () => {
    expect(at([helped], 0, { assistingLoad: 10e3 }).value).toBe(0.005);
    expect(at([helped], 0, { assistingLoad: 2e3 }).value).toBe(0.005);
    expect(at([helped], 0, { assistingLoad: 10.001e3 }).value).toBeNull();
    expect(at([helped], 0)).toMatchObject({ value: null, bound: null });
  });

  it('are dropped before the sets are chosen', () => {
    const sets = [helped, low(0.03, 1e-3, 3)];
    expect(at(sets, 0).value).toBe(0.03);
    expect(at(sets, 0, { assistingLoad: 10e3 }).value).toBe(0.005);
  });
});

describe('the heaviest point of a side', () => {
  it('is the largest current of any supply, assisted points apart', () => {
    const figures = [low(0.1, 1e-3, 5), low(0.2, 3e-3, 3), max('outputLowHeadroom', 0.01, ohms(1, 'ground', 5))];
    expect(heaviestPoint(under(figures), 'low', 5)).toMatchObject({ amperes: 3e-3 });
    expect(heaviestPoint(under([max('outputLowHeadroom', 0.1, ohms(2e3, 'supply'))]), 'low', 4)?.amperes).toBeCloseTo((4 - 0.1) / 2e3, 15);
    expect(heaviestPoint(under([]), 'low', 5)).toBeNull();
    // 3 mA twice, once without a supply: the one that is stated carries it.
    const twice = [low(0.2, 3e-3), low(0.2, 3e-3, 3)];
    for (const points of [twice, twice.toReversed()]) expect(heaviestPoint(under(points), 'low', 5)).toMatchObject({ amperes: 3e-3, basis: 'guaranteed' });
  });
});

describe('a curve asked again and again', () => {
  it('answers as a new one does, at any supply, current and load in any order', () => {
    const figures = [low(0.05, 1e-3, 5), low(0.2, 4e-3, 5), low(0.08, 1e-3, 2.7), low(0.1, 1e-3), max('outputLowHeadroom', 0.02, ohms(2e3, 'ground', 5))];
    const question = fc.record({ supply: fc.constantFrom(1.8, 2.7, 3, 5, 5.5), current: fc.constantFrom(0, 1e-3, 3e-3, 9e-3), assistingLoad: fc.constantFrom(null, 1e3, 10e3) });
    fc.assert(fc.property(fc.constantFrom('pessimistic' as const, 'optimistic' as const), fc.array(question, { minLength: 2, maxLength: 12 }), (outlook, asked) => {
      const curve = headroomCurve(under(figures, { outlook }), 'low');
      for (const one of asked) expect(curve(one)).toEqual(headroomCurve(under(figures, { outlook }), 'low')(one));
    }));
  });
});
