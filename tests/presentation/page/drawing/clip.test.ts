import { describe, expect, it } from 'vitest';
import { clipped } from '../../../../src/presentation/page/drawing/clip.js';

const at = (x: number, y: number): { x: number; y: number } => ({ x, y });

describe('clipped', () => {
  it('leaves a curve inside as it is', () => {
    expect(clipped([at(0, 1), at(1, 2), at(2, 3)], 0, 10)).toEqual([[at(0, 1), at(1, 2), at(2, 3)]]);
  });

  it('cuts exactly at the edge', () => {
    expect(clipped([at(0, 5), at(10, 15)], 0, 10)).toEqual([[at(0, 5), at(5, 10)]]);
    expect(clipped([at(0, 15), at(10, 5)], 0, 10)).toEqual([[at(5, 10), at(10, 5)]]);
  });

  it('makes two pieces of a curve that leaves and comes back, none of one that stays outside', () => {
    expect(clipped([at(0, 5), at(10, 15), at(20, 5)], 0, 10)).toEqual([[at(0, 5), at(5, 10)], [at(15, 10), at(20, 5)]]);
    expect(clipped([at(0, 20), at(1, 30)], 0, 10)).toEqual([]);
  });

  it('cuts a segment that crosses from below to above at both ends', () => {
    expect(clipped([at(0, -10), at(30, 20)], 0, 10)).toEqual([[at(10, 0), at(20, 10)]]);
  });
});
