import fc from 'fast-check';
import stringWidth from 'string-width';
import { describe, expect, it } from 'vitest';
import { limitCell, marginCells, shareCell, type ShareScale } from '../../../src/presentation/bars/margin-cells.js';
import { signsOf } from '../../../src/presentation/bars/signs.js';
import type { Margin } from '../../../src/presentation/page/plots/margins.js';

const ASCII = signsOf({ ascii: true });
const BOTH: ShareScale = { least: -1, most: 2, cells: 31 };
const RIGHT: ShareScale = { least: 0, most: 2, cells: 21 };

function margin(outcome: Margin['outcome'], share: number | null, best: number | null = null): Margin {
  return { check: 'slew-rate', name: 'slew rate', outcome, share, best, words: '', numbers: { offered: '', required: '' } };
}
const bar = (scale: ShareScale, ...of: Parameters<typeof margin>): string => marginCells(margin(...of), scale, ASCII);

const anyShare = fc.double({ min: -5, max: 50, noNaN: true });
const anyScale = fc.record({ least: fc.constantFrom(-1, 0), most: fc.constant(2), cells: fc.integer({ min: 18, max: 46 }) });

describe('a margin', () => {
  it('stands right of the limit as far as it is left', () => {
    expect(bar(RIGHT, 'pass', 1)).toBe(`|${'='.repeat(10)}${' '.repeat(10)}`);
    expect(bar(BOTH, 'pass', 0.5)).toBe(`${' '.repeat(10)}|=====${' '.repeat(15)}`);
  });

  it('stands left of it as far as it is missing', () => {
    expect(bar(BOTH, 'fail', -0.3)).toBe(`${' '.repeat(7)}xxx|${' '.repeat(20)}`);
  });

  it('met exactly is the mark alone; a hair left or missing is seen', () => {
    expect(bar(BOTH, 'pass', 0).trim()).toBe('|');
    expect(bar(BOTH, 'pass', 1e-9).trim()).toBe('|=');
    expect(bar(BOTH, 'fail', -1e-9).trim()).toBe('x|');
  });

  it('says that it goes on beyond an end, and not at the end itself', () => {
    expect(bar(RIGHT, 'pass', 2)).toBe(`|${'='.repeat(20)}`);
    expect(bar(RIGHT, 'pass', 2.01)).toBe(`|${'='.repeat(19)}>`);
    expect(bar(BOTH, 'fail', -1)).toMatch(/^x+\| +$/u);
    expect(bar(BOTH, 'fail', -3.6)).toMatch(/^<x+\| +$/u);
  });

  it('not decided is dotted from the worst to the best reading, without an end where none is known', () => {
    expect(bar(BOTH, 'unknown', -0.5, 0.5)).toBe(`${' '.repeat(5)}?....|....?${' '.repeat(15)}`);
    expect(bar(BOTH, 'unknown', null, 0.5)).toBe(`..........|....?${' '.repeat(15)}`);
    expect(bar(BOTH, 'unknown', -0.5, null)).toBe(`${' '.repeat(5)}?....|${'.'.repeat(20)}`);
  });

  it('has its cells, one limit in its place, and one column a sign', () => {
    fc.assert(fc.property(anyScale, fc.constantFrom<Margin['outcome']>('pass', 'fail', 'unknown'), fc.option(anyShare), fc.option(anyShare), fc.boolean(), (scale, outcome, share, best, ascii) => {
      const drawn = marginCells(margin(outcome, share, best), scale, signsOf({ ascii }));
      expect(Array.from(drawn)).toHaveLength(scale.cells);
      expect(stringWidth(drawn, { ambiguousIsNarrow: false })).toBe(scale.cells);
      expect(drawn.split('|')).toHaveLength(2);
      expect(drawn.indexOf('|')).toBe(limitCell(scale));
    }));
  });

  it('never shrinks when more is left, and stays on its side of the limit', () => {
    fc.assert(fc.property(anyShare, anyShare, fc.integer({ min: 18, max: 46 }), (one, other, cells) => {
      const scale = { least: -1, most: 2, cells };
      expect(shareCell(scale, Math.max(one, other))).toBeGreaterThanOrEqual(shareCell(scale, Math.min(one, other)));
      expect(Math.sign(shareCell(scale, one) - limitCell(scale))).toBe(Math.sign(one) + 0); // −0 is 0
      expect(shareCell(scale, one)).toBeGreaterThanOrEqual(0);
      expect(shareCell(scale, one)).toBeLessThan(cells);
    }));
  });
});
