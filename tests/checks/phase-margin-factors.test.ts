import { describe, expect, it } from 'vitest';
import { factorsOf, isResistive, networksOf, onlyLags } from '../../src/checks/phase-margin-factors.js';
import type { Loop } from '../../src/checks/phase-margin-loop.js';
import { divider, GROUNDED } from '../formulas/networks.js';

const NETWORK = { plus: GROUNDED, minus: divider(70e3, 10e3) };
const BARE: Loop = { network: NETWORK, open: null, inputCapacitance: 0, ownPole: Infinity, load: null };
const LOAD = { outputResistance: 200, capacitance: 1e-9, resistance: null, isolation: 0 };

describe('what comes back round a loop', () => {
  it('is the divider, and with a load its low pass beside it (by hand: 1/8, and a corner of 1/(2 pi 200 Ohm 1 nF) takes 1/sqrt 2)', () => {
    const { bare, loaded, size } = factorsOf(BARE, 1e6);
    expect([bare(1e3).re, bare(1e3).im, loaded]).toEqual([0.125, 0, null]);
    expect(size(1e6)).toBeCloseTo(0.125, 12);
    const corner = 1 / (2 * Math.PI * 200 * 1e-9);
    expect(factorsOf({ ...BARE, load: LOAD }, 1e6).size(corner)).toBeCloseTo(0.125 / Math.SQRT2, 12);
  });

  it('of one capacitance at the - input is worked out once', () => {
    const one = { ...BARE, inputCapacitance: 5e-12 };
    expect(factorsOf(one, 1e6).bare).toBe(factorsOf({ ...one, load: LOAD, ownPole: 3e6 }, 2e6).bare);
    expect(factorsOf(one, 1e6).bare).toBe(factorsOf({ ...BARE, stray: 5e-12 }, 1e6).bare);
    expect(factorsOf(one, 1e6).bare).not.toBe(factorsOf(BARE, 1e6).bare);
  });

  it('only lags through resistors with a load that is not isolated', () => {
    expect([onlyLags(BARE), onlyLags({ ...BARE, load: LOAD }), onlyLags({ ...BARE, load: { ...LOAD, isolation: 10 } })]).toEqual([true, true, false]);
    const open = { feedback: 70e3, inputCapacitance: 50e-12 };
    expect([isResistive(BARE), isResistive({ ...BARE, open })]).toEqual([true, false]);
  });

  it('has the capacitor that the gain bandwidth chooses', () => {
    const names = (loop: Loop): string[] => networksOf(loop, 1e6).minus.elements.map(({ kind }) => kind);
    expect(names(BARE)).not.toContain('capacitor');
    expect(names({ ...BARE, open: { feedback: 70e3, inputCapacitance: 50e-12 } })).toContain('capacitor');
  });
});
