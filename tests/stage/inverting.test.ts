import { describe, expect, it } from 'vitest';
import { ac, dc, midSupply, resistors, source, stageOf, stageSpec, voltage } from '../support/stages.js';

const parallel = (a: number, b: number): number => (a * b) / (a + b);

describe('inverting stage', () => {
  it('gives Vref(1 + rho) - rho vi, its gain negative', () => {
    const stage = stageOf(stageSpec('inverting', dc(0, 1), { resistors: resistors(20e3, 10e3, 0), reference: voltage(1) }));
    expect(stage.gain).toBe(-2);
    expect(stage.output.max).toBeCloseTo(1 * (1 + 2) - 2 * 0, 12);
    expect(stage.output.min).toBeCloseTo(1 * (1 + 2) - 2 * 1, 12);
    expect(stage.commonMode).toEqual({ min: 1, max: 1 });
    expect(stage.noiseGain.nominal).toBe(3);
  });

  it('adds the source to the input resistor, exact unless it has a tolerance of its own', () => {
    const of = (tolerance?: number): number =>
      stageOf(stageSpec('inverting', dc(2.4, 2.6), { resistors: resistors(20e3, 9e3), reference: midSupply(), source: source(1e3, tolerance) })).noiseGain.max;
    expect(of()).toBeCloseTo(1 + (20 * 1.01) / (9 * 0.99 + 1), 12);
    expect(of(0.05)).toBeCloseTo(1 + (20 * 1.01) / (9 * 0.99 + 1 * 0.95), 12);
  });

  it('has Rp = reference.resistance and Rn = Rf || Rin, source included; the gain does not see the reference resistance', () => {
    const stage = stageOf(stageSpec('inverting', dc(2.4, 2.6), { resistors: resistors(20e3, 9e3), reference: midSupply(0, 6e3), source: source(1e3) }));
    expect(stage.seriesPositive).toBe(6e3);
    expect(stage.seriesNegative).toBeCloseTo(parallel(20e3, 10e3), 8);
    expect(stage.gain).toBeCloseTo(-20 / 10, 12);
  });

  it('feeds (vo - Vref)/Rf back', () => {
    const stage = stageOf(stageSpec('inverting', dc(2, 2), { resistors: resistors(20e3, 10e3, 0), reference: midSupply() }));
    const [at] = stage.vertices;
    expect(at?.output).toBeCloseTo(2.5 * 3 - 2 * 2, 12);
    expect(at?.networkCurrent).toBeCloseTo((3.5 - 2.5) / 20e3, 15);
  });

  it('AC-coupled, idles at the reference, DC noise gain 1, Rn = Rf', () => {
    const stage = stageOf(stageSpec('inverting', ac(0.5), { resistors: resistors(20e3, 10e3, 0), reference: midSupply(0, 6e3) }));
    expect(stage.output).toEqual({ min: 2.5 - 1, max: 2.5 + 1 });
    expect(stage.commonMode).toEqual({ min: 2.5, max: 2.5 });
    expect(stage.dcNoiseGain.max).toBe(1);
    expect(stage.noiseGain.nominal).toBe(3);
    expect([stage.seriesPositive, stage.seriesNegative]).toEqual([6e3, 20e3]);
  });
});
