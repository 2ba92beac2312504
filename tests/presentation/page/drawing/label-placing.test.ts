import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { around, boxOf, overlaps, placeLabels, spreadApart } from '../../../../src/presentation/page/drawing/label-placing.js';

const BOUNDS = { x: 0, y: 0, width: 400, height: 300 };
const place = fc.record({ x: fc.integer({ min: 0, max: 400 }), y: fc.integer({ min: 0, max: 300 }), text: fc.string({ minLength: 1, maxLength: 12 }) });

describe('labels', () => {
  it('never cover each other nor leave their bounds, whatever they are', () => {
    fc.assert(fc.property(fc.array(place, { maxLength: 15 }), (points) => {
      const wishes = points.map(({ text, ...at }) => ({ text, size: 12, places: around(at, 8, 12) }));
      const boxes = placeLabels(wishes, { bounds: BOUNDS, taken: [], curves: [] }).flatMap((one) => (one === null ? [] : [boxOf(one)]));
      for (const [at, box] of boxes.entries()) {
        expect(box.x >= 0 && box.y >= 0 && box.x + box.width <= 400 && box.y + box.height <= 300).toBe(true);
        for (const other of boxes.slice(at + 1)) expect(overlaps(box, other)).toBe(false);
      }
    }));
  });

  it('take the place that covers fewest points of curves', () => {
    const at = { x: 200, y: 150 };
    const places = around(at, 8, 12);
    const right = boxOf({ ...places[0]!, text: 'fit', size: 12 });
    const curves = [{ x: right.x + 2, y: right.y + 2 }];
    expect(placeLabels([{ text: 'fit', size: 12, places }], { bounds: BOUNDS, taken: [], curves })[0]).toMatchObject({ anchor: 'end' });
  });

  it('are left out where every place is taken', () => {
    expect(placeLabels([{ text: 'fit', size: 12, places: around({ x: 200, y: 150 }, 8, 12) }], { bounds: BOUNDS, taken: [BOUNDS], curves: [] })).toEqual([null]);
  });
});

describe('positions moved apart', () => {
  it('keep their order, their gap and their ends', () => {
    fc.assert(fc.property(fc.array(fc.integer({ min: 0, max: 100 }), { minLength: 1, maxLength: 6 }), (positions) => {
      const moved = spreadApart(positions, 16, [0, 100]);
      const order = positions.map((_, at) => at).sort((a, b) => positions[a]! - positions[b]! || a - b);
      for (const [rank, at] of order.entries()) {
        expect(moved[at]! >= -1e-9 && moved[at]! <= 100 + 1e-9).toBe(true);
        if (rank > 0) expect(moved[at]! - moved[order[rank - 1]!]!).toBeGreaterThanOrEqual(16 - 1e-9);
      }
    }));
  });

  it('stay where they are when there is room', () => {
    expect(spreadApart([10, 50, 90], 16, [0, 100])).toEqual([10, 50, 90]);
  });

  it('are spread evenly when there are too many', () => {
    expect(spreadApart([50, 50, 50], 80, [0, 100])).toEqual([0, 50, 100]);
  });
});
