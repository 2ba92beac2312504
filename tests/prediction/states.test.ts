import { describe, expect, it } from 'vitest';
import { pinTransfers, type PinNetwork } from '../../src/formulas/pin-network.js';
import { dot, steadyState } from '../../src/prediction/dense.js';
import { networkStates } from '../../src/prediction/states.js';

const SALLEN_KEY: PinNetwork = {
  pin: 'pin',
  elements: [
    { name: 'R1', kind: 'resistor', value: 10e3, between: ['input', 'inner'] },
    { name: 'R2', kind: 'resistor', value: 12e3, between: ['inner', 'pin'] },
    { name: 'C1', kind: 'capacitor', value: 2e-9, between: ['inner', 'output'] },
    { name: 'C2', kind: 'capacitor', value: 1e-9, between: ['pin', 'ground'] },
  ],
};
const MULTIPLE: PinNetwork = {
  pin: 'pin',
  elements: [
    { name: 'R1', kind: 'resistor', value: 5e3, between: ['input', 'inner'] },
    { name: 'R2', kind: 'resistor', value: 10e3, between: ['inner', 'output'] },
    { name: 'R3', kind: 'resistor', value: 3e3, between: ['inner', 'pin'] },
    { name: 'C1', kind: 'capacitor', value: 10e-9, between: ['inner', 'ground'] },
    { name: 'C2', kind: 'capacitor', value: 1e-9, between: ['pin', 'output'] },
  ],
};
// A node without any capacitance, and a loop of capacitors from output to ground.
const MIXED: PinNetwork = {
  pin: 'pin',
  elements: [
    { name: 'Ra', kind: 'resistor', value: 1e3, between: ['input', 'a'] },
    { name: 'Rb', kind: 'resistor', value: 2e3, between: ['a', 'pin'] },
    { name: 'Rf', kind: 'resistor', value: 50e3, between: ['pin', 'output'] },
    { name: 'Cf', kind: 'capacitor', value: 5e-12, between: ['pin', 'output'] },
    { name: 'Cin', kind: 'capacitor', value: 20e-12, between: ['pin', 'ground'] },
  ],
};

describe('networks as first-order equations', () => {
  it.each([['Sallen-Key', SALLEN_KEY], ['multiple feedback', MULTIPLE], ['mixed', MIXED]] as const)('%s: the same transfers as by nodal analysis at each frequency', (_name, network) => {
    const states = networkStates({ elements: network.elements, held: ['output', 'input'], fed: [network.pin], taps: [network.pin] });
    const known = pinTransfers(network);
    for (const frequency of [1, 1e3, 1e4, 1e5, 1e7]) {
      const omega = 2 * Math.PI * frequency;
      const { fromOutput, fromInput, impedance } = known(frequency);
      [fromOutput, fromInput, impedance].forEach((wanted, source) => {
        const { order, rates, volts } = states;
        const inner = steadyState(rates.map((row) => row.slice(0, order)), rates.map((row) => ({ re: row[order + source]!, im: 0 })), omega)!;
        const row = volts[0]!;
        const re = dot(row.slice(0, order), inner.map((value) => value.re)) + row[order + source]!;
        const im = dot(row.slice(0, order), inner.map((value) => value.im));
        const size = Math.hypot(wanted.re, wanted.im);
        expect(Math.hypot(re - wanted.re, im - wanted.im)).toBeLessThan(1e-9 * size + 1e-12);
      });
    }
  });

  it('has as many states as independent capacitors', () => {
    const orders = [SALLEN_KEY, MULTIPLE, MIXED].map((network) => networkStates({ elements: network.elements, held: ['output', 'input'], fed: [], taps: [network.pin] }).order);
    expect(orders).toEqual([2, 2, 1]);
  });
});
