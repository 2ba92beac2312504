import { describe, expect, it } from 'vitest';
import { clippingPart } from '../../src/checks/clipping.js';
import type { DistortionDemand } from '../../src/demands/index.js';
import { readingsOf } from '../../src/parts/readings.js';
import { ENTRIES } from '../support/check-values.js';
import { amperes, max, under } from '../support/parts.js';
import { demandsOf, dc, stageSpec, value } from '../support/stages.js';

/** A follower that swings `min`..`max` on 5 V. */
const asked = (min: number, most: number): DistortionDemand => demandsOf(stageSpec('follower', dc(min, most), { limits: { distortion: value(1e-3) } })).distortion!;
const part = (low: number, high: number) =>
  readingsOf(under([max('outputLowHeadroom', low, amperes(1e-3, 5)), max('outputHighHeadroom', high, amperes(1e-3, 5)), max('offsetVoltage', 0, { temperature: 'over' })]));

describe('clipping', () => {
  it('at 90 % of the peak on both sides is HDR-10', () => {
    const { terms } = clippingPart(asked(0.5, 4.5), part(0.7, 0.7));
    expect(terms[0]!.value / (ENTRIES.find(({ id }) => id === 'HDR-10')!.expected as number)).toBeCloseTo(1, 4);
    expect(terms[0]!.how).toBe('200 mV of the peak are missing');
  });

  it('on one side is less, and nothing where the head-room is there', () => {
    const both = clippingPart(asked(0.5, 4.5), part(0.7, 0.7)).terms[0]!.value;
    const one = clippingPart(asked(0.5, 4.5), part(0.1, 0.7)).terms[0]!.value;
    expect(one).toBeLessThan(both);
    expect(one).toBeGreaterThan(both / 2);
    expect(clippingPart(asked(0.5, 4.5), part(0.5, 0.5)).terms[0]).toMatchObject({ value: 0, how: 'the whole swing is there', basis: 'guaranteed' });
  });

  it('needs the head-rooms, each named once, and nothing of an output that does not move', () => {
    expect(clippingPart(asked(0.5, 4.5), readingsOf(under([]))).missing.map(({ figure }) => figure)).toEqual(['outputLowHeadroom', 'outputHighHeadroom']);
    expect(clippingPart(asked(2, 2), readingsOf(under([])))).toEqual({ terms: [], missing: [], cautions: [] });
  });

  it('of next to nothing left stays a number', () => {
    expect(clippingPart(asked(0.5, 4.5), part(4.9, 4.9)).terms[0]!.value).toBeCloseTo(0.483, 2);
  });
});
