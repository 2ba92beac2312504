import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { ORDERS, rank } from '../../src/ranking/index.js';
import type { JudgedPart } from '../../src/screening/index.js';
import { fitting, passing } from '../support/fitting.js';

// Many cases a test: slow on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

const order = (...parts: JudgedPart[]): string[] => rank(parts).map(({ part }) => part.id);
const confirmation = { figure: 'slewRate', slot: null, basis: 'derated', how: null, checks: ['slew-rate'], needed: null } as const;

describe('the order of what fits', () => {
  it('is approved before generic, whatever the merit', () => {
    expect(order(fitting('GX', { tier: 'generic', price: 0.05 }), fitting('DEAR', { price: 19 }))).toEqual(['DEAR', 'GX']);
  });

  it('is proof by limits before typical, whatever the merit', () => {
    expect(order(fitting('TYPICAL', { proof: 'typical', price: 0.05 }), fitting('LIMITS', { price: 19 }))).toEqual(['LIMITS', 'TYPICAL']);
    expect(order(fitting('GX', { tier: 'generic' }), fitting('TYPICAL', { proof: 'typical' }))).toEqual(['TYPICAL', 'GX']);
  });

  it('is merit then', () => {
    expect(order(fitting('B', { price: 0.9 }), fitting('A', { price: 0.5 }))).toEqual(['A', 'B']);
  });

  it('goes by price, current, fewer estimates, id where merit is equal', () => {
    // Both prices are at the good end of the scale, so merit does not tell them apart.
    expect(order(fitting('A', { price: 0.04 }), fitting('B', { price: 0.03 }))).toEqual(['B', 'A']);
    expect(order(fitting('A', { current: 0.09e-6 }), fitting('B', { current: 0.08e-6 }))).toEqual(['B', 'A']);
    expect(order(fitting('A', { confirm: [confirmation, confirmation] }), fitting('B', { confirm: [confirmation] }))).toEqual(['B', 'A']);
    expect(order(fitting('B'), fitting('A'), fitting('C'))).toEqual(['A', 'B', 'C']);
  });

  it('puts a known price before an unknown one of the same merit', () => {
    // 500 EUR is at the floor, as not known is.
    expect(order(fitting('A', { price: null }), fitting('B', { price: 500 }))).toEqual(['B', 'A']);
  });
});

describe('another order', () => {
  const parts = [fitting('A', { price: 3, current: 1e-6, verdicts: [passing('slew-rate', 1.5)] }), fitting('B', { price: 1, current: 3e-6, verdicts: [passing('slew-rate', 1.1)] }), fitting('C', { price: 2, current: 2e-6, verdicts: [passing('slew-rate', 9)] })];

  it.each([['price', ['B', 'C', 'A']], ['current', ['A', 'C', 'B']], ['margin', ['C', 'A', 'B']]] as const)('by %s', (by, expected) => {
    expect(rank(parts, by).map(({ part }) => part.id)).toEqual(expected);
  });
});

describe('a ranked part', () => {
  it('has its place from 1, its tightest check and its dominator', () => {
    const tight = fitting('A', { verdicts: [passing('slew-rate', 1.05), passing('dc-error', 3)] });
    const [first, second] = rank([tight, fitting('B', { price: 0.5, verdicts: [passing('slew-rate', 2), passing('dc-error', 3)] })]);
    expect(first).toMatchObject({ rank: 1, part: { id: 'B' }, dominatedBy: null });
    expect(second).toMatchObject({ rank: 2, tightest: 'slew-rate', dominatedBy: 'B' });
  });

  it('is tightest at the supply-current budget where that is nearest', () => {
    const [one] = rank([fitting('A', { verdicts: [passing('slew-rate', 1.3), passing('supply-current', 1.02)] })]);
    expect(one?.tightest).toBe('supply-current');
    expect(rank([fitting('A', { verdicts: [passing('supply-low', 1)] })])[0]?.tightest).toBeNull();
  });
});

describe('adding or removing a part', () => {
  const size = (min: number, max: number): fc.Arbitrary<number | null> => fc.oneof(fc.constantFrom(min, (min + max) / 2, max), fc.double({ min, max, noNaN: true }), fc.constant(null));
  const any = fc.record({
    tier: fc.constantFrom('approved' as const, 'generic' as const),
    proof: fc.constantFrom('limits' as const, 'typical' as const),
    price: size(0.01, 30),
    current: size(1e-8, 0.03),
    estimates: fc.nat(3),
    margins: fc.array(fc.double({ min: 1, max: 20, noNaN: true }), { minLength: 1, maxLength: 3 }),
  });
  const parts = fc.array(any, { minLength: 2, maxLength: 12 }).map((all) =>
    all.map(({ estimates, margins, ...more }, at) =>
      fitting(`P-${at}`, { ...more, confirm: Array.from({ length: estimates }, () => confirmation), verdicts: margins.map((margin, k) => passing(['slew-rate', 'gain-bandwidth', 'dc-error'][k]!, margin)) }),
    ),
  );

  it.each(ORDERS)('never reorders the rest, by %s', (by) => {
    fc.assert(
      fc.property(parts, fc.func(fc.boolean()), (all, keeps) => {
        const kept = all.filter((one) => keeps(one.part.id));
        const whole = rank(all, by).map(({ part }) => part.id);
        const rest = rank(kept, by).map(({ part }) => part.id);
        expect(rest).toEqual(whole.filter((id) => rest.includes(id)));
      }),
      { seed: 3, numRuns: 300 },
    );
  });

  it('nor does the order they come in, and merit stays the same number', () => {
    fc.assert(
      fc.property(parts, (all) => {
        const forwards = rank(all);
        const backwards = rank([...all].reverse());
        expect(backwards.map(({ part, merit }) => [part.id, merit.total])).toEqual(forwards.map(({ part, merit }) => [part.id, merit.total]));
      }),
      { seed: 4, numRuns: 200 },
    );
  });
});
