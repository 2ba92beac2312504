import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { watchScaling, type ScaledColumn } from '../../src/catalog/scaling.js';
import type { Part } from '../../src/parts/part.js';
import { arbitraryParts } from '../support/arbitrary-part.js';
import { list } from './lists.js';

const HEADER = 'id,price (EUR),gain bandwidth typ (MHz),output low headroom max (mV) @ 1 mA';

function partsOf(rows: readonly string[], header = HEADER): readonly Part[] {
  return list([header, ...rows]).parts;
}

function found(before: readonly Part[], after: readonly Part[]): ScaledColumn[] {
  const watch = watchScaling();
  before.forEach((part, at) => { watch.see(part, after[at] ?? part); });
  return watch.found();
}

const BEFORE = partsOf(['A,0.1,1,30', 'B,0.2,10,', 'C,0.3,,50']);

describe('a column that moved as a whole', () => {
  it('is found by its power of ten, in every known part', () => {
    const after = partsOf(['A,0.1,1000,30', 'B,0.2,10000,', 'C,0.3,,50'].map((row) => row));
    expect(found(BEFORE, after)).toEqual([{ subject: { kind: 'figure', parameter: 'gainBandwidth', limit: 'typ', condition: {} }, power: 3, known: 2, scaled: 2 }]);
  });

  it('downwards, under a condition, and the price', () => {
    const after = partsOf(['A,10,1,0.03', 'B,20,10,', 'C,30,,0.05']);
    expect(found(BEFORE, after).map(({ subject, power, known }) => [subject.kind, power, known])).toEqual([['figure', -3, 2], ['price', 2, 3]]);
  });

  it('is not found where one part alone moved, nor where some stayed', () => {
    expect(found(BEFORE, partsOf(['A,0.1,1000,30', 'B,0.2,,', 'C,0.3,,50']))).toEqual([]);
    expect(found(BEFORE, partsOf(['A,0.1,1000,30', 'B,0.2,10,', 'C,0.3,,50']))).toEqual([]);
  });

  it('may have one real change in ten, not two', () => {
    const rows = (factor: (at: number) => number): string[] => Array.from({ length: 10 }, (_, at) => `P${at},,${(at + 1) * factor(at)},`);
    const before = partsOf(rows(() => 1));
    expect(found(before, partsOf(rows((at) => (at === 0 ? 7 : 100))))).toMatchObject([{ power: 2, known: 10, scaled: 9 }]);
    expect(found(before, partsOf(rows((at) => (at < 2 ? 7 : 100))))).toEqual([]);
  });

  it('is not the same column in another currency', () => {
    const other = partsOf(['A,10,1,30', 'B,20,10,', 'C,30,,50'], HEADER.replace('EUR', 'USD'));
    expect(found(BEFORE, other)).toEqual([]);
  });
});

it('finds nothing between a list and itself, and every column of one multiplied by a power of ten', () => {
  fc.assert(
    fc.property(arbitraryParts, fc.integer({ min: -9, max: 9 }).filter((power) => power !== 0), (parts, power) => {
      expect(found(parts, parts)).toEqual([]);
      const moved = parts.map((part) => ({ ...part, figures: part.figures.map((figure) => ({ ...figure, value: figure.value * 10 ** power })) }));
      const columns = found(parts, moved);
      for (const column of columns) expect(column).toMatchObject({ power, subject: { kind: 'figure' } });
      for (const column of columns) expect(column.scaled).toBe(column.known);
    }),
    { numRuns: 50 },
  );
});
