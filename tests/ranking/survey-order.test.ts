// Parts that were surveyed are ordered without reading them as far as that goes: the order is that of sorting all of them and cutting the
// list into lines, whatever ties there are.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { linesOf } from '../../src/ranking/family.js';
import type { PlacedFit } from '../../src/ranking/placed-fit.js';
import { compareIn, firstIn, ORDERS } from '../../src/ranking/rank.js';
import { surveyOrder } from '../../src/ranking/survey-order.js';

interface Drawn {
  readonly tier: 'approved' | 'generic';
  readonly family: string | null;
  readonly isProven: boolean;
  readonly merit: number;
  readonly amount: number | null;
  readonly current: number | null;
  readonly confirm: number;
}

/** Of few values each, so that many are equal in all but their ids. */
const drawn = fc.record<Drawn>({
  tier: fc.constantFrom('approved', 'generic'),
  family: fc.constantFrom(null, null, 'one die', 'another'),
  isProven: fc.boolean(),
  merit: fc.constantFrom(0.4, 0.6),
  amount: fc.constantFrom(null, 0.5),
  current: fc.constantFrom(null, 1e-6, 2e-6),
  confirm: fc.constantFrom(0, 1, 2),
});

const idOf = (at: number): string => `TEAM-${String((at * 7) % 40).padStart(4, '0')}`;

/** Counts how often the id of a part is read. */
function placedOf(all: readonly Drawn[], read: { ids: number }): PlacedFit[] {
  return all.map(({ tier, family, isProven, merit, amount, current, confirm }, at) => ({
    current, verdicts: [], proof: isProven ? 'limits' : 'typical',
    merit: { total: merit, margins: merit, price: merit, current: merit },
    confirm: { length: isProven ? 0 : confirm },
    part: { tier, family, price: amount === null ? null : { amount, currency: 'EUR', quantity: 1000 }, get id() { read.ids += 1; return idOf(at); } },
    fit: { position: at } as PlacedFit['fit'],
  }));
}

describe('the order of what was surveyed', () => {
  it('is that of all of it sorted and cut into lines', () => {
    fc.assert(fc.property(fc.array(drawn, { maxLength: 40 }), fc.constantFrom(...ORDERS), (all, order) => {
      const placed = placedOf(all, { ids: 0 });
      const lines = linesOf([...placed].sort((a, b) => compareIn(order, a, b)));
      const ordered = surveyOrder(placed, order);
      expect(ordered.length).toBe(lines.length);
      lines.forEach((line, at) => {
        expect(ordered.line(at).first).toBe(line.first);
        expect(ordered.line(at).variants).toEqual(line.variants);
      });
      const flat = lines.flatMap(({ first, variants }) => [first, ...variants]);
      const some = placed.filter((_, at) => at % 3 === 0);
      expect(ordered.sorted(some)).toEqual(flat.filter((one) => some.includes(one)));
      for (const one of placed) expect(ordered.lineWith((other) => other === one)).toBe(lines.findIndex(({ first, variants }) => [first, ...variants].includes(one)));
      expect(ordered.lineWith(() => false)).toBeNull();
      expect(firstIn(order, placed)).toBe(flat[0] ?? null);
    }), { numRuns: 300 });
  });

  it('reads no part where what is known tells them apart', () => {
    const read = { ids: 0 };
    const plain: Drawn = { tier: 'approved', family: null, isProven: true, merit: 0.5, amount: 0.5, current: 1e-6, confirm: 0 };
    const ordered = surveyOrder(placedOf([0.3, 0.7, 0.5].map((merit) => ({ ...plain, merit })), read), 'merit');
    expect([0, 1, 2].map((at) => ordered.line(at).first.merit.total)).toEqual([0.7, 0.5, 0.3]);
    expect(read.ids).toBe(0);
    expect(() => ordered.line(3)).toThrow('no line 3 of 3');
  });
});
