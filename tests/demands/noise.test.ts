import { describe, expect, it } from 'vitest';
import type { LimitsSpec, StageSpec } from '../../src/spec/spec.js';
import { between, dc, demandsOf, fourResistors, legs, midSupply, resistors, source, stageSpec, swing, value, voltage } from '../support/stages.js';

const LIMITS: LimitsSpec = { outputNoise: value(300e-6) };
const SPEC = stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(90e3, 10e3), source: source(1e3), temperature: between(0, 85), limits: LIMITS });
const ALONE = { input: 0, feedback: null };

describe('the noise allowed', () => {
  it('is in volts, or a ratio to the signal; both may be written', () => {
    expect(demandsOf({ ...SPEC, limits: {} }).noise).toBeNull();
    expect(demandsOf(SPEC).noise).toMatchObject({ required: 300e-6, unit: 'V', sense: 'at-most', rms: 300e-6, ratio: null });
    expect(demandsOf({ ...SPEC, limits: { snr: value(3162) } }).noise).toMatchObject({ required: 3162, unit: 'V/V', sense: 'at-least', rms: null, ratio: 3162 });
    expect(demandsOf({ ...SPEC, limits: { ...LIMITS, snr: value(3162) } }).noise).toMatchObject({ required: 300e-6, unit: 'V', rms: 300e-6, ratio: 3162 });
  });

  it('comes with the stage at its hottest, from one over the observation time or 0.1 Hz', () => {
    const { grid, temperature } = demandsOf(SPEC).noise!;
    expect(temperature).toBe(85);
    const first = grid(ALONE).frequency[0]!;
    expect(first > 0.1 && first < 0.11).toBe(true);
    const looked = demandsOf({ ...SPEC, signal: { ...SPEC.signal, observation: value(0.01) } }).noise!.grid(ALONE).frequency[0]!;
    expect(looked > 100 && looked < 110).toBe(true);
    // 4kT·9 kΩ of feedback and input at the − pin, 1 kΩ of the source at the +.
    expect(grid(ALONE).thermalSum[0]! / (4 * 1.380649e-23 * 358.15 * 10e3)).toBeCloseTo(1, 9);
  });

  it('works a stage out once, however many parts ask', () => {
    const { grid } = demandsOf(SPEC).noise!;
    expect(grid({ ...ALONE })).toBe(grid({ ...ALONE }));
    expect(grid({ input: 1e-12, feedback: null })).not.toBe(grid(ALONE));
  });

  it('keeps the latest circuits of parts that bring capacitors of their own, and makes an older one again the same', () => {
    const { grid } = demandsOf(SPEC).noise!;
    const own = { input: 2e-12, feedback: 1e-12 };
    const first = grid(own);
    expect(grid({ ...own })).toBe(first);
    expect(grid({ ...own, feedback: 1.5e-12 }).feedbackRe).not.toEqual(first.feedbackRe);
    for (let k = 0; k < 200; k += 1) grid({ input: 2e-12, feedback: (3 + k) * 1e-12 });
    expect(grid(own)).not.toBe(first);
    expect(grid(own)).toEqual(first);
  });

  it('tells resistors of one name apart by the input they stand at', () => {
    const spec = stageSpec('difference', legs(swing(0.2, 0.3), swing(0, 0.1)), { resistors: fourResistors({ r1: 1e4, r2: 2e4, r3: 1e4, r4: 2e4 }), source: source(1e3), reference: midSupply(), limits: LIMITS });
    expect(demandsOf(spec).noise!.grid(ALONE).resistors).toEqual(['positive input', 'source, + input', 'to reference', 'feedback', 'input', 'source, − input']);
  });

  it('sees no impedance at a pin that is driven: its current noise needs no figure', () => {
    expect(demandsOf(stageSpec('follower', dc(1, 2), { limits: LIMITS })).noise!.sees).toEqual({ plus: false, minus: false });
    expect(demandsOf(SPEC).noise!.sees).toEqual({ plus: true, minus: true });
  });
});

describe('what stands behind the stage', () => {
  const behind = (more: Partial<StageSpec>) => demandsOf({ ...SPEC, ...more }).noise!;

  it('is a filter over the grid', () => {
    const grid = behind({ following: { corner: value(1e3), order: 2 } }).grid(ALONE);
    const at = grid.frequency.findIndex((hertz) => hertz > 1e3);
    expect(grid.filter[at]! * (1 + (grid.frequency[at]! / 1e3) ** 4)).toBeCloseTo(1, 12);
  });

  it('is a converter: one step over √12, and no more swing than its range', () => {
    const { quantisation, output } = behind({ converter: { bits: 10, range: swing(0, 2.5) } });
    expect(quantisation).toBeCloseTo(2.5 / 1024 / Math.sqrt(12), 15);
    expect(output).toEqual({ min: 1, max: 2.5 });
    expect(behind({}).quantisation).toBe(0);
  });
});

it('counts the shot noise of the largest photodiode current', () => {
  const photodiode = { current: swing(0, 1e-6), direction: 'out-of-node', capacitance: value(50e-12) } as const;
  const spec = stageSpec('transimpedance', { coupling: 'dc', shape: 'band-limited' }, { photodiode, resistors: { feedback: value(1e6) }, reference: voltage(0.5), limits: LIMITS });
  expect(demandsOf(spec).noise).toMatchObject({ shot: expect.closeTo(Math.sqrt(2 * 1.602176634e-19 * 1e-6), 18) as number, countsInput: true, open: { feedback: 1e6, inputCapacitance: 50e-12 } });
  const oscillator = stageSpec('relaxation-oscillator', { coupling: 'dc', shape: 'band-limited' }, { oscillator: { frequency: value(1e3) }, limits: LIMITS });
  expect(demandsOf(oscillator).noise).toBeNull();
});
