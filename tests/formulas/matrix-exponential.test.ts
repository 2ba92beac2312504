import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exponentials, stepped } from '../../src/formulas/matrix-exponential.js';

describe('matrix exponentials of a step and its halves', () => {
  it('of one number are e^x − 1, small steps with all their digits', () => {
    const ladder = exponentials(Float64Array.of(-1), 1);
    ladder.forEach(([increment], rung) => expect(increment! / Math.expm1(-1 / 2 ** rung)).toBeCloseTo(1, 12));
    expect(ladder.length).toBeGreaterThan(30);
  });

  it('of a turning pair are a turn and a decay', () => {
    fc.assert(
      fc.property(fc.double({ min: -3, max: 0, noNaN: true }), fc.double({ min: -20, max: 20, noNaN: true }), (decay, turn) => {
        const [x, y] = stepped(exponentials(Float64Array.of(decay, -turn, turn, decay), 1)[0]!, Float64Array.of(1, 0));
        expect(x).toBeCloseTo(Math.exp(decay) * Math.cos(turn), 10);
        expect(y).toBeCloseTo(Math.exp(decay) * Math.sin(turn), 10);
      }),
      { seed: 1, numRuns: 100 },
    );
  });

  it('of two very different rates keep the slow one', () => {
    const [fast, slow] = stepped(exponentials(Float64Array.of(-1e9, 0, 0, -1), 1)[0]!, Float64Array.of(1, 1));
    expect(fast).toBeCloseTo(0, 12);
    expect(slow! / Math.exp(-1)).toBeCloseTo(1, 6);
  });

  it('compose: two halves are a whole', () => {
    const [whole, half] = exponentials(Float64Array.of(-1, 2, 0, -3), 0.7);
    const start = Float64Array.of(0.3, -2);
    const [a, b] = [stepped(whole!, start), stepped(half!, stepped(half!, start))];
    expect([...a]).toEqual([...b].map((value) => expect.closeTo(value, 14) as number));
  });
});
