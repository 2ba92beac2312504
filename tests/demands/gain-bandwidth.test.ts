import { describe, expect, it } from 'vitest';
import { ENTRIES } from '../support/check-values.js';
import { BUTTERWORTH, filterStage, oscillatorStage, photodiodeStage, step } from '../support/shaped-stages.js';
import { ac, dc, demandsOf, fourResistors, legs, midSupply, resistors, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';

describe('gain bandwidth asked', () => {
  const spec = stageSpec('non-inverting', dc(0.1, 0.3, 2e3), { resistors: resistors(70e3, 10e3) });

  it('is NG·f/√((1-ε)⁻²-1) at nominal resistors, ε 1 % by default: 7.018 NG f', () => {
    const required = demandsOf(spec)['gain-bandwidth']!.required;
    expect(required).toBeCloseTo((8 * 2e3) / Math.sqrt(0.99 ** -2 - 1), 6);
    expect(required / (8 * 2e3)).toBeCloseTo(7.018, 3);
  });

  it('follows the limit, and the vector criterion where it is asked', () => {
    const limited = (limits: object): number => demandsOf({ ...spec, limits })['gain-bandwidth']!.required;
    expect(limited({ gainError: value(0.001) })).toBeCloseTo((8 * 2e3) / Math.sqrt(0.999 ** -2 - 1), 6);
    expect(limited({ gainErrorKind: 'vector' })).toBeCloseTo(8 * 2e3 * Math.sqrt(0.01 ** -2 - 1), 6);
  });

  it('is multiplied by the margin of the team and not asked without a frequency', () => {
    expect(demandsOf({ ...spec, margins: { gainBandwidth: 2 } })['gain-bandwidth']!.required).toBeCloseTo((2 * 8 * 2e3) / Math.sqrt(0.99 ** -2 - 1), 6);
    expect(demandsOf(stageSpec('follower', dc(1, 2)))['gain-bandwidth']).toBeNull();
  });

  it('goes by the noise gain, never by |G|: a unity inverter counts 2, AC-coupled too', () => {
    const unity = stageSpec('inverting', ac(0.5, 1e3), { resistors: resistors(1e4, 1e4), reference: midSupply() });
    expect(demandsOf(unity)['gain-bandwidth']!.required).toBeCloseTo((2 * 1e3) / Math.sqrt(0.99 ** -2 - 1), 6);
  });

  it('tells of a difference stage what the vector error does to its common-mode rejection', () => {
    const of = stageSpec('difference', legs(swing(1, 2), swing(1, 2), 1e3), { resistors: fourResistors({ r1: 1e4, r2: 1e4, r3: 1e4, r4: 1e4 }), reference: midSupply() });
    expect(demandsOf(of)['gain-bandwidth']!.because).toMatch(/vector error of 14\.1 % .*common-mode rejection/u);
  });
});

const entry = (id: string) => ENTRIES.find((one) => one.id === id)!;
const expected = (id: string): number => entry(id).expected as number;
const needOf = (spec: Parameters<typeof demandsOf>[0]): number => demandsOf(spec)['gain-bandwidth']!.required;

describe('gain bandwidth of steps', () => {
  it('is NG·ln 9/(2π·edge), not asked without one', () => {
    expect(needOf(stageSpec('non-inverting', step(0.1, 0.3, 1e-6), { resistors: resistors(70e3, 10e3) }))).toBeCloseTo((8 * Math.log(9)) / (2 * Math.PI * 1e-6), 3);
    expect(demandsOf(stageSpec('follower', step(0.1, 0.3)))['gain-bandwidth']).toBeNull();
  });

  it('is NG·ln(1/ε)/(2π·T) for settling (GBW-31’s form), and the largest counts and is named', () => {
    const limits = { settling: { within: value(1e-6), to: value(2 ** -13) } };
    const settles = stageSpec('follower', step(0.1, 0.3, 10e-6), { limits });
    expect(needOf(settles)).toBeCloseTo((13 * Math.log(2)) / (2 * Math.PI * 1e-6), 3);
    expect(demandsOf(settles)['gain-bandwidth']!.because).toMatch(/^noise gain 1 V\/V at nominal resistors, settling within .* an edge of 10 µs from 10 % to 90 % asks /u);
    const quick = stageSpec('follower', step(0.1, 0.3, 1e-8), { limits });
    expect(demandsOf(quick)['gain-bandwidth']!.because).toMatch(/^noise gain 1 V\/V at nominal resistors, an edge of 10 ns/u);
  });
});

describe('gain bandwidth with a feedback capacitor', () => {
  const inverting = (farad: number, limits = {}) =>
    stageSpec('inverting', ac(0.1, 10e3), { resistors: resistors(1e5, 1e4), reference: midSupply(), capacitors: { feedback: value(farad) }, limits });

  it('leaves just the error against the same stage with an ideal amplifier, worked out apart', () => {
    const gainAt = (gainBandwidth: number, farad: number): number => {
      // −ρ/(1 + jx + (jf/GBW)(1 + ρ + jx)), x = ωRfCf.
      const x = 2 * Math.PI * 10e3 * 1e5 * farad;
      const k = 10e3 / gainBandwidth;
      return 10 / Math.hypot(1 - k * x, x + k * 11);
    };
    for (const farad of [10e-12, 100e-12, 1e-9]) {
      const error = (gainBandwidth: number): number => Math.abs(gainAt(gainBandwidth, farad) / gainAt(1e18, farad) - 1);
      const needed = needOf(inverting(farad));
      expect(error(needed)).toBeCloseTo(0.01, 9);
      expect(error(needed * 1.01)).toBeLessThan(0.01);
    }
  });

  it('is that of the resistors alone with next to none, and tells the capacitor', () => {
    expect(needOf(inverting(1e-18)) / ((11 * 10e3) / Math.sqrt(0.99 ** -2 - 1))).toBeCloseTo(1, 6);
    expect(demandsOf(inverting(100e-12))['gain-bandwidth']!.because).toMatch(/with 100 pF across the feedback resistor/u);
  });
});

describe('with a bypass across the resistance of the reference', () => {
  const spec = (farad: number, more = {}) =>
    stageSpec('non-inverting', dc(2.1, 2.9, 10e3), { resistors: resistors(27e3, 10e3, 0), reference: { ...voltage(2.5, 0, 5e3), bypass: value(farad) }, ...more });
  const form = (noiseGain: number): number => (noiseGain * 10e3) / Math.sqrt(0.99 ** -2 - 1);

  it('counts the noise gain without it where the bypass shorts it, and with it where it does not', () => {
    expect(Math.abs(needOf(spec(10e-6)) / form(3.7) - 1)).toBeLessThan(0.001);
    expect(needOf(spec(1e-15)) / form(2.8)).toBeCloseTo(1, 6);
    expect(demandsOf(spec(10e-6))['gain-bandwidth']!.because).toMatch(/^noise gain 3\.7 V\/V with 10 µF across .*\(2\.8 V\/V at DC\)/u);
  });

  it('asks the slew rate of the larger swing, and leaves the range of the output to the gain at DC', () => {
    const { because, required } = demandsOf(spec(10e-6))['slew-rate']!;
    expect(required / (2 * Math.PI * 10e3 * 0.4 * 3.7)).toBeCloseTo(1, 6);
    expect(because).toContain('bypass shorts');
    const stage = stageOf(spec(10e-6));
    expect([stage.output.max, stage.gain, stage.dcNoiseGain.nominal]).toEqual([2.5 + 0.4 * 2.8, 2.8, 2.8].map((v) => expect.closeTo(v, 9) as number));
    expect(stage.cautions.join()).toMatch(/swings 1\.48 V about its middle instead of 1\.12 V/u);
    expect(demandsOf(spec(1e-15))['slew-rate']!.required / (2 * Math.PI * 10e3 * 0.4 * 2.8)).toBeCloseTo(1, 6);
  });
});

describe('gain bandwidth of a transimpedance stage', () => {
  it('is TIA-08 where −3 dB at 1 MHz is all that is asked, with the maximally flat capacitor', () => {
    const spec = photodiodeStage({ amperes: 1e-6, farad: 20e-12, ohms: 1e5, top: 1e6 }, { limits: { gainError: value(1 - Math.SQRT1_2) } });
    expect(needOf(spec) / expected('TIA-08')).toBeCloseTo(1, 6);
  });

  it('grows with the capacitance of the part’s own input', () => {
    const { required, requiredWith } = demandsOf(photodiodeStage({ amperes: 1e-6, farad: 20e-12, ohms: 1e5, top: 1e6 }))['gain-bandwidth']!;
    expect(requiredWith!(0)).toBe(required);
    expect(requiredWith!(20e-12)).toBeCloseTo(needOf(photodiodeStage({ amperes: 1e-6, farad: 40e-12, ohms: 1e5, top: 1e6 })), 3);
  });

  it('needs for an edge and for settling what a Butterworth loop of that speed has', () => {
    const spec = photodiodeStage({ amperes: 1e-6, farad: 50e-12, ohms: 1e5 }, { limits: { settling: { within: value(10e-6), to: value(0.01) } } });
    const flat = needOf(spec);
    // ωt from ω0 = 6.5864/10 µs, the time in which a Butterworth step stays within 1 %.
    const w = 6.586425 / 10e-6;
    const b = w * w * 1e5 * 50e-12 + Math.SQRT2 * w;
    expect(flat / ((b + Math.sqrt(b * b - 4 * w * w)) / (4 * Math.PI))).toBeCloseTo(1, 5);
    const given = photodiodeStage({ amperes: 1e-6, farad: 50e-12, ohms: 1e5, capacitor: 5e-12 }, { limits: { settling: { within: value(10e-6), to: value(0.01) } } });
    expect(needOf(given)).toBeGreaterThan(0);
    // With 1 nF the stage itself takes 460 µs: nothing the amplifier could mend.
    const slow = photodiodeStage({ amperes: 1e-6, farad: 50e-12, ohms: 1e5, capacitor: 1e-9 }, { limits: { settling: { within: value(10e-6), to: value(0.01) } } });
    expect(demandsOf(slow)['gain-bandwidth']).toBeNull();
  });
});

describe('gain bandwidth of filters', () => {
  const corner = { limits: { gainErrorKind: 'corner' as const } };
  const partsOf = (id: string) => Object.fromEntries(Object.entries(entry(id).inputs).flatMap(([key, number]) => (/^[RC]\d_/u.test(key) ? [[key.slice(0, 2).toLowerCase(), number as number]] : [])));

  it.each(['GBW-33', 'GBW-34'])('is %s for a Sallen-Key whose −3 dB may move by 1 %%', (id) => {
    expect(needOf(filterStage('sallen-key-low-pass', partsOf(id), corner)) / expected(id)).toBeCloseTo(1, 3);
  });
  it.each(['GBW-36', 'GBW-37'])('is %s for multiple feedback', (id) => {
    expect(needOf(filterStage('multiple-feedback-low-pass', partsOf(id), corner)) / expected(id)).toBeCloseTo(1, 3);
  });

  it('goes by the corner without a frequency, by the largest magnitude error with one, at most up to the corner', () => {
    const at = (top: number) => needOf(filterStage('sallen-key-low-pass', BUTTERWORTH, { signal: dc(2, 3, top) }));
    expect(needOf(filterStage('sallen-key-low-pass', BUTTERWORTH))).toBeCloseTo(needOf(filterStage('sallen-key-low-pass', BUTTERWORTH, corner)), 6);
    expect(at(10e3) / 274_579).toBeCloseTo(1, 4);
    expect(at(100e3)).toBeCloseTo(at(10e3), 0);
    expect(at(1e3)).toBeLessThan(at(10e3));
    const vector = filterStage('sallen-key-low-pass', BUTTERWORTH, { signal: dc(2, 3, 10e3), limits: { gainErrorKind: 'vector' } });
    expect(needOf(vector)).toBeGreaterThan(at(10e3));
  });

  it('shows the rule of thumb beside it, not counted', () => {
    expect(demandsOf(filterStage('sallen-key-low-pass', BUTTERWORTH))['gain-bandwidth']!.because).toMatch(/rule of thumb, not counted: 1 MHz/u);
  });
});

describe('gain bandwidth of the others', () => {
  it('of an integrator keeps |1/(1 + 1/(2πRC·GBW) + jf/GBW)| within the error', () => {
    const spec = stageSpec('integrator', dc(2.4, 2.6, 1e3), { integrator: { resistance: value(1e5), capacitance: value(10e-9), window: value(1e-3) }, reference: midSupply() });
    const needed = needOf(spec);
    const error = (gbw: number): number => 1 - 1 / Math.hypot(1 + 1 / (2 * Math.PI * 1e5 * 10e-9 * gbw), 1e3 / gbw);
    expect(error(needed)).toBeCloseTo(0.01, 9);
  });

  it('is not asked of an oscillator', () => {
    expect(demandsOf(oscillatorStage(1e3))['gain-bandwidth']).toBeNull();
  });
});
