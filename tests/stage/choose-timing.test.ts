import { describe, expect, it } from 'vitest';
import { chooseTiming } from '../../src/stage/choose-timing.js';

describe('timing components', () => {
  it.each([1e-1, 1e-3, 361e-6, 7e-6, 2e-6])('for a time constant of %f s are within 1.3 %%, resistor in 10 kΩ..1 MΩ', (wanted) => {
    const { resistance, capacitance } = chooseTiming(wanted, {})!;
    expect(Math.abs((resistance * capacitance) / wanted - 1)).toBeLessThan(0.013);
    expect(resistance).toBeGreaterThanOrEqual(10e3);
    expect(resistance).toBeLessThanOrEqual(1e6);
  });

  it('take capacitors from 1 nF on where that can be, from 100 pF on where not', () => {
    expect(chooseTiming(361e-6, {})!.capacitance).toBeGreaterThanOrEqual(1e-9);
    expect(chooseTiming(2e-6, {})!.capacitance).toBeLessThan(1e-9);
  });

  it('keep what is written', () => {
    expect(chooseTiming(361e-6, { capacitance: 1.1e-9 })).toEqual({ resistance: 332e3, capacitance: 1.1e-9 });
    expect(chooseTiming(100e-6, { resistance: 47e3 })).toEqual({ resistance: 47e3, capacitance: 2.2e-9 });
  });

  it('are none outside', () => {
    expect(chooseTiming(1e-7, {})).toBeNull();
    expect(chooseTiming(1e-3, { capacitance: 1e-6 })).toBeNull();
  });
});
