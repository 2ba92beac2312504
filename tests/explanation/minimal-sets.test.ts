import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { minimalSets } from '../../src/explanation/minimal-sets.js';

const mover = (path: string, ...reach: readonly string[]) => ({ path, reach: new Set(reach) });

describe('minimalSets', () => {
  it('leaves out what a single one already does', () => {
    const [all, half, rest] = [mover('all', 'a', 'b'), mover('half', 'a'), mover('rest', 'b')];
    expect(minimalSets([all, half, rest], ['a', 'b'], 3)).toEqual([[all], [half, rest]]);
  });

  it('moves no input in two ways at once', () => {
    expect(minimalSets([mover('supply', 'a'), mover('supply', 'b')], ['a', 'b'], 3)).toEqual([]);
  });

  it('finds nothing where a check is out of reach', () => {
    expect(minimalSets([mover('one', 'a')], ['a', 'b'], 3)).toEqual([]);
  });

  it('gives sets that reach all, of which no part does, and misses none', () => {
    const CHECKS = ['a', 'b', 'c'];
    const movers = fc.array(fc.subarray(CHECKS), { maxLength: 6 }).map((all) => all.map((reach, at) => mover(String(at), ...reach)));
    fc.assert(
      fc.property(movers, fc.subarray(CHECKS, { minLength: 1 }), (all, checks) => {
        const reaches = (set: typeof all): boolean => checks.every((check) => set.some(({ reach }) => reach.has(check)));
        const subsets = Array.from({ length: 2 ** all.length }, (_, bits) => all.filter((__, at) => (bits >> at) & 1));
        const expected = subsets.filter((set) => set.length <= 3 && reaches(set) && set.every((one) => !reaches(set.filter((other) => other !== one))));
        const named = (sets: readonly (typeof all)[]): string[] => sets.map((set) => set.map(({ path }) => path).join(' ')).sort();
        expect(named(minimalSets(all, checks, 3))).toEqual(named(expected));
      }),
    );
  });
});
