import fc from 'fast-check';
import { expect, it } from 'vitest';
import { likelyFirst } from '../../src/presentation/likely-first.js';
import type { JudgedPart } from '../../src/screening/index.js';

/** Undecided parts that note when they are asked whether they are likely. */
function partsOf(flags: readonly boolean[]) {
  const asked: number[] = [];
  const parts = flags.map((likely, at) => ({ part: { id: String(at) }, get likely() { asked.push(at); return likely; } }) as unknown as JudgedPart);
  return { parts, asked };
}

const idsOf = (parts: readonly JudgedPart[]): string[] => parts.map(({ part }) => part.id);

it('the first few, likely ones first, are those of the whole list put in that order', () => {
  fc.assert(fc.property(fc.array(fc.boolean(), { maxLength: 60 }), fc.nat(10), (flags, count) => {
    const { parts } = partsOf(flags);
    const whole = [...parts].sort((a, b) => Number(b.likely) - Number(a.likely)).slice(0, count);
    expect(idsOf(likelyFirst(parts, count))).toEqual(idsOf(whole));
  }));
});

it('no more are looked at than tell', () => {
  const { parts, asked } = partsOf([false, true, true, false, true, true]);
  expect(idsOf(likelyFirst(parts, 2))).toEqual(['1', '2']);
  expect(asked).toEqual([0, 1, 2]);
  expect(likelyFirst(parts, 0)).toEqual([]);
});
