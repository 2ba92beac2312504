import { describe, expect, it } from 'vitest';
import { edgeSlewRate } from '../../src/formulas/edges.js';
import { emitterFollowerCeiling, headroomOfSwing } from '../../src/formulas/output-stage.js';
import type { Part } from '../../src/parts/part.js';
import { genericSet } from '../support/generic-list.js';

// Facts of the trade, marked as such: common practice, from memory. What follows from them is arithmetic.

const SPLIT = 15;

/** Worst head-room at a load, V. */
function headroom(part: Part, side: 'Low' | 'High', ohms: number): number {
  const found = part.figures.filter(({ parameter, kind, condition: { load, supply } }) => {
    return parameter === `output${side}Headroom` && kind === 'max' && supply === 2 * SPLIT && load?.kind === 'resistance' && load.ohms === ohms;
  });
  if (found.length !== 1) throw new Error(`${part.id}: ${found.length} figures`);
  return found[0]!.value;
}

describe('common practice', () => {
  it('conventional outputs lose 2 V to 3 V at each rail: 24 V to 26 V peak to peak from ±15 V', () => {
    expect([24, 26].map((swing) => headroomOfSwing(SPLIT, -SPLIT, swing))).toEqual([3, 2]);
  });

  it.each(['GX-BIP-CONV', 'GX-JFET-CONV'])('%s stands for them: its head-rooms at 2 kΩ are such', (id) => {
    const part = genericSet(id);
    const [low, high] = [headroom(part, 'Low', 2e3), headroom(part, 'High', 2e3)];
    expect(Math.min(low, high)).toBeGreaterThanOrEqual(2);
    expect(Math.max(low, high)).toBeLessThanOrEqual(3);
    expect(2 * SPLIT - low - high).toBeGreaterThanOrEqual(24);
    expect(2 * SPLIT - low - high).toBeLessThanOrEqual(26);
  });

  it('conventional outputs reach at most 3.8 V from 5 V', () => {
    expect(emitterFollowerCeiling(5).best).toBeCloseTo(3.8, 12);
    const part = genericSet('GX-BIP-GS');
    const highs = part.figures.filter(({ parameter, condition }) => parameter === 'outputHighHeadroom' && condition.supply === 5);
    expect(highs.length).toBeGreaterThan(0);
    for (const { value } of highs) expect(5 - value).toBeLessThanOrEqual(3.8);
  });

  it('edges of 3.8 µs for 4 V peak to peak mean about 0.84 V/µs, the slope from 10 % to 90 %', () => {
    expect(edgeSlewRate(4, 3.8e-6) / 1e6).toBeCloseTo(0.842, 3);
  });
});
