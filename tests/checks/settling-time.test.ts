import { describe, expect, it } from 'vitest';
import { leastTime, settlingParts } from '../../src/checks/settling-time.js';
import type { SettlingDemand } from '../../src/demands/index.js';

const asked = (form: 'one-pole' | 'more-poles', a: number, [b, ideal]: readonly [number, number] = [0, 0]): SettlingDemand => ({
  check: 'settling', required: 1, unit: 's', sense: 'at-most', because: '', source: '', step: 4, tolerance: 0.01, load: null,
  closedLoop: { form, countsInput: false, at: () => ({ gain: 1, a, b, c: 0 }), idealAt: () => ({ gain: 1, a: ideal, b: 0, c: 0 }) },
});
const loop = { gainBandwidth: 1e6, inputCapacitance: 0 };

describe('time of slewing and settling', () => {
  it('parts the exact time of one pole into its two pieces', () => {
    const { slewing, linear } = settlingParts(asked('one-pole', 1e-6), { slewRate: 2e6, loop });
    expect(slewing).toBeCloseTo(4 / 2e6 - 1e-6, 15);
    expect(linear).toBeCloseTo(1e-6 * Math.log(2 / 0.04), 15);
  });

  it('is all linear when fast, all slewing when slow, endless without a slew rate', () => {
    expect(settlingParts(asked('one-pole', 1e-6), { slewRate: 1e9, loop })).toMatchObject({ slewing: 0 });
    expect(settlingParts(asked('one-pole', 1e-9), { slewRate: 1e6, loop })).toMatchObject({ slewing: 3.96e-6, linear: 0 });
    expect(settlingParts(asked('one-pole', 1e-6), { slewRate: 0, loop }).slewing).toBe(Infinity);
    expect(settlingParts(asked('one-pole', 1e-6), { slewRate: 1e6, loop: null }).slewing).toBe(Infinity);
  });

  it('is the same walked through as in closed form, were one pole judged like more', () => {
    for (const slewRate of [0.1e6, 0.5e6, 2e6, 3.9e6]) {
      const [closed, walked] = (['one-pole', 'more-poles'] as const).map((form) => settlingParts(asked(form, 1e-6), { slewRate, loop }));
      expect((walked!.slewing + walked!.linear) / (closed!.slewing + closed!.linear)).toBeCloseTo(1, 9);
      expect(walked!.slewing / closed!.slewing).toBeCloseTo(1, 4);
    }
  });

  it('of two poles is that without a limit from its steepest slope on, and more below', () => {
    // 1 + s(Rf·Cf + 1/ωt) + s²·Rf(Cin + Cf)/ωt with 100 kΩ, 50 pF, 5 pF and 5 MHz.
    const lag = 1 / (2 * Math.PI * 5e6);
    const stage = asked('more-poles', 5e-7 + lag, [5.5e-6 * lag, 5e-7]);
    const whole = (slewRate: number): number => {
      const { slewing, linear } = settlingParts(stage, { slewRate, loop });
      return slewing + linear;
    };
    const free = whole(Infinity);
    expect(whole(1e12)).toBe(free);
    const times = [16e6, 8e6, 4e6, 2e6, 1e6].map(whole);
    expect(times).toEqual([...times].sort((a, b) => a - b));
    expect(times[0]).toBeGreaterThanOrEqual(free * 0.99);
    expect(times.at(-1)).toBeGreaterThan(4 / 1e6 + free);
  });

  it('is at least the longer of both where one is known', () => {
    expect(leastTime(asked('one-pole', 1e-6), { slewRate: Infinity, loop })).toBeCloseTo(1e-6 * Math.log(100), 12);
    expect(leastTime(asked('one-pole', 1e-6), { slewRate: 1e6, loop: null })).toBeCloseTo(3.96e-6, 15);
  });
});
