import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { min, partOf, replacing, typ } from '../support/parts.js';
import { dc, resistors, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('supply-ripple');
/** Noise gain 10 with 50 mV peak of ripple. */
const stage = (frequency: number, limit?: number): StageSpec =>
  stageSpec('non-inverting', dc(0.1, 0.4), {
    resistors: resistors(9e3, 1e3, 0),
    supplyRipple: { amplitude: value(0.05), frequency: value(frequency) },
    limits: limit === undefined ? {} : { supplyRipple: value(limit) },
  });
const FAST = [min('gainBandwidth', 1e12), typ('gainBandwidth', 1e12)];
const figures = (...more: readonly Figure[]): Figure[] => [...replacing('gainBandwidth', ...FAST).filter(({ parameter }) => parameter !== 'supplyRejection'), ...more];
const KNOWN = figures(min('supplyRejection', 1e4), min('supplyRejectionCorner', 1e3));

describe('supply ripple', () => {
  it('is asked with a limit only', () => {
    expect(verdictOrNull('supply-ripple', stage(1e5), KNOWN)).toBeNull();
    expect(verdictOrNull('supply-ripple', stageSpec('follower', dc(1, 2)), KNOWN)).toBeNull();
  });

  it('is the ripple over the rejection at its frequency, times the noise gain', () => {
    // 80 dB at DC with a corner of 1 kHz: 40 dB at 100 kHz; 50 mV · 10/100 is 5 mV, and √(1 + 1e-4) of it.
    const reaches = (0.05 * 10 * Math.hypot(1, 100)) / 1e4;
    const at = (limit: number): unknown[] => {
      const { outcome, offered } = judge(stage(1e5, limit), KNOWN);
      return [outcome, offered];
    };
    expect(at(reaches * 1.001)).toEqual(['pass', expect.closeTo(reaches, 9)]);
    expect(at(reaches * (1 + 1e-9))[0]).toBe('pass');
    expect(at(reaches * 0.999)[0]).toBe('fail');
  });

  it('far below the corner is the rejection at DC', () => {
    expect(judge(stage(1, 1e-3), KNOWN).offered).toBeCloseTo((0.05 * 10) / 1e4, 9);
  });

  it('rises 20 dB a decade above it, until the loop no longer follows', () => {
    const slow = figures(min('supplyRejection', 1e4), min('supplyRejectionCorner', 100)).map((one) => (one.parameter === 'gainBandwidth' ? { ...one, value: 1e6 } : one));
    const offered = (frequency: number): number => Number(judge(stage(frequency, 1), slow).offered);
    expect(offered(10e3) / offered(1e3)).toBeCloseTo(10, 0);
    // 1 MHz over a noise gain of 10: far beyond 100 kHz the output moves with the supply, no more.
    expect(offered(1e8)).toBeCloseTo(0.05, 5);
  });

  it('estimates a corner that is not stated from the gain bandwidth; at best the rejection does not fall', () => {
    const estimated = figures(min('supplyRejection', 1e4)).map((one) => (one.parameter === 'gainBandwidth' ? { ...one, value: 1e7 } : one));
    // 10 MHz over 10 000: 1 kHz.
    const flat = (0.05 * 10) / 1e4;
    const there = judge(stage(1e4, 1), estimated);
    expect(there.offered).toBeCloseTo(flat * Math.hypot(1, 10), 6);
    expect([there.outcome, there.basis]).toEqual(['pass', 'estimated']);
    const open = judge(stage(1e4, 2 * flat), estimated);
    expect([open.outcome, open.reason]).toEqual(['unknown', 'estimated']);
    expect(open.offeredBest).toBeCloseTo(flat, 8);
    expect(judge(stage(1e4, flat / 2), estimated).outcome).toBe('fail');
  });

  it('names the figure that is missing', () => {
    expect(judge(stage(1e5, 1e-3), figures())).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'supplyRejection', kind: 'min' }] });
    expect(judge(stage(1e5, 1e-3), figures(min('supplyRejection', 1e4)).filter(({ parameter }) => parameter !== 'gainBandwidth'))).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'supplyRejectionCorner' }] });
  });

  it('borrows a rejection from the class, and passes with it only below a tenth of the limit', () => {
    const set: Part = partOf([min('supplyRejection', 1e4)], { id: 'GX-SET', tier: 'generic', class: 'some-class' });
    const borrowing = (limit: number): string => judge(stage(1, limit), figures(min('supplyRejectionCorner', 1e3)), { sets: [set], identity: { class: 'some-class' } }).outcome;
    const flat = (0.05 * 10 * Math.hypot(1, 1e-3)) / 1e4;
    expect([borrowing(10.01 * flat), borrowing(9.9 * flat)]).toEqual(['pass', 'unknown']);
  });
});
