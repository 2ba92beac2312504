import fc from 'fast-check';
import stringWidth from 'string-width';
import { describe, expect, it } from 'vitest';
import { signsOf } from '../../../src/presentation/bars/signs.js';
import { swingCells } from '../../../src/presentation/bars/swing-cells.js';
import type { Lane } from '../../../src/presentation/page/plots/swing-lane.js';

const ASCII = signsOf({ ascii: true });
const lane = (more: Partial<Lane> = {}): Lane => ({ name: 'output', supply: 5, signal: { min: 1, max: 4 }, error: 0, band: { low: 0.5, high: 4.5 }, crossover: null, ...more });
const bar = (more: Partial<Lane> = {}, cells = 20): string => swingCells(lane(more), cells, ASCII);

const voltage = (least: number, most: number) => fc.double({ min: least, max: most, noNaN: true });
const anyLane = fc.record({ supply: voltage(0.8, 36), ends: fc.tuple(voltage(-0.2, 1.2), voltage(-0.2, 1.2)), error: voltage(0, 0.3), low: fc.option(voltage(-0.2, 0.6)), high: fc.option(voltage(-0.2, 0.6)) })
  .map(({ supply, ends, error, low, high }) => lane({
    supply,
    signal: { min: supply * Math.min(...ends), max: supply * Math.max(...ends) },
    error: supply * error,
    band: { low: low === null ? null : low * supply, high: high === null ? null : supply * (1 - high) },
  }));
const anyCells = fc.integer({ min: 18, max: 60 });

describe('a bar from rail to rail', () => {
  it('shows signal, free room and head-room in proportion', () => {
    expect(bar()).toBe(`|//..${'='.repeat(12)}..//|`);
    expect(bar({}, 50)).toBe(`|/////.....${'='.repeat(30)}...../////|`);
  });

  it('shows what offset and drift add at both ends', () => {
    expect(bar({ error: 0.25 })).toBe(`|//.-${'='.repeat(12)}-.//|`);
  });

  it('crosses out what is out of reach, with its error', () => {
    expect(bar({ band: { low: 0.5, high: 3 } })).toMatch(/^\|\/\/\.\.=+x+\/+\|$/u);
    expect(bar({ signal: { min: 1, max: 4.45 }, error: 0.2 })).toMatch(/x\/?\|$/u);
  });

  it('says what is not known, on its side only', () => {
    expect(bar({ band: { low: null, high: 4.5 } })).toMatch(/^\|\?+=+\.*\/+\|$/u);
    expect(bar({ band: { low: 0.5, high: null } })).toMatch(/^\|\/+\.*=+\?+\|$/u);
  });

  it('points beyond a rail the signal is asked beyond', () => {
    expect(bar({ signal: { min: -0.1, max: 4 } })).toMatch(/^<.*\|$/u);
    expect(bar({ signal: { min: 1, max: 5.1 } })).toMatch(/^\|.*>$/u);
    expect(bar({ signal: { min: 0, max: 5 } })).toMatch(/^\|.*\|$/u);
  });

  it('has its cells and both ends, whatever the lane, and one column a sign', () => {
    fc.assert(fc.property(anyLane, anyCells, fc.boolean(), (one, cells, ascii) => {
      const drawn = swingCells(one, cells, signsOf({ ascii }));
      expect(Array.from(drawn)).toHaveLength(cells + 2);
      expect(stringWidth(drawn, { ambiguousIsNarrow: false })).toBe(cells + 2);
    }));
  });

  it('crosses out exactly when signal or error leave what may be used', () => {
    fc.assert(fc.property(anyLane, anyCells, (one, cells) => {
      const { signal, error, band } = one;
      const leaves = (band.high !== null && signal.max + error > band.high) || (band.low !== null && signal.min - error < band.low);
      expect(swingCells(one, cells, ASCII).includes('x')).toBe(leaves);
    }));
  });

  it('always has the signal in it, and grows with it', () => {
    fc.assert(fc.property(anyLane, anyCells, voltage(0, 0.5), (one, cells, more) => {
      const wider = { ...one, signal: { min: one.signal.min, max: one.signal.max + more * one.supply } };
      const last = (of: Lane): number => Math.max(...['=', 'x'].map((sign) => swingCells(of, cells, ASCII).lastIndexOf(sign)));
      expect(last(one)).toBeGreaterThan(0);
      expect(last(wider)).toBeGreaterThanOrEqual(last(one));
    }));
  });

  it('never shows less head-room when the part needs more', () => {
    fc.assert(fc.property(voltage(0, 2), voltage(0, 2), anyCells, (one, other, cells) => {
      const taken = (high: number): number => swingCells(lane({ signal: { min: 1, max: 1 }, band: { low: 0, high: 5 - high } }), cells, ASCII).split('/').length;
      expect(taken(Math.max(one, other))).toBeGreaterThanOrEqual(taken(Math.min(one, other)));
    }));
  });
});
