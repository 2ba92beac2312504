import { describe, expect, it } from 'vitest';
import { min, typ } from '../support/parts.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { oscillatorStage, photodiodeStage, step } from '../support/shaped-stages.js';
import { between, dc, resistors, stageSpec, value } from '../support/stages.js';

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

describe('slew rate of an edge', () => {
  /** 4 V in 1 µs, follower. */
  const EDGE = stageSpec('follower', step(0.5, 4.5, 1e-6));
  const ENOUGH = Math.log(9) / (2 * Math.PI * 1e-6);
  const FAST = min('gainBandwidth', 1e12);

  it('of a fast part turns at 0.8·ΔV/t', () => {
    expect([3.2e6 * 1.001, 3.2e6 * 0.999].map((rate) => judge(EDGE, [min('slewRate', rate), FAST]).outcome)).toEqual(['pass', 'fail']);
  });

  it('carries what this part needs with its own bandwidth, the exact edge worked out by stepping', () => {
    const figures = (rate: number) => [min('slewRate', rate), min('gainBandwidth', 1.5 * ENOUGH)];
    const { required, basis, how } = judge(EDGE, figures(10e6));
    expect(basis).toBe('guaranteed');
    expect(how).toMatch(/need found with a gain bandwidth of/u);
    const rate = required as number;
    expect(rate).toBeGreaterThan(3.2e6);
    const tau = 1 / (2 * Math.PI * 1.5 * ENOUGH);
    let [out, time, from] = [0, 0, 0];
    while (out < 3.6) {
      out += Math.min(rate, (4 - out) / tau) * 1e-11;
      time += 1e-11;
      if (out < 0.4) from = time;
    }
    expect(time - from).toBeCloseTo(1e-6, 9);
    expect([1.001, 0.999].map((factor) => judge(EDGE, figures(rate * factor)).outcome)).toEqual(['pass', 'fail']);
  });

  it('of a part whose bandwidth alone is too slow gives no number, and says so; the bandwidth rejects it', () => {
    const figures = [min('slewRate', 10e6), min('gainBandwidth', 0.9 * ENOUGH)];
    const verdict = judge(EDGE, figures);
    expect(verdict).toMatchObject({ outcome: 'unknown', offered: null, decidesAt: { figure: 'gainBandwidth' } });
    expect(verdict.cautions.join()).toMatch(/no slew rate makes this edge/u);
    expect(judge(EDGE, [min('slewRate', 10e6), min('gainBandwidth', verdict.decidesAt!.value * 1.0001)]).outcome).toBe('pass');
    expect(judgingBy('gain-bandwidth')(EDGE, figures).outcome).toBe('fail');
    expect(judge(EDGE, [min('slewRate', 3e6), min('gainBandwidth', 0.9 * ENOUGH)]).outcome).toBe('fail');
  });

  it('without a bandwidth fails below the least of any amplifier and is open above', () => {
    expect(judge(EDGE, [min('slewRate', 3e6)]).outcome).toBe('fail');
    expect(judge(EDGE, [min('slewRate', 30e6)])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure', missing: [{ figure: 'gainBandwidth', kind: 'min' }] });
    expect(judge(EDGE, [FAST])).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'slewRate' }] });
  });

  it('with a typical bandwidth stands on it', () => {
    expect(judge(EDGE, [min('slewRate', 5e6), typ('gainBandwidth', 1e9)])).toMatchObject({ outcome: 'pass', basis: 'derated' });
    expect(judge(EDGE, [min('slewRate', 4e6), typ('gainBandwidth', 1.5 * ENOUGH)]).outcome).toBe('unknown');
  });

  it('with more poles is open between the mean and the steepest slope', () => {
    const diode = photodiodeStage({ amperes: 20e-6, farad: 20e-12, ohms: 100e3 });
    const spec = { ...diode, signal: { ...diode.signal, shape: 'step' as const, edge: value(1e-6) } };
    const at = (rate: number) => judge(spec, [min('slewRate', rate), min('gainBandwidth', 10e6), typ('inputCapacitance', 0)]);
    expect([1.5e6, 1.7e6, 20e6].map((rate) => at(rate).outcome)).toEqual(['fail', 'unknown', 'pass']);
    expect(at(20e6).basis).toBe('estimated');
  });

  it('of an oscillator is the same for every part', () => {
    const spec = oscillatorStage(1e3);
    const need = (0.8 * 5) / (0.05 * 0.5e-3);
    expect([1.001, 0.999].map((factor) => judge(spec, [min('slewRate', need * factor)]).outcome)).toEqual(['pass', 'fail']);
  });
});
