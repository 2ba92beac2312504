import { describe, expect, it } from 'vitest';
import { ac, between, dc, load, midSupply, resistors, stageOf, stageSpec, value, voltage } from '../support/stages.js';

describe('every corner of a stage', () => {
  it('is enumerated: two supplies, two references, two ratios, two signal ends', () => {
    const stage = stageOf(stageSpec('non-inverting', dc(0.5, 0.6), { supply: between(4, 5), resistors: resistors(1e4, 1e4), reference: voltage(0.5, 0.01) }));
    expect(stage.vertices).toHaveLength(2 * 2 * 2 * 2);
  });

  it('moves a mid-supply reference with its supply: one shared corner', () => {
    const stage = stageOf(stageSpec('inverting', ac(0.1), { supply: between(4, 6), resistors: resistors(1e4, 1e4), reference: midSupply() }));
    for (const at of stage.vertices) expect(at.reference).toBe(at.supply / 2);
    expect(stage.vertices).toHaveLength(2 * 2 * 2);
  });

  it.each([
    ['ground', (4 - 0) / 1e3],
    ['supply', (4 - 5) / 1e3],
    ['reference', (4 - 1) / 1e3],
  ] as const)('lets (vo - Vt)/RL flow into a load to %s', (to, expected) => {
    const stage = stageOf(stageSpec('inverting', dc(0, 0), { resistors: resistors(30e3, 10e3, 0), reference: voltage(1), load: load(1e3, to) }));
    for (const at of stage.vertices) expect(at.loadCurrent).toBe(expected);
  });
});

describe('the vertex trap', () => {
  // Inverting 9 kΩ/10 kΩ, mid-supply 3.0..5.5 V, 1 kΩ to ground, input 0.2 V.
  const spec = stageSpec('inverting', dc(0.2, 0.2), { supply: between(3, 5.5), resistors: resistors(9e3, 10e3, 0), reference: midSupply(), load: load(1e3) });
  const output = (supply: number): number => (supply / 2) * 1.9 - 0.9 * 0.2;

  it('has least room and largest current at different supplies', () => {
    const all = stageOf(spec).vertices;
    const [low, high] = [all.find((at) => at.supply === 3), all.find((at) => at.supply === 5.5)];
    expect(low?.output).toBeCloseTo(output(3), 12);
    expect(high?.output).toBeCloseTo(output(5.5), 12);
    // Room 3 - 2.67 = 0.33 V against 5.5 - 5.045 = 0.455 V; current 2.67 mA against 5.045 mA.
    expect(low!.supply - low!.output).toBeLessThan(high!.supply - high!.output);
    expect(low!.loadCurrent).toBeLessThan(high!.loadCurrent);
  });
});

describe('peak output currents', () => {
  it('are the DC current at the centre and the phasor sum of resistive and capacitive amplitude', () => {
    const spec = stageSpec('follower', dc(1, 4, 100e3), { load: load(1e3, 'ground', 10e-9) });
    const [peak] = stageOf(spec).peaks;
    expect(peak?.centre).toBeCloseTo(2.5e-3, 15);
    expect(peak?.swing).toBeCloseTo(Math.hypot(1.5 / 1e3, 2 * Math.PI * 100e3 * 10e-9 * 1.5), 12);
  });

  it('leave the capacitance out without a frequency', () => {
    const spec = stageSpec('follower', dc(1, 4), { load: load(1e3, 'ground', 10e-9) });
    expect(stageOf(spec).peaks[0]?.swing).toBeCloseTo(1.5e-3, 15);
  });

  it('include the feedback network, at nominal resistors', () => {
    const spec = stageSpec('non-inverting', dc(0.5, 1), { resistors: resistors(30e3, 10e3), load: load(10e3) });
    const [peak] = stageOf(spec).peaks;
    // Output 2..4 V into 10 kΩ and into 40 kΩ of network.
    expect(peak!.centre + peak!.swing).toBeCloseTo(4 / 10e3 + 4 / 40e3, 12);
  });

  it('of a step: the load capacitance at the steepest point of a single-pole edge, where the resistive current is still at the other end', () => {
    const signal = { ...dc(1, 4), shape: 'step', edge: value(1e-6) } as const;
    const charge = (farad: number): number => (farad * Math.log(9) * 3) / 1e-6;
    const swing = (farad: number): number => stageOf(stageSpec('follower', signal, { load: load(1e3, 'ground', farad) })).peaks[0]!.swing;
    expect(swing(1e-9)).toBeCloseTo(charge(1e-9) - 1.5e-3, 12);
    expect(swing(1e-12)).toBeCloseTo(1.5e-3, 12);
  });

  it('of a pulse of free duty: its edge may start anywhere, at the bias at worst', () => {
    const signal = { ...ac(0.5), shape: 'pulse', edge: value(1e-6) } as const;
    const stage = stageOf(stageSpec('follower', signal, { reference: midSupply(), load: load(1e3, 'reference', 10e-9) }));
    expect(stage.outputStep).toBeCloseTo(1, 12);
    expect(stage.peaks[0]!.swing).toBeCloseTo((10e-9 * Math.log(9)) / 1e-6, 12);
  });

  it('flow into load and isolation resistor together', () => {
    const isolated = { ...load(1e3, 'ground', 1e-9), isolation: value(1e3) };
    expect(stageOf(stageSpec('follower', dc(2, 2), { load: isolated })).vertices[0]?.loadCurrent).toBeCloseTo(1e-3, 15);
  });
});
