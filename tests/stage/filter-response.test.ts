import { describe, expect, it } from 'vitest';
import type { SignalSpec } from '../../src/spec/spec.js';
import { capacitorTolerance, grid, grown, growthNotes, naturalOf, swingGrowth, toleranceEnds } from '../../src/stage/filter-response.js';
import { dc, stageSpec, value } from '../support/stages.js';

/** Natural frequency 1 kHz. */
const OMEGA = 2 * Math.PI * 1e3;
const lowPass = (q: number) => ({ gain: -2, a: 1 / (q * OMEGA), b: 1 / OMEGA ** 2, c: 0 });
const band = (top: number, bottom?: number): SignalSpec => ({ ...dc(0, 1, top), ...(bottom === undefined ? {} : { frequency: { bottom, top, text: '' } }) });
const edged = (shape: 'step' | 'pulse'): SignalSpec => ({ ...dc(0, 1), shape });

describe('natural frequency and Q', () => {
  it('follow from the polynomial', () => {
    const { corner, q } = naturalOf(lowPass(2));
    expect(corner).toBeCloseTo(1e3, 9);
    expect(q).toBeCloseTo(2, 12);
  });
});

describe('growth of the swing', () => {
  it('is the peak when the band contains it: 2.0656 at Q = 2, 1.1547 at Q = 1 (Franco ch. 3; Mancini ch. 16)', () => {
    expect(swingGrowth(lowPass(2), band(1e3))).toBeCloseTo(2.065591117977, 10);
    expect(swingGrowth(lowPass(1), band(1e3))).toBeCloseTo(2 / Math.sqrt(3), 10);
  });

  it('is the largest magnitude inside a band that ends before or begins after the peak', () => {
    const at = (x: number): number => 1 / Math.hypot(1 - x * x, x / 2);
    expect(swingGrowth(lowPass(2), band(500))).toBeCloseTo(at(0.5), 12);
    expect(swingGrowth(lowPass(2), band(1200, 1000))).toBeCloseTo(at(1), 12);
  });

  it('is none without a peak, beyond it, or without a band', () => {
    expect(swingGrowth(lowPass(Math.SQRT1_2), band(1e3))).toBe(1);
    expect(swingGrowth(lowPass(2), band(9e3, 3e3))).toBe(1);
    expect(swingGrowth(lowPass(2), dc(0, 1))).toBe(1);
  });

  it('of a step is its overshoot beyond the end: 16.3 % of the step at Q = 1', () => {
    expect(swingGrowth(lowPass(1), edged('step'))).toBeCloseTo(1 + 2 * 0.1630335348216, 10);
  });

  it('of pulses bounds the answer to any train of them, tried at the ringing of the filter itself', () => {
    const q = 2;
    // x'' + x'/q + x = u, u = ±1 turning every half ringing period: what such a train builds up to.
    const half = Math.PI / Math.sqrt(1 - 1 / (4 * q * q));
    const steps = 4000;
    const dt = half / steps;
    let [x, v, largest] = [0, 0, 0];
    for (let at = 0; at < 40 * steps; at += 1) {
      const u = Math.floor(at / steps) % 2 === 0 ? 1 : -1;
      const middle = v + (dt / 2) * (u - x - v / q);
      x += dt * middle;
      v = middle + (dt / 2) * (u - x - middle / q);
      largest = Math.max(largest, Math.abs(x));
    }
    expect(largest / swingGrowth(lowPass(q), edged('pulse'))).toBeCloseTo(1, 3);
  });
});

describe('a grown corner', () => {
  const corner = { noiseGain: 2, output: (point: Readonly<Record<string, number>>, reference: number) => reference + 2 * point['input']!, commonMode: (point: Readonly<Record<string, number>>) => point['input']! };
  it('swings about the output at the centre, and so do pins that move', () => {
    const one = grown(corner, 1.5, { input: 1 });
    expect(one.output({ input: 2 }, 1, 5)).toBe(3 + 1.5 * 2);
    expect(one.output({ input: 1 }, 1, 5)).toBe(3);
    expect(one.commonMode({ input: 2 }, 1, 5)).toBe(1 + 1.5);
  });
});

describe('component ends', () => {
  it('are low and high, with a series resistance at its own tolerance; one when exact', () => {
    expect(toleranceEnds(100, 0.01, { value: 10, tolerance: 0.1 })).toEqual([108, 112]);
    expect(toleranceEnds(100, 0)).toEqual([100]);
    expect(grid([[1, 2], [3], [4, 5]])).toEqual([[1, 3, 4], [1, 3, 5], [2, 3, 4], [2, 3, 5]]);
    expect(capacitorTolerance(stageSpec('follower', dc(0, 1)))).toBe(0.05);
    expect(capacitorTolerance(stageSpec('follower', dc(0, 1), { capacitors: { tolerance: value(0.02) } }))).toBe(0.02);
  });
});

describe('notes', () => {
  it('tell by how much the swing grows, or that a peak is not counted', () => {
    expect(growthNotes(band(1e3), 1, { nominal: 1.15, largest: 1.25 })[0]).toContain('1.15 times what the gain alone gives, and 1.25 times');
    expect(growthNotes(band(1e3), 0.7077, { nominal: 1.000002, largest: 1.005 })).toEqual(['the response peaks in the band: the output swings 1.005 times with components at the ends of their tolerances']);
    expect(growthNotes(band(1e3), 0.7077, { nominal: 1.000001, largest: 1.000002 })).toEqual([]);
    expect(growthNotes(dc(0, 1), 1, { nominal: 1, largest: 1 })).toEqual(['no signal frequency: the peak of the filter is not counted in the swing']);
    expect(growthNotes(dc(0, 1), 0.707, { nominal: 1, largest: 1 })).toEqual([]);
  });
});
