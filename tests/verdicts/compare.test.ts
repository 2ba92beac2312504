import { describe, expect, it } from 'vitest';
import { equal, marginOf, meets, spareOf } from '../../src/verdicts/compare.js';

describe('met', () => {
  it('is exactly met, within 1e-9 relative', () => {
    for (const [required, sense, sign] of [[15602, 'at-least', -1], [0.02, 'at-most', 1]] as const) {
      expect(meets(required, required, sense)).toBe(true);
      expect(meets(required, required * (1 + sign * 0.9e-9), sense)).toBe(true);
      expect(meets(required, required * (1 + sign * 1.2e-9), sense)).toBe(false);
    }
  });

  it('is within 1e-12 absolute of zero', () => {
    expect(meets(0, 0.9e-12, 'at-most')).toBe(true);
    expect(meets(0, 1.1e-12, 'at-most')).toBe(false);
    expect(equal(0, -0.9e-12)).toBe(true);
  });

  it('is met beyond, in its own sense', () => {
    expect([meets(1, 2, 'at-least'), meets(1, 2, 'at-most'), meets(2, 1, 'at-most')]).toEqual([true, false, true]);
    expect([meets(1, Infinity, 'at-least'), meets(1, -Infinity, 'at-most')]).toEqual([true, true]);
  });
});

describe('margin and spare', () => {
  it('are offered/required for at-least and required/offered for at-most', () => {
    expect(marginOf(2, 3, 'at-least')).toBe(1.5);
    expect(marginOf(3, 2, 'at-most')).toBe(1.5);
    expect([spareOf(2, 3, 'at-least'), spareOf(3, 2, 'at-most'), spareOf(2, 3, 'at-most')]).toEqual([1, 1, -1]);
  });

  it('have no ratio where there is none', () => {
    expect(marginOf(0, 3, 'at-least')).toBeNull();
    expect(marginOf(3, 0, 'at-most')).toBeNull();
  });
});
