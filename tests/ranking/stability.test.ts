import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decisionBetween, EQUAL, meritOf, ORDERS, SHARES, stabilityOf, type Order } from '../../src/ranking/index.js';
import type { JudgedPart } from '../../src/screening/index.js';
import { fitting, passing } from '../support/fitting.js';

type Pair = readonly [JudgedPart, JudgedPart];
const sorted = (order: Order, a: JudgedPart, b: JudgedPart): Pair => (decisionBetween(order, [a, b]).sign <= 0 ? [a, b] : [b, a]);
const stands = (order: Order, pair: Pair): boolean => decisionBetween(order, pair).sign < 0;
const at = (one: JudgedPart, amount: number): JudgedPart => ({ ...one, part: { ...one.part, price: { amount, currency: 'EUR', quantity: null } } });

const anyPart = (id: string): fc.Arbitrary<JudgedPart> => fc
  .record({ price: fc.option(fc.double({ min: 0.02, max: 30, noNaN: true })), current: fc.double({ min: 1e-7, max: 2e-2, noNaN: true }), margin: fc.double({ min: 0.9, max: 2, noNaN: true }), proof: fc.constantFrom('limits' as const, 'typical' as const), tier: fc.constantFrom('approved' as const, 'generic' as const) })
  .map(({ margin, ...facts }) => fitting(id, { ...facts, verdicts: [passing('slew-rate', margin)] }));

/** A difference of logarithms that sixteen digits tell to a millionth. */
const WEIGHABLE = 1e-9;

describe('how firmly one part stands before another', () => {
  it('tells prices and weights that turn it, and none that do not: the order itself, asked at many prices', () => {
    fc.assert(fc.property(anyPart('A'), anyPart('B'), fc.constantFrom(...ORDERS), (a, b, order) => {
      const pair = sorted(order, a, b);
      const { prices } = stabilityOf(order, pair);
      for (const of of [0, 1] as const) {
        const turn = prices.find((one) => one.of === of);
        const now = pair[of].part.price?.amount ?? null;
        const priced = (amount: number): Pair => (of === 0 ? [at(pair[0], amount), pair[1]] : [pair[0], at(pair[1], amount)]);
        const grid = Array.from({ length: 60 }, (_, step) => 0.001 * 1.32 ** step).filter((price) => price < 9e3);
        const beyond = grid.filter((price) => (of === 0 ? now !== null && price > now : price < (now ?? Infinity)));
        for (const price of beyond) {
          const isBefore = turn === undefined || (of === 0 ? price < turn.at : price > turn.at);
          expect(stands(order, priced(price)), `${order} ${of} ${price}`).toBe(isBefore);
        }
        if (turn === undefined || turn.at === 1e4) continue;
        const [inside, outside] = of === 0 ? [turn.at * (1 - 1e-6), turn.at * (1 + 1e-6)] : [turn.at * (1 + 1e-6), turn.at * (1 - 1e-6)];
        expect(stands(order, priced(inside))).toBe(true);
        expect(stands(order, priced(outside))).toBe(false);
      }
    }), { numRuns: 150 });
  });

  it('weighs shares as the algebra of logarithms does', () => {
    fc.assert(fc.property(anyPart('A'), anyPart('B'), (a, b) => {
      const pair = sorted('merit', a, b);
      const { decidedBy, weights } = stabilityOf('merit', pair);
      if (decidedBy === 'tier' || decidedBy === 'proof') {
        expect(weights).toEqual([]);
        return;
      }
      const [one, other] = pair.map((part) => meritOf(part));
      const lead = Object.fromEntries(SHARES.map((share) => [share, Math.log((one?.[share] ?? 1) / (other?.[share] ?? 1))]));
      for (const share of SHARES) {
        const others = SHARES.filter((each) => each !== share).reduce((sum, each) => sum + (lead[each] ?? 0), 0);
        const exact = -others / (lead[share] ?? 0);
        const found = weights.find((turn) => turn.share === share);
        // Nothing is told beyond a thousandfold weight, and near that edge rounding decides; as it does between shares that are the same but for rounding.
        if (decidedBy !== 'merit' || !(exact > 1e-9) || exact > 990 || Math.abs(lead[share] ?? 0) < WEIGHABLE) continue;
        expect(Math.abs((found?.at ?? Infinity) / exact - 1), share).toBeLessThan(1e-6);
        expect(decisionBetween('merit', pair, { ...EQUAL, [share]: (found?.at ?? 1) * (exact > 1 ? 1.0001 : 0.9999) }).sign).toBe(1);
      }
    }), { numRuns: 150 });
  });

  it('is not a matter of price where tier or proof decides', () => {
    expect(stabilityOf('merit', [fitting('A', { price: 19 }), fitting('B', { proof: 'typical', price: 0.05 })])).toEqual({ decidedBy: 'proof', prices: [], weights: [] });
    expect(stabilityOf('merit', [fitting('A', { price: 19 }), fitting('B', { tier: 'generic', price: 0.05 })])).toEqual({ decidedBy: 'tier', prices: [], weights: [] });
  });

  it('by price turns at the price of the other', () => {
    const { prices } = stabilityOf('price', [fitting('A', { price: 0.31 }), fitting('B', { price: 0.43 })]);
    expect(prices.map(({ of, at: turn }) => [of, Number(turn.toFixed(9))])).toEqual([[0, 0.43], [1, 0.31]]);
  });

  it('tells nothing of a price in another currency', () => {
    const foreign = fitting('A', { price: 0.31 });
    const pair: Pair = [{ ...foreign, current: 1e-7, part: { ...foreign.part, price: { amount: 1, currency: 'USD', quantity: null } } }, fitting('B', { price: 19, current: 1e-2 })];
    expect(stands('merit', pair)).toBe(true);
    expect(stabilityOf('merit', pair).prices.map(({ of }) => of)).toEqual([1]);
  });
});
