import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { plotsOf } from '../../../../src/presentation/page/plots/index.js';
import { MOST_DRAWN, priceCurrentOf, reasonLetters } from '../../../../src/presentation/page/plots/price-current-data.js';
import type { Report } from '../../../../src/report.js';
import { rank } from '../../../../src/ranking/index.js';
import { fitting } from '../../../support/fitting.js';
import { lines, pageInput, plotNamed } from '../../../support/page.js';

const input = pageInput();
const fits = (figures: readonly (readonly [price: number, current: number])[]): Report => ({ ...input.report, undecided: [], rejected: [], fit: rank(figures.map(([price, current], at) => fitting(`P${at}`, { price, current })), 'merit') });

describe('price against current', () => {
  it('has a front that nothing beats, and everything else is beaten by it', () => {
    const amount = fc.double({ min: 0.05, max: 20, noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.tuple(amount, amount), { minLength: 1, maxLength: 20 }), (figures) => {
        const { parts } = priceCurrentOf(fits(figures.map(([price, current]) => [price, current * 1e-6])))!;
        const beats = (a: (typeof parts)[number], b: (typeof parts)[number]): boolean => a.price <= b.price && a.current <= b.current && (a.price < b.price || a.current < b.current);
        for (const part of parts) expect(part.onFront).toBe(!parts.some((other) => beats(other, part)));
        expect(parts.some(({ onFront }) => onFront)).toBe(true);
      }),
    );
  });

  it('counts what has no price, and what is priced in another currency', () => {
    const report = fits([[1, 1e-6], [2, 1e-6]]);
    const odd = fitting('ODD', { price: null });
    const foreign = { ...odd, part: { ...odd.part, id: 'FOREIGN', price: { amount: 1, currency: 'USD', quantity: null } } };
    expect(priceCurrentOf({ ...report, undecided: [{ ...odd, outcome: 'undecided' }, { ...foreign, outcome: 'undecided' }] })).toMatchObject({ currency: 'EUR', left: 2, beyond: 0 });
  });

  it('gives a letter to each reason, most frequent first', () => {
    const { parts } = priceCurrentOf(input.report)!;
    const letters = reasonLetters(parts);
    expect(letters.map(({ letter }) => letter)).toEqual(Array.from('ABCDEFGHIJ').slice(0, letters.length));
    expect(letters.reduce((sum, one) => sum + one.parts, 0)).toBe(input.report.rejected.length);
  });

  it('stays a drawing when the list is long', () => {
    const many = Array.from({ length: 2 * MOST_DRAWN }, (_, at) => ({ ...fitting(`R${at}`, { current: 1e-6 * (1 + at) }), outcome: 'does-not-fit' as const }));
    const data = priceCurrentOf({ ...fits([[1, 1e-6]]), rejected: many })!;
    expect(data.parts.length).toBe(MOST_DRAWN + 1);
    expect(data.beyond).toBe(MOST_DRAWN);
  });

  it('is left out where no part has both figures', () => {
    expect(priceCurrentOf({ ...fits([]), undecided: [{ ...fitting('A', { price: null }), outcome: 'undecided' }] })).toBeNull();
  });

  it('is drawn as it was', async () => {
    await expect(lines(plotNamed(plotsOf(input), 'price-current').svg)).toMatchFileSnapshot('golden/price-current.svg');
  });
});
