import { describe, expect, it } from 'vitest';
import { maximallyFlatCapacitor } from '../../src/formulas/transimpedance.js';
import { openNoiseGain } from '../../src/demands/index.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { published } from '../support/check-values.js';
import { ac, dc, demandsOf, midSupply, resistors, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';

const required = (spec: StageSpec): number => demandsOf(spec)['stable-gain']!.required;

describe('the noise gain at high frequency', () => {
  it('is that of the resistors at its lower corner, also AC-coupled', () => {
    const spec = stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(70e3, 10e3) });
    expect(demandsOf(spec)['stable-gain']).toMatchObject({ sense: 'at-most', unit: 'V/V', open: null });
    expect(required(spec)).toBeCloseTo(1 + (7 * 0.99) / 1.01, 12);
    const coupledBy = stageSpec('non-inverting', ac(0.1), { resistors: resistors(70e3, 10e3), reference: midSupply() });
    expect(required(coupledBy)).toBeCloseTo(1 + (7 * 0.99) / 1.01, 12);
  });

  // Somebody else's number: a part stable from 5 on oscillates in an inverter of 10 with a capacitor across its feedback.
  published('INP-03', (of) => {
    const fitted = { resistors: resistors(of('Rf_ohm'), of('Rin_ohm')), capacitors: { feedback: value(of('Cf_F')) } };
    return required(stageSpec('inverting', ac(0.1), { ...fitted, reference: midSupply() }));
  });

  it('is that with the reference shorted where a bypass does so', () => {
    const reference = { ...voltage(1, 0, 10e3), bypass: value(1e-6) };
    const spec = stageSpec('non-inverting', dc(1, 1.1), { resistors: resistors(70e3, 10e3, 0), reference });
    expect(required(spec)).toBeCloseTo(8, 9);
    expect(required({ ...spec, reference: voltage(1, 0, 10e3) })).toBeCloseTo(4.5, 9);
  });
});

describe('a transimpedance stage', () => {
  const diode = (capacitance: number): NonNullable<StageSpec['photodiode']> => ({ current: swing(0, 10e-6), direction: 'out-of-node', capacitance: value(capacitance) });
  const stage = (rf: number, cin: number, more: Partial<StageSpec> = {}): StageSpec =>
    stageSpec('transimpedance', { coupling: 'dc', shape: 'band-limited' }, { photodiode: diode(cin), resistors: { feedback: value(rf) }, reference: voltage(0.5), ...more });

  published('TIA-09', (of) => required(stage(of('Rf_ohm'), of('Cin_F'), { capacitors: { feedback: value(of('Cf_F')), tolerance: value(0) } })));

  it('takes the capacitor at its upper end, 5 % unless written: 1 + Cin/(Cf·1.05)', () => {
    const with4 = (more: object) => demandsOf(stage(100e3, 50e-12, { capacitors: { feedback: value(4e-12), ...more } }))['stable-gain']!;
    expect(with4({}).required).toBeCloseTo(1 + 50 / (4 * 1.05), 9);
    expect(with4({ tolerance: value(0.1) }).required).toBeCloseTo(1 + 50 / (4 * 1.1), 9);
    expect(with4({}).because).toContain('50 pF and 4 pF + 5 %');
    const resistive = stageSpec('inverting', ac(0.1), { resistors: resistors(1e5, 1e4), reference: midSupply() });
    expect([stageOf(resistive).capacitorTolerance, demandsOf(resistive)['stable-gain']!.capacitorTolerance]).toEqual([0, 0]);
  });

  it('leaves the number to the part where the capacitor is left to it: unity is the least it can be without a frequency', () => {
    const demand = demandsOf(stage(100e3, 50e-12))['stable-gain'];
    expect(demand).toMatchObject({ required: 1, open: { feedback: 100e3, inputCapacitance: 50e-12 } });
    expect(demand!.because).toContain('maximally flat');
  });

  published('TIA-09', (of) => openNoiseGain({ feedback: of('Rf_ohm'), inputCapacitance: of('Cin_F') }, of('GBW_Hz')));

  it('asks 1 of a part that crosses over before the noise gain rises, and more of every faster one', () => {
    const open = { feedback: 100e3, inputCapacitance: 50e-12 };
    const pole = 1 / (2 * Math.PI * 100e3 * 50e-12);
    expect(maximallyFlatCapacitor({ ...open, gainBandwidth: pole / 2.1 })).toBe(0);
    expect(openNoiseGain(open, pole * 0.99)).toBe(1);
    const gains = [1.01, 1.5, 3, 10, 100, 1e3].map((times) => openNoiseGain(open, pole * times));
    expect(openNoiseGain(open, pole * 10, 0.05) - 1).toBeCloseTo((openNoiseGain(open, pole * 10) - 1) / 1.05, 9);
    expect(gains[0]).toBeGreaterThan(1.9);
    expect(gains).toEqual([...gains].sort((a, b) => a - b));
  });
});

it('is not asked of an oscillator, which switches', () => {
  const oscillator = { frequency: value(1e3) };
  expect(demandsOf(stageSpec('relaxation-oscillator', { coupling: 'dc', shape: 'band-limited' }, { oscillator }))['stable-gain']).toBeNull();
});
