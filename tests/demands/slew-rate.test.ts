import { describe, expect, it } from 'vitest';
import { ENTRIES } from '../support/check-values.js';
import { BUTTERWORTH, filterStage, oscillatorStage, photodiodeStage, step } from '../support/shaped-stages.js';
import { between, coupled, dc, demandsOf, fourResistors, midSupply, resistors, stageSpec, swing, value, voltage, within } from '../support/stages.js';

describe('slew rate asked', () => {
  const spec = stageSpec('non-inverting', dc(0.1, 0.3, 2e3), { resistors: resistors(70e3, 10e3) });
  const peak = 0.1 * (1 + (7 * 1.01) / 0.99);

  it('is 2π·f·Vp: half the output span at one corner, gain at its upper tolerance', () => {
    expect(demandsOf(spec)['slew-rate']!.required).toBeCloseTo(2 * Math.PI * 2e3 * peak, 8);
  });

  it('is multiplied by the margin of the team', () => {
    expect(demandsOf({ ...spec, margins: { slewRate: 1.5 } })['slew-rate']!.required).toBeCloseTo(1.5 * 2 * Math.PI * 2e3 * peak, 8);
  });

  it('is not asked without a frequency, and 0 of a signal that does not move', () => {
    expect(demandsOf(stageSpec('follower', dc(1, 2)))['slew-rate']).toBeNull();
    expect(demandsOf(stageSpec('follower', dc(1, 1, 1e3)))['slew-rate']!.required).toBe(0);
  });

  it('is the largest half span over the resistor corners of a difference stage', () => {
    const t = 0.01;
    const of = stageSpec('difference', coupled(swing(-0.2, 0.2), swing(2, 3), 1e3), { resistors: fourResistors({ r1: 1e4, r2: 1e4, r3: 1e4, r4: 1e4 }, t), reference: midSupply() });
    const ends = [(1 - t) / (1 + t), (1 + t) / (1 - t)];
    const spans = ends.flatMap((rho) =>
      ends.map((k) => {
        const out = (d: number, c: number): number => ((c + d / 2) * k * (1 + rho)) / (1 + k) - (c - d / 2) * rho;
        const all = [out(-0.2, 2), out(-0.2, 3), out(0.2, 2), out(0.2, 3)];
        return (Math.max(...all) - Math.min(...all)) / 2;
      }),
    );
    expect(demandsOf(of)['slew-rate']!.required).toBeCloseTo(2 * Math.PI * 1e3 * Math.max(...spans), 8);
  });
});

