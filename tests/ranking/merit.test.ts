import { describe, expect, it } from 'vitest';
import { meritOf, priceInEuro } from '../../src/ranking/merit.js';
import { fitting, passing } from '../support/fitting.js';

describe('merit by hand', () => {
  it('is the geometric mean of margins, log price and log current on fixed scales', () => {
    const merit = meritOf(fitting('A', { price: 1, current: 100e-6, verdicts: [passing('slew-rate', 1), passing('dc-error', 2), passing('supply-current', 1)] }));
    // 1 EUR stands in the middle of 0.05..20 EUR: ln 20 / ln 400.
    const price = Math.log(20 / 1) / Math.log(20 / 0.05);
    const current = Math.log(20e-3 / 100e-6) / Math.log(20e-3 / 0.1e-6);
    const margins = Math.sqrt(0.5 * 1);
    expect(price).toBeCloseTo(0.5, 12);
    expect(merit.price).toBeCloseTo(price, 12);
    expect(merit.current).toBeCloseTo(current, 12);
    expect(merit.margins).toBeCloseTo(margins, 12);
    expect(merit.total).toBeCloseTo(Math.cbrt(price * current * margins), 12);
  });

  it('is 1 at the good end of a scale, also beyond it', () => {
    expect(meritOf(fitting('A', { price: 0.05, current: 0.1e-6 }))).toMatchObject({ price: 1, current: 1, margins: 1, total: 1 });
    expect(meritOf(fitting('A', { price: 0.01, current: 1e-9 }))).toMatchObject({ price: 1, current: 1 });
  });

  it('has a floor of 0.2, also for what is not known', () => {
    expect(meritOf(fitting('A', { price: 20, current: 20e-3 }))).toMatchObject({ price: 0.2, current: 0.2 });
    expect(meritOf(fitting('A', { price: 500, current: 1 }))).toMatchObject({ price: 0.2, current: 0.2 });
    expect(meritOf(fitting('A', { price: null, current: null }))).toMatchObject({ price: 0.2, current: 0.2 });
  });

  it('is 1 in margins where no check has one', () => {
    expect(meritOf(fitting('A', { verdicts: [passing('supply-low', 1)] })).margins).toBe(1);
  });

  it('gains nothing from excess', () => {
    const at = (margin: number): number => meritOf(fitting('A', { verdicts: [passing('slew-rate', margin)] })).total;
    expect(at(1000)).toBe(at(1.2));
    expect(at(1.1)).toBeLessThan(at(1.2));
  });
});

describe('price for the order', () => {
  it('is in euro; another currency is not converted and counts as not known', () => {
    const dollars = fitting('A');
    expect(priceInEuro({ ...dollars, part: { ...dollars.part, price: { amount: 1, currency: 'USD', quantity: null } } })).toBeNull();
    expect(priceInEuro(fitting('A', { price: 0.5 }))).toBe(0.5);
  });
});
