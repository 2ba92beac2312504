import { describe, expect, it } from 'vitest';
import { coupled, fourResistors, legs, midSupply, resistors, source, stageOf, stageSpec, swing, voltage } from '../support/stages.js';

const parallel = (a: number, b: number): number => (a * b) / (a + b);
const EQUAL = fourResistors({ r1: 10e3, r2: 20e3, r3: 10e3, r4: 20e3 }, 0);

describe('difference stage', () => {
  it('gives Vref + G(V2 - V1) and puts (G V2 + Vref)/(1 + G) on the pins', () => {
    const stage = stageOf(stageSpec('difference', legs(swing(2, 2), swing(1.5, 1.5)), { resistors: EQUAL, reference: voltage(1) }));
    const [at] = stage.vertices;
    expect(at?.output).toBeCloseTo(1 + 2 * (2 - 1.5), 12);
    expect(at?.commonMode).toBeCloseTo((2 * 2 + 1) / 3, 12);
    expect(at?.networkCurrent).toBeCloseTo((2 - 5 / 3) / 20e3, 15);
    expect([stage.gain, stage.noiseGain.nominal]).toEqual([2, 3]);
  });

  it('works with any four resistors', () => {
    const any = fourResistors({ r1: 10e3, r2: 30e3, r3: 20e3, r4: 5e3 }, 0);
    const stage = stageOf(stageSpec('difference', legs(swing(2, 2), swing(0.5, 0.5)), { resistors: any, reference: voltage(1) }));
    const pins = (2 * 5 + 1 * 20) / (20 + 5);
    expect(stage.output.max).toBeCloseTo(pins * (1 + 3) - 0.5 * 3, 12);
    expect(stage.commonMode.max).toBeCloseTo(pins, 12);
  });

  it('takes R3 = R1 and R4 = R2 where they are not written', () => {
    const stage = stageOf(stageSpec('difference', legs(swing(1, 2), swing(1, 2)), { resistors: resistors(20e3, 10e3), reference: midSupply() }));
    expect(stage.resistors).toMatchObject({ feedback: 20e3, input: 10e3, positiveInput: 10e3, toReference: 20e3 });
  });

  it('moves the two ratios independently', () => {
    const t = 0.01;
    const spec = stageSpec('difference', legs(swing(2, 2), swing(2, 2)), { resistors: fourResistors({ r1: 1e4, r2: 1e4, r3: 1e4, r4: 1e4 }, t), reference: voltage(0.5) });
    const low = (1 - t) / (1 + t);
    const high = (1 + t) / (1 - t);
    const out = (rho: number, k: number): number => ((2 * k + 0.5) / (1 + k)) * (1 + rho) - 2 * rho;
    const corners = [out(low, low), out(low, high), out(high, low), out(high, high)];
    expect(stageOf(spec).output.min).toBeCloseTo(Math.min(...corners), 12);
    expect(stageOf(spec).output.max).toBeCloseTo(Math.max(...corners), 12);
  });

  it('has all four corners of independent legs, and of differential and common mode', () => {
    const free = stageOf(stageSpec('difference', legs(swing(1, 2), swing(1, 1.5)), { resistors: EQUAL, reference: voltage(2) }));
    expect(free.output.max).toBeCloseTo(2 + 2 * (2 - 1), 12);
    expect(free.output.min).toBeCloseTo(2 + 2 * (1 - 1.5), 12);
    const tied = stageOf(stageSpec('difference', coupled(swing(-0.5, 0.5), swing(1, 3)), { resistors: EQUAL, reference: voltage(2) }));
    expect(tied.output.max).toBeCloseTo(2 + 2 * 0.5, 12);
    // The + leg is the mean plus half the difference.
    expect(tied.commonMode.max).toBeCloseTo((2 * (3 + 0.25) + 2) / 3, 12);
  });

  it('adds the source to both legs and the reference resistance to R4', () => {
    const spec = stageSpec('difference', legs(swing(2, 2), swing(2, 2)), {
      resistors: fourResistors({ r1: 9e3, r2: 20e3, r3: 9e3, r4: 15e3 }, 0), reference: midSupply(0, 5e3), source: source(1e3),
    });
    const stage = stageOf(spec);
    expect(stage.gain).toBeCloseTo(20 / 10, 12);
    expect(stage.commonMode.max).toBeCloseTo((2 * 20 + 2.5 * 10) / 30, 12);
    expect(stage.seriesPositive).toBeCloseTo(parallel(10e3, 20e3), 8);
    expect(stage.seriesNegative).toBeCloseTo(parallel(10e3, 20e3), 8);
  });

  it('rejects common mode by (1 + G)/(4t) with four equal tolerances, to second order', () => {
    const t = 1e-4;
    const stage = stageOf(stageSpec('difference', legs(swing(2, 2), swing(2, 2)), { resistors: fourResistors({ r1: 1e4, r2: 4e4, r3: 1e4, r4: 4e4 }, t), reference: midSupply() }));
    expect(stage.resistorRejection! / ((1 + 4) / (4 * t))).toBeCloseTo(1, 6);
  });
});