describe('slew rate of an edge', () => {
  const spec = stageSpec('follower', step(0.5, 4.5, 1e-6));
  const expected = ENTRIES.find(({ id }) => id === 'SLW-03')!.expected as number;

  it('is 0.8·ΔV/t for any amplifier (SLW-03: 4 V in 1 µs), and grows as the bandwidth of the part comes down', () => {
    const demand = demandsOf(spec)['slew-rate']!;
    expect(demand.required).toBeCloseTo(expected, 3);
    const { motion } = demand;
    if (motion.kind !== 'edge') throw new Error('an edge was asked');
    const need = (gainBandwidth: number) => motion.slewRateAt({ gainBandwidth, inputCapacitance: 0 });
    const enough = Math.log(9) / (2 * Math.PI * 1e-6);
    expect(need(1e12)!.worst / expected).toBeCloseTo(1, 4);
    expect(need(2 * enough)!.worst).toBeGreaterThan(expected);
    expect(need(enough)!.worst / expected).toBeCloseTo((0.9 * Math.log(9)) / 0.8, 4);
    expect(need(enough * 0.999)).toBeNull();
  });

  it('is multiplied by the margin of the team, part by part too', () => {
    const demand = demandsOf({ ...spec, margins: { slewRate: 2 } })['slew-rate']!;
    expect(demand.required).toBeCloseTo(2 * expected, 3);
    if (demand.motion.kind !== 'edge') throw new Error('an edge was asked');
    expect(demand.motion.slewRateAt({ gainBandwidth: 1e12, inputCapacitance: 0 })!.worst / expected).toBeCloseTo(2, 4);
  });

  it('is not asked without an edge, and a frequency of a pulse is no edge', () => {
    expect(demandsOf(stageSpec('follower', step(0.5, 4.5)))['slew-rate']).toBeNull();
    const pulse = { ...step(0.5, 4.5), shape: 'pulse' as const, frequency: { top: 1e3, text: '1 kHz' } };
    expect(demandsOf(stageSpec('follower', pulse))['slew-rate']).toBeNull();
  });

  it('lies between the mean and the steepest slope where the loop has more poles than one', () => {
    const spec = { ...photodiodeStage({ amperes: 20e-6, farad: 20e-12, ohms: 100e3 }), supply: within(5, 0) };
    const { motion } = demandsOf({ ...spec, signal: { ...spec.signal, shape: 'step', edge: value(1e-6) } })['slew-rate']!;
    if (motion.kind !== 'edge') throw new Error('an edge was asked');
    const need = motion.slewRateAt({ gainBandwidth: 10e6, inputCapacitance: 0 })!;
    expect(need.best).toBeCloseTo(0.8 * 2 * 1e6, 3);
    expect(need.worst).toBeGreaterThan(need.best);
  });

  it('of a filter is the steepest slope of its own edge: ω0·e^(−π/4)·ΔV for Butterworth', () => {
    const spec = filterStage('sallen-key-low-pass', BUTTERWORTH, { signal: step(2, 3, 100e-6) });
    expect(demandsOf(spec)['slew-rate']!.required / (2 * Math.PI * 1e4 * Math.exp(-Math.PI / 4))).toBeCloseTo(1, 6);
  });

  it('of an oscillator is 0.8·VS/edge, or what the logic it drives asks', () => {
    const bare = oscillatorStage(1e3, { supply: between(4.5, 5.5) });
    expect(demandsOf(bare)['slew-rate']!.required).toBeCloseTo((0.8 * 5.5) / (0.05 * 0.5e-3), 6);
    const driving = { ...bare, drives: { threshold: swing(0.3, 0.7), maxEdge: value(1e-6) } };
    expect(demandsOf(driving)['slew-rate']!.required).toBeCloseTo((0.4 * 5.5) / 1e-6, 3);
    expect(demandsOf({ ...bare, drives: { threshold: swing(0.3, 0.7), maxEdge: value(1) } })['slew-rate']!.required).toBeCloseTo((0.8 * 5.5) / (0.05 * 0.5e-3), 6);
  });
});

describe('slew rate of an integrator', () => {
  const tolerances = { resistors: { tolerance: value(0.01) }, capacitors: { tolerance: value(0.05) } };
  const spec = (frequency: number, more = {}) => stageSpec('integrator', dc(2, 3.5, frequency), { integrator: { resistance: value(1e5), capacitance: value(1e-7), window: value(2e-2) }, reference: voltage(2.5), ...tolerances, ...more });
  const byInput = 1 / (1e5 * 0.99 * 1e-7 * 0.95);
  const required = (frequency: number, more = {}): number => demandsOf(spec(frequency, more))['slew-rate']!.required;

  it('is |vi − Vref|/(RC) with the smallest components where the band would allow more', () => {
    const demand = demandsOf(spec(1e4))['slew-rate']!;
    expect(demand.required / byInput).toBeCloseTo(1, 12);
    expect(demand.because).toMatch(/1 V of input about the reference across 99 kΩ into 95 nF: no waveform is steeper/u);
    expect(required(1e6)).toBe(demand.required);
    expect(required(1e4, { margins: { slewRate: 2 } })).toBeCloseTo(2 * demand.required, 8);
  });

  it('turns to 2π·f·Vp just where that is the smaller', () => {
    const turn = byInput / required(1e-3) * 1e-3;
    expect(required(turn * 0.999) / byInput).toBeCloseTo(0.999, 9);
    expect(required(turn * 1.001) / byInput).toBeCloseTo(1, 9);
    expect(demandsOf(spec(turn * 0.999))['slew-rate']!.because).toMatch(/peak at/u);
  });

  it('counts what a bleed resistor adds while the output is away from the reference', () => {
    const bled = required(1e4, { resistors: { tolerance: value(0), feedback: value(2e5) }, capacitors: { tolerance: value(0) } });
    const farthest = 2 * -Math.expm1(-2e-2 / (2e5 * 1e-7));
    expect(bled).toBeCloseTo(1 / 1e-2 + farthest / (2e5 * 1e-7), 8);
  });

  it('is the slope of its distortion too', () => {
    const demands = demandsOf(spec(1e4, { limits: { distortion: value(1e-2) } }));
    expect(demands.distortion!.slewing!.slewRate).toBe(demands['slew-rate']!.required);
  });
});
