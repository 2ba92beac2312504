import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { turnBetween } from '../../src/explanation/turn.js';

const BETWEEN = fc.double({ min: 0.01, max: 0.99, noNaN: true });

describe('turnBetween', () => {
  it('finds where trials turn, on the passing side, with a slack to go by or without', () => {
    fc.assert(
      fc.property(BETWEEN, fc.double({ min: 0.2, max: 5, noNaN: true }), fc.boolean(), fc.boolean(), (at, power, hasSlack, upwards) => {
        const [no, yes] = upwards ? [0, 1] : [1, 0];
        const passes = (x: number): boolean => (upwards ? x >= at : x <= at);
        const slack = (x: number): number => (upwards ? 1 : -1) * (x ** power - at ** power);
        const found = turnBetween((x) => ({ passes: passes(x), slack: hasSlack ? slack(x) : null }), { no, yes });
        expect(passes(found)).toBe(true);
        expect(Math.abs(found - at)).toBeLessThanOrEqual(3e-7 * Math.max(found, at));
      }),
    );
  });

  it('takes few trials where the slack is smooth', () => {
    let trials = 0;
    turnBetween((x) => { trials += 1; return { passes: x >= 0.3, slack: Math.log(x / 0.3) }; }, { no: 0.1, yes: 1 });
    expect(trials).toBeLessThan(20);
  });
});
