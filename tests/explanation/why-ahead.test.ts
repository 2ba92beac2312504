import { describe, expect, it } from 'vitest';
import { whyAhead } from '../../src/explanation/index.js';
import { rank } from '../../src/ranking/index.js';
import type { JudgedPart } from '../../src/screening/index.js';
import { fitting, passing } from '../support/fitting.js';

const why = (...parts: JudgedPart[]): ReturnType<typeof whyAhead> => whyAhead(rank(parts), 'merit');
const estimate = { figure: 'slewRate', slot: null, basis: 'derated', how: null, checks: ['slew-rate'], needed: null } as const;

describe('why 1 is ahead of 2', () => {
  it('is nothing to tell of fewer than two', () => {
    expect(why(fitting('A'))).toBeNull();
    expect(why()).toBeNull();
  });

  it.each([
    ['tier', fitting('B'), fitting('A', { tier: 'generic' })],
    ['proof', fitting('B'), fitting('A', { proof: 'typical' })],
    ['merit', fitting('B', { price: 0.5 }), fitting('A')],
    ['price', fitting('B', { price: 0.03 }), fitting('A', { price: 0.04 })],
    ['current', fitting('B', { current: 0.08e-6 }), fitting('A', { current: 0.09e-6 })],
    ['estimates', fitting('B'), fitting('A', { confirm: [estimate] })],
    ['id', fitting('A'), fitting('B')],
  ] as const)('names the step that decided: %s', (step, first, second) => {
    expect(why(second, first)).toMatchObject({ first: first.part.id, second: second.part.id, decidedBy: step });
  });

  it('names the order asked for', () => {
    expect(whyAhead(rank([fitting('A'), fitting('B', { price: 2 })], 'price'), 'price')?.decidedBy).toBe('price');
  });

  it('tells merits, prices and currents of both', () => {
    const told = why(fitting('A', { price: 0.5, current: 1e-6 }), fitting('B', { price: null }))!;
    expect(told.prices).toEqual([0.5, null]);
    expect(told.currents).toEqual([1e-6, 100e-6]);
    expect(told.merits[0]).toBeGreaterThan(told.merits[1]);
  });

  it('tells what speaks for each where they differ by more than a tenth', () => {
    const at = (slew: number, error: number): JudgedPart['verdicts'] => [
      passing('slew-rate', 5, { offered: slew }), passing('dc-error', 5, { offered: error, sense: 'at-most' }), passing('gain-bandwidth', 5, { offered: 1.05 * slew }),
    ];
    const told = why(fitting('A', { price: 0.1, verdicts: at(2, 3) }), fitting('B', { verdicts: at(1, 2) }))!;
    expect(told.better.map(({ check, first, second }) => [check, first, second])).toEqual([['slew-rate', 2, 1], ['gain-bandwidth', 2.1, 1.05]]);
    expect(told.worse.map(({ check }) => check)).toEqual(['dc-error']);
    expect(why(fitting('A', { price: 0.1, verdicts: at(1.09, 2) }), fitting('B', { verdicts: at(1, 2) }))!.better).toEqual([]);
  });
});
