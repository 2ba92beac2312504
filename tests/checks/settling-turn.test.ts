import { describe, expect, it } from 'vitest';
import { settlingParts } from '../../src/checks/settling-time.js';
import { settlingTurn } from '../../src/checks/settling-turn.js';
import type { SettlingDemand } from '../../src/demands/index.js';
import type { Reading } from '../../src/parts/reading.js';

const asked: SettlingDemand = {
  check: 'settling', required: 10e-6, unit: 's', sense: 'at-most', because: '', source: '', step: 4, tolerance: 0.01, load: null,
  closedLoop: { form: 'one-pole', countsInput: false, at: ({ gainBandwidth }) => ({ gain: 1, a: 1 / (2 * Math.PI * gainBandwidth), b: 0, c: 0 }), idealAt: () => ({ gain: 1, a: 0, b: 0, c: 0 }) },
};
const reading = (value: number): Reading => ({ value, printed: value, kind: 'min', basis: 'guaranteed', slot: null, how: null });
const figures = { rate: reading(1e6), bandwidth: reading(1e6), inputCapacitance: null, charging: null };

describe('where settling turns', () => {
  it('is a slew rate, or the bandwidth where the loop alone is too slow', () => {
    expect(settlingTurn(asked, figures)).toMatchObject({ figure: 'slewRate', kind: 'min' });
    const turn = settlingTurn(asked, { ...figures, bandwidth: reading(0.05e6) })!;
    expect(turn.figure).toBe('gainBandwidth');
    expect(turn.value).toBeGreaterThan(Math.log(100) / (2 * Math.PI * 10e-6));
  });

  it('is the figure that is missing: slew rate, bandwidth, current', () => {
    expect(settlingTurn(asked, { ...figures, rate: null })!.figure).toBe('slewRate');
    expect(settlingTurn(asked, { ...figures, bandwidth: null })!.figure).toBe('gainBandwidth');
    const charging = { load: { capacitance: 1e-9, resistiveCurrent: 1e-3, supply: 5 }, current: null };
    const turn = settlingTurn(asked, { ...figures, charging })!;
    expect(turn).toMatchObject({ figure: 'outputCurrent', unit: 'A' });
    expect(turn.value).toBeCloseTo(settlingTurn(asked, figures)!.value * 1e-9 + 1e-3, 12);
  });

  it('is none where two are missing, or no value does it', () => {
    expect(settlingTurn(asked, { ...figures, rate: null, bandwidth: null })).toBeNull();
    expect(settlingTurn(asked, { ...figures, rate: reading(0.1e6), bandwidth: null })).toBeNull();
  });

  it('of more poles is a slew rate with which the time is just met', () => {
    const lag = 1 / (2 * Math.PI * 5e6);
    const loops = { at: () => ({ gain: 1, a: 5e-7 + lag, b: 5.5e-6 * lag, c: 0 }), idealAt: () => ({ gain: 1, a: 5e-7, b: 0, c: 0 }) };
    const stage: SettlingDemand = { ...asked, required: 6e-6, closedLoop: { form: 'more-poles', countsInput: true, ...loops } };
    const { figure, value } = settlingTurn(stage, figures)!;
    const whole = (slewRate: number): number => {
      const { slewing, linear } = settlingParts(stage, { slewRate, loop: { gainBandwidth: 5e6, inputCapacitance: 0 } });
      return slewing + linear;
    };
    expect(figure).toBe('slewRate');
    expect(whole(value)).toBeLessThanOrEqual(6e-6);
    expect(whole(value * 0.999)).toBeGreaterThan(6e-6);
  });
});
