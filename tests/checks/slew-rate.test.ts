import { describe, expect, it } from 'vitest';
import { min, typ } from '../support/parts.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { between, dc, resistors, stageSpec } from '../support/stages.js';

const judge = judgingBy('slew-rate');
const SPEC = stageSpec('non-inverting', dc(0.1, 0.3, 2e3), { resistors: resistors(70e3, 10e3) });
const NEED = 2 * Math.PI * 2e3 * 0.1 * (1 + (7 * 1.01) / 0.99);

describe('slew rate', () => {
  it.each([[NEED * 1.001, 'pass'], [NEED, 'pass'], [NEED * 0.999, 'fail']])('needs 2π·f·Vp: %f V/s %s', (rate, outcome) => {
    expect(judge(SPEC, [min('slewRate', rate)])).toMatchObject({ outcome, offered: rate, sense: 'at-least', unit: 'V/s', basis: 'guaranteed' });
  });

  it('of a typical figure counts 0.6 of it', () => {
    expect(judge(SPEC, [typ('slewRate', NEED / 0.6)])).toMatchObject({ outcome: 'pass', basis: 'derated' });
    expect(judge(SPEC, [typ('slewRate', (NEED / 0.6) * 0.999)])).toMatchObject({ outcome: 'unknown', reason: 'typical-only', decidesAt: { figure: 'slewRate', kind: 'min' } });
    expect(judge(SPEC, [typ('slewRate', NEED * 0.999)])).toMatchObject({ outcome: 'fail', offered: NEED * 0.999, basis: 'derated' });
  });

  it('@ 25 °C counts 0.8 of it more than 15 K away, and nothing is rejected on the factor alone', () => {
    const warm = { ...SPEC, temperature: between(25, 41) };
    expect(judge(warm, [min('slewRate', NEED / 0.8, { temperature: 25 })])).toMatchObject({ outcome: 'pass', basis: 'estimated' });
    expect(judge(warm, [min('slewRate', NEED, { temperature: 25 })])).toMatchObject({ outcome: 'unknown', reason: 'estimated' });
    expect(judge({ ...SPEC, temperature: between(25, 40) }, [min('slewRate', NEED, { temperature: 25 })])).toMatchObject({ outcome: 'pass', basis: 'guaranteed' });
  });

  it('is not asked without a frequency, and 0 V/s is met by any part with the figure', () => {
    expect(verdictOrNull('slew-rate', stageSpec('follower', dc(1, 2)), [min('slewRate', 1)])).toBeNull();
    expect(judge(stageSpec('follower', dc(1, 1, 1e3)), [min('slewRate', 1)]).outcome).toBe('pass');
  });

  it('cautions with the third harmonic below 1.5 × the need, M2', () => {
    const cautions = (rate: number): readonly string[] => judge(SPEC, [min('slewRate', rate), min('gainBandwidth', 1e6)]).cautions;
    // r = 1/1.4; rho = (1 - sqrt(1 - r²))/r; HD3 = NG (f/GBW) 2 rho³/(3 r).
    const r = 1 / 1.4;
    const rho = (1 - Math.sqrt(1 - r * r)) / r;
    const decibels = 20 * Math.log10((8 * (2e3 / 1e6) * 2 * rho ** 3) / (3 * r));
    expect(cautions(1.4 * NEED)).toEqual([`near the slew limit: third harmonic about ${decibels.toFixed(0)} dB with a bipolar input pair (estimate)`]);
    expect(cautions(1.5 * NEED)).toEqual([]);
  });
});
