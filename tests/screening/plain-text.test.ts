import { describe, expect, it } from 'vitest';
import { plainText } from '../../src/screening/plain-text.js';

describe('plainText', () => {
  it('tells apart what JSON does not', () => {
    const texts = [[Infinity], [-Infinity], [NaN], [null], [-0], [0], [undefined], ['0']].map(plainText);
    expect(new Set(texts).size).toBe(texts.length);
    expect(plainText({ a: 1, b: [2] })).toBe(plainText({ a: 1, b: [2] }));
  });

  it('has no text for what is not data', () => {
    expect([{ at: () => 1 }, [new Map()], { deep: [{ set: new Set() }] }, new Float64Array(2)].map(plainText)).toEqual([null, null, null, null]);
  });
});
