import { describe, expect, it } from 'vitest';
import { foldId, suggest, wordDistance } from '../../src/quantities/suggest.js';

const OPTIONS = ['--supply', '--topology', '--gain', '--reference', '--temperature', '--input', '--frequency', '--load'];

describe('suggest', () => {
  it('offers what a slip of the fingers meant', () => {
    expect(suggest('--gian', OPTIONS)).toEqual(['--gain']);
    expect(suggest('--freqency', OPTIONS)).toEqual(['--frequency']);
    expect(suggest('Suply', ['supply', 'load'])).toEqual(['supply']);
  });
  it('offers nothing far off, and three at most, in stable order', () => {
    expect(suggest('zzz', OPTIONS)).toEqual([]);
    expect(suggest('ab', ['ax', 'ay', 'az', 'aw'])).toEqual(['ax', 'ay', 'az']);
    expect(suggest('abc', ['abd', 'acb', 'abc'])).toEqual(['abc', 'acb', 'abd']);
  });
  it('keeps the limit of one edit or a third of the length', () => {
    expect(suggest('abcxyz', ['abcdef'])).toEqual([]);
    expect(suggest('abcdxy', ['abcdef'])).toEqual(['abcdef']);
  });
  it('counts a swap of neighbours less than an edit', () => {
    expect(wordDistance('ab', 'ba')).toBe(0.5);
    expect(wordDistance('abc', 'abd')).toBe(1);
    expect(wordDistance('', 'abc')).toBe(3);
    expect(wordDistance('ca', 'abc')).toBe(3);
  });
});

describe('foldId', () => {
  it('makes look-alikes equal', () => {
    expect(foldId('ORG-OA-OO12')).toBe(foldId('org-oa-0012'));
    expect(foldId('ORG-OA-I1')).toBe(foldId('0rg-oa-1i'));
    expect(foldId('ORG-OA-0012')).not.toBe(foldId('ORG-OA-0013'));
  });
});
