import { describe, expect, it } from 'vitest';
import { ac, dc, demandsOf, load, midSupply, resistors, stageSpec, value } from '../support/stages.js';

const FOLLOWER = stageSpec('follower', dc(1, 2));

describe('the phase margin asked', () => {
  it('is the written one, or 45° with a capacitance on the output, else nothing', () => {
    expect(demandsOf(FOLLOWER)['phase-margin']).toBeNull();
    expect(demandsOf({ ...FOLLOWER, load: load(10e3) })['phase-margin']).toBeNull();
    expect(demandsOf({ ...FOLLOWER, load: { to: 'ground', capacitance: value(0) } })['phase-margin']).toBeNull();
    expect(demandsOf({ ...FOLLOWER, load: load(10e3, 'ground', 1e-9) })['phase-margin']).toMatchObject({ required: 45, unit: '°', sense: 'at-least' });
    expect(demandsOf({ ...FOLLOWER, limits: { phaseMargin: value(60) } })['phase-margin']).toMatchObject({ required: 60, load: { capacitance: 0, resistance: null, isolation: 0 } });
  });

  it('carries the load with what isolates it', () => {
    const hung = { ...load(2e3, 'ground', 1e-9), isolation: value(47) };
    expect(demandsOf({ ...FOLLOWER, load: hung })['phase-margin']!.load).toEqual({ capacitance: 1e-9, resistance: 2e3, isolation: 47 });
  });

  it('tells where a feedback capacitor could go, and how large it may be for the gain error at the top frequency', () => {
    const amplifier = stageSpec('inverting', ac(0.1, 10e3), { resistors: resistors(100e3, 100e3), reference: midSupply(), limits: { phaseMargin: value(60), gainError: value(0.01) } });
    const { resistance, largest } = demandsOf(amplifier)['phase-margin']!.feedback!;
    // 1 % at 10 kHz: the pole must lie 7.018 times higher.
    expect([resistance, largest]).toEqual([100e3, expect.closeTo(1 / (2 * Math.PI * 100e3 * 7.018 * 10e3), 14)]);
    const slow = stageSpec('inverting', ac(0.1), { resistors: resistors(100e3, 100e3), reference: midSupply(), limits: { phaseMargin: value(60) } });
    expect(demandsOf(slow)['phase-margin']!.feedback!.largest).toBe(Infinity);
    expect(demandsOf({ ...FOLLOWER, limits: { phaseMargin: value(60) } })['phase-margin']!.feedback).toBeNull();
  });
});

it('is not asked of an oscillator', () => {
  const spec = stageSpec('relaxation-oscillator', { coupling: 'dc', shape: 'band-limited' }, { oscillator: { frequency: value(1e3) }, load: { to: 'ground', capacitance: value(1e-9) } });
  expect(demandsOf(spec)['phase-margin']).toBeNull();
});
