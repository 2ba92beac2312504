import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isSameAnswer, sweep, sweptValues, type SweptState } from '../../src/explanation/index.js';
import { toldTurn, turnsBetween } from '../../src/explanation/turns.js';
import { formatQuantity } from '../../src/quantities/format.js';
import { parseQuantity } from '../../src/quantities/parse.js';

/** So many of the rising places lie at or below a value. */
const passed = (places: readonly number[], value: number): number => places.filter((place) => value >= place).length;

function turnsOf(places: readonly number[], from: number, to: number): { turns: { at: number; from: number; to: number }[]; asked: number } {
  let asked = 0;
  const stateAt = (value: number): number => {
    asked += 1;
    return passed(places, value);
  };
  const sample = (value: number) => ({ value, state: stateAt(value) });
  return { turns: turnsBetween(sample(from), sample(to), { stateAt, isSame: (a, b) => a === b }), asked };
}

describe('turns between two values', () => {
  it('are none where both ends are alike', () => {
    expect(turnsOf([5], 1, 4)).toEqual({ turns: [], asked: 2 });
  });

  it('are found to a millionth, each of several', () => {
    const places = fc.uniqueArray(fc.double({ min: 0.101, max: 9.9, noNaN: true }), { minLength: 1, maxLength: 6, comparator: (a, b) => Math.abs(a / b - 1) < 1e-5 });
    fc.assert(fc.property(places, (unsorted) => {
      const sorted = [...unsorted].sort((a, b) => a - b);
      const { turns } = turnsOf(sorted, 0.1, 10);
      expect(turns.length).toBe(sorted.length);
      for (const [at, turn] of turns.entries()) {
        expect(Math.abs(turn.at / (sorted[at] ?? 0) - 1)).toBeLessThan(1e-6);
        // What is said to hold from there on holds there.
        expect(passed(sorted, turn.at)).toBe(turn.to);
        expect(turn.to).toBe(turn.from + 1);
      }
    }), { numRuns: 60 });
  });

  it('are told as text that, typed again, lies on the side it names: few digits where they do, more between two near turns', () => {
    const place = fc.double({ min: 1e-6, max: 900, noNaN: true });
    fc.assert(fc.property(place, fc.double({ min: 2e-7, max: 1e-5, noNaN: true }), (first, apart) => {
      const places = [first, first * (1 + apart)];
      const looking = { stateAt: (value: number) => passed(places, value), isSame: (a: number, b: number) => a === b };
      const sample = (value: number) => ({ value, state: looking.stateAt(value) });
      const turns = turnsBetween(sample(first / 3), sample(first * 3), looking).map((turn) => toldTurn(turn, looking));
      expect(turns.at(-1)?.to).toBe(2);
      for (const turn of turns) {
        const read = parseQuantity(formatQuantity(turn.at, 'V', { digits: 15 }), 'voltage');
        if (!read.ok) throw new Error(read.problem.message);
        expect(passed(places, read.quantity.nominal ?? Number.NaN)).toBe(turn.to);
        expect(Math.abs(turn.at / (turn.to === 1 ? first : places[1] ?? 0) - 1)).toBeLessThan(2e-5);
      }
    }), { numRuns: 200 });
  });

  it('are found about zero and below it', () => {
    expect(turnsOf([-3.21], -20, 60).turns[0]?.at).toBeCloseTo(-3.21, 5);
    expect(turnsOf([0], -1, 1).turns[0]?.at).toBeCloseTo(0, 9);
  });

  it('ask no more than halving takes', () => {
    expect(turnsOf([2.345], 2, 3).asked).toBeLessThan(30);
  });
});

type Answered = Exclude<SweptState, { contradiction: string }>;

/** One view of the parts A and B; where one of them comes first, it alone fits. */
function answer(fit: number, first: string | null): Answered {
  const ids = first === null ? [] : [first];
  const fitting = [Int32Array.from(ids, (id) => 'AB'.indexOf(id))];
  return { counts: { parts: 9, fit, undecided: 0, rejected: 9 - fit }, first, fit: ids, fitting, beyond: (other) => ids.filter((_, at) => other.fitting[0]?.includes(fitting[0]?.[at] ?? -1) !== true) };
}

describe('a sweep', () => {
  it('turns with the count, the first choice, and where there is no stage', () => {
    expect(isSameAnswer(answer(1, 'A'), answer(1, 'A'))).toBe(true);
    expect(isSameAnswer(answer(1, 'A'), answer(2, 'A'))).toBe(false);
    expect(isSameAnswer(answer(1, 'A'), answer(1, 'B'))).toBe(false);
    expect(isSameAnswer(answer(0, null), { contradiction: 'no' })).toBe(false);
    expect(isSameAnswer({ contradiction: 'one' }, { contradiction: 'another' })).toBe(true);
  });

  it('names what comes in and goes out', () => {
    const { points, turns } = sweep([1, 2, 3], (value) => (value < 1.5 ? { contradiction: 'none' } : value < 2.25 ? answer(1, 'A') : answer(1, 'B')));
    expect(points.map(({ state }) => 'contradiction' in state)).toEqual([true, false, false]);
    expect(turns.map(({ gained, lost }) => [gained, lost])).toEqual([[['A'], []], [['B'], ['A']]]);
    expect(turns[0]?.at).toBeCloseTo(1.5, 6);
    expect(turns[1]?.at).toBeCloseTo(2.25, 6);
  });

  it('tells only where the first choice turns when a long list comes and goes all the time', () => {
    const asked: number[] = [];
    const swept = sweep([0, 250, 500], (value) => {
      asked.push(value);
      return answer(Math.floor(value), value < 300 ? 'A' : 'B');
    });
    expect(swept.turnsOf).toBe('first');
    expect(swept.turns.map(({ to }) => ('first' in to ? to.first : null))).toEqual(['B']);
    expect(swept.turns[0]?.at).toBeCloseTo(300, 2);
    expect(asked.length).toBeLessThan(60);
    expect(sweep([0, 1, 2], (value) => answer(Math.floor(value), 'A')).turnsOf).toBe('any');
  });

  it('stands at both ends, in even steps or ratios', () => {
    expect(sweptValues({ from: 2.7, to: 5.5, steps: 5, scale: 'linear' })).toEqual([2.7, 3.4, 4.1, 4.8, 5.5]);
    expect(sweptValues({ from: 1, to: 1000, steps: 4, scale: 'log' })).toEqual([1, 10, 100, 1000]);
    expect(sweptValues({ from: -20, to: 60, steps: 2, scale: 'linear' })).toEqual([-20, 60]);
  });
});
