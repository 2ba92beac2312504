import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { quickXplain } from '../../src/explanation/quick-xplain.js';

/** Constraint i rules out the candidates in its set. */
type Outs = readonly (readonly number[])[];

const CANDIDATES = 6;
const outs = fc.array(fc.uniqueArray(fc.nat(CANDIDATES - 1)), { minLength: 0, maxLength: 7 });

const leavesSome = (all: Outs) => (chosen: readonly number[]): boolean => {
  const gone = new Set(chosen.flatMap((at) => all[at] ?? []));
  return gone.size < CANDIDATES;
};

/** Every set of constraints that leaves nothing, while each smaller part of it leaves something. */
function allMinimal(all: Outs): number[][] {
  const sets = Array.from({ length: 2 ** all.length }, (_, bits) => all.map((__, at) => at).filter((at) => (bits >> at) & 1));
  const some = leavesSome(all);
  return sets.filter((set) => !some(set) && set.every((one) => some(set.filter((other) => other !== one))));
}

describe('quickXplain', () => {
  it('names two limits that only together leave nothing', () => {
    expect(quickXplain([0, 1, 2], leavesSome([[0, 1, 2], [5], [3, 4, 5]]))).toEqual([0, 2]);
  });

  it('has nothing to explain where something is left', () => {
    expect(quickXplain([0], leavesSome([[0, 1]]))).toBeNull();
  });

  it('agrees with trying every set: one of the smallest that cannot be made smaller', () => {
    fc.assert(
      fc.property(outs, (all) => {
        const found = quickXplain(all.map((_, at) => at), leavesSome(all));
        const minimal = allMinimal(all);
        if (found === null) expect(minimal).toEqual([]);
        else expect(minimal.map(String)).toContain(String([...found].sort((a, b) => a - b)));
      }),
      { numRuns: 500 },
    );
  });

  it('prefers constraints that come early: the last one it needs could not come earlier', () => {
    fc.assert(
      fc.property(outs, (all) => {
        const found = quickXplain(all.map((_, at) => at), leavesSome(all));
        if (found === null || found.length === 0) return;
        const latest = Math.min(...allMinimal(all).map((set) => Math.max(...set)));
        expect(Math.max(...found)).toBe(latest);
      }),
      { numRuns: 500 },
    );
  });
});
