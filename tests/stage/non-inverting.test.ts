import { describe, expect, it } from 'vitest';
import { ac, between, dc, midSupply, resistors, source, stageOf, stageSpec, voltage } from '../support/stages.js';

const LOW = (7 * 0.99) / 1.01;
const HIGH = (7 * 1.01) / 0.99;

describe('non-inverting stage', () => {
  it('multiplies by 1 + rho at each tolerance end', () => {
    const stage = stageOf(stageSpec('non-inverting', dc(0.025, 0.33), { supply: between(3, 4.2), resistors: resistors(70e3, 10e3) }));
    expect(stage.gain).toBe(8);
    expect(stage.output.min).toBeCloseTo((1 + LOW) * 0.025, 12);
    expect(stage.output.max).toBeCloseTo((1 + HIGH) * 0.33, 12);
    expect(stage.outputNominal).toEqual({ min: 8 * 0.025, max: 8 * 0.33 });
    expect(stage.commonMode).toEqual({ min: 0.025, max: 0.33 });
    expect(stage.noiseGain.min).toBeCloseTo(1 + LOW, 12);
    expect(stage.dcNoiseGain.max).toBeCloseTo(1 + HIGH, 12);
  });

  it('swings about its reference: Vref + (1 + rho)(vi - Vref)', () => {
    const stage = stageOf(stageSpec('non-inverting', dc(1.1, 1.6), { resistors: resistors(10e3, 10e3, 0), reference: voltage(1) }));
    expect(stage.output.min).toBeCloseTo(1 + 2 * (1.1 - 1), 12);
    expect(stage.output.max).toBeCloseTo(1 + 2 * (1.6 - 1), 12);
  });

  it('adds the resistance of the reference to Rg, exact: gain and Rn follow', () => {
    const stage = stageOf(stageSpec('non-inverting', dc(2.4, 2.6), { resistors: resistors(70e3, 5e3), reference: midSupply(0, 5e3), source: source(1e3) }));
    expect(stage.gain).toBeCloseTo(1 + 70 / (5 + 5), 12);
    expect(stage.noiseGain.max).toBeCloseTo(1 + (70 * 1.01) / (5 * 0.99 + 5), 12);
    expect(stage.noiseGain.min).toBeCloseTo(1 + (70 * 0.99) / (5 * 1.01 + 5), 12);
    expect(stage.seriesPositive).toBe(1e3);
    expect(stage.seriesNegative).toBeCloseTo((70e3 * 10e3) / 80e3, 8);
  });

  it('says that the series resistance moved the gain', () => {
    const stage = stageOf(stageSpec('non-inverting', dc(2.4, 2.6), { resistors: resistors(70e3, 5e3), reference: midSupply(0, 5e3) }));
    expect(stage.assumptions).toContain('gain 8 V/V with the series resistance of source or reference, 15 V/V without');
  });

  it('feeds (vo - Vref)/(Rf + Rg) back at nominal resistors', () => {
    const stage = stageOf(stageSpec('non-inverting', dc(1, 1), { resistors: resistors(30e3, 10e3), reference: voltage(0.5) }));
    const highest = 0.5 + (1 + (3 * 1.01) / 0.99) * (1 - 0.5);
    const currents = stage.vertices.map((at) => at.networkCurrent);
    expect(Math.max(...currents)).toBeCloseTo((highest - 0.5) / 40e3, 15);
  });

  describe('AC-coupled', () => {
    const stage = stageOf(stageSpec('non-inverting', ac(0.2), { resistors: resistors(70e3, 10e3), reference: midSupply(0, 100e3), source: source(1e3) }));

    it('amplifies the signal about the bias and leaves the bias alone', () => {
      expect(stage.output.min).toBeCloseTo(2.5 - (1 + HIGH) * 0.2, 12);
      expect(stage.output.max).toBeCloseTo(2.5 + (1 + HIGH) * 0.2, 12);
      expect(stage.commonMode).toEqual({ min: 2.3, max: 2.7 });
    });

    it('has DC noise gain 1; for bandwidth it is unchanged', () => {
      expect(stage.dcNoiseGain).toEqual({ min: 1, nominal: 1, max: 1 });
      expect(stage.noiseGain.nominal).toBe(8);
    });

    it('has Rn = Rf and the bias resistance as Rp, which is not part of Rg', () => {
      expect([stage.seriesPositive, stage.seriesNegative]).toEqual([100e3, 70e3]);
      expect(stage.gain).toBe(8);
    });

    it('says that the swing is taken symmetric', () => {
      expect(stage.assumptions).toContain('AC-coupled: the signal is taken to swing symmetrically about its average');
    });
  });
});
