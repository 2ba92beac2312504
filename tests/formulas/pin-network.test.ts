import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { magnitude, subtract, type Complex } from '../../src/formulas/complex.js';
import { outputShare, pinResponse, pinResponses, pinTransfers, type PinNetwork } from '../../src/formulas/pin-network.js';
import { GROUND, solve, type Element } from '../support/nodal.js';
import { anyNetwork, capacitor, decades, divider, DRIVEN, FOLLOWING, GROUNDED, resistor } from './networks.js';

describe('network at one input', () => {
  it('is a divider for the example', () => {
    const { fromOutput, fromInput, impedance, thermal } = pinResponse(divider(9e3, 1e3), 1e3);
    expect(fromOutput.re).toBeCloseTo(0.1, 14);
    expect(fromInput).toEqual({ re: 0, im: 0 });
    expect(impedance.re).toBeCloseTo(900, 11);
    expect(thermal.map(({ name }) => name)).toEqual(['Rf', 'Rg']);
    expect(thermal[0]!.transfer).toBeCloseTo(90, 11);
    expect(thermal[1]!.transfer).toBeCloseTo(810, 11);
  });
  it('halves the power at the corner that the input capacitance makes', () => {
    const { fromOutput } = pinResponse(divider(1e3, 1e3), 1 / (2 * Math.PI * 500 * 1e-9), 1e-9);
    expect(magnitude(fromOutput)).toBeCloseTo(0.5 * Math.SQRT1_2, 14);
  });
  it('knows a pin at a reserved node', () => {
    const [output, input, ground] = [FOLLOWING, DRIVEN, GROUNDED].map((network) => pinTransfers(network)(1e3));
    expect([output!.fromOutput.re, output!.fromInput.re, output!.impedance.re]).toEqual([1, 0, 0]);
    expect([input!.fromOutput.re, input!.fromInput.re]).toEqual([0, 1]);
    expect([ground!.fromOutput.re, ground!.fromInput.re]).toEqual([0, 0]);
    const loaded = { elements: [resistor('RL', 1e3, ['output', 'ground'])], pin: 'output' };
    expect(pinResponses(loaded)(1e3).thermal).toEqual([{ name: 'RL', transfer: 0 }]);
  });
  it('opens capacitors at 0 Hz', () => {
    const blocked = { elements: [...divider(9e3, 1e3).elements.slice(0, 1), resistor('Rg', 1e3, ['n', 'x']), capacitor('C', 1e-6, ['x', 'ground'])], pin: 'n' };
    expect(pinResponse(blocked, 0).fromOutput.re).toBeCloseTo(1, 14);
    expect(pinResponse(blocked, 1e9).fromOutput.re).toBeCloseTo(0.1, 9);
  });
  it('refuses a pin without a path for direct current at 0 Hz, and takes it above', () => {
    const floating = { elements: [capacitor('C1', 1e-9, ['input', 'n']), capacitor('C2', 3e-9, ['n', 'ground'])], pin: 'n' };
    expect(() => pinResponse(floating, 0)).toThrow(/node n has no path for direct current/u);
    expect(pinResponse(floating, 1).fromInput.re).toBeCloseTo(0.25, 14);
  });

  const asked = { network: anyNetwork, frequency: decades(1, 1e7), capacitance: decades(1e-12, 1e-9) };
  it('agrees with nodal analysis of the whole circuit', () => {
    fc.assert(
      fc.property(fc.record(asked), ({ network, frequency, capacitance }) => {
        const ours = pinResponse(network, frequency, capacitance);
        const at = (drive: readonly Element[]): Complex => {
          const [re, im] = solve([...circuit(network, capacitance), ...drive], frequency)('pin');
          return { re, im };
        };
        const output = at([{ volts: 1, at: 'output' }, { volts: 0, at: 'input' }]);
        const input = at([{ volts: 0, at: 'output' }, { volts: 1, at: 'input' }]);
        const impedance = at([{ volts: 0, at: 'output' }, { volts: 0, at: 'input' }, { amps: 1, between: [GROUND, 'pin'] }]);
        expect(magnitude(subtract(ours.fromOutput, output))).toBeLessThan(1e-8);
        expect(magnitude(subtract(ours.fromInput, input))).toBeLessThan(1e-8);
        expect(magnitude(subtract(ours.impedance, impedance))).toBeLessThan(1e-8 * magnitude(impedance));
      }),
    );
  });
  it('gives the share of the output alone the same to the last bit', () => {
    expect(outputShare(FOLLOWING)(1e3)).toEqual({ re: 1, im: 0 });
    expect(outputShare(divider(9e3, 1e3), 1e-12)(0).re).toBeCloseTo(0.1, 14);
    fc.assert(
      fc.property(fc.record(asked), ({ network, frequency, capacitance }) => {
        expect(outputShare(network, capacitance)(frequency)).toEqual(pinTransfers(network, capacitance)(frequency).fromOutput);
      }),
    );
  });
  it('makes each thermal share from the noise current of its resistor', () => {
    fc.assert(
      fc.property(fc.record(asked), ({ network, frequency, capacitance }) => {
        for (const { name, transfer } of pinResponse(network, frequency, capacitance).thermal) {
          const { value, between } = network.elements.find((element) => element.name === name)!;
          if (between[0] === between[1]) continue;
          const drive: Element[] = [{ volts: 0, at: 'output' }, { volts: 0, at: 'input' }, { amps: 1, between: [inCircuit(between[0]), inCircuit(between[1])] }];
          const [re, im] = solve([...circuit(network, capacitance), ...drive], frequency)('pin');
          const whole = pinResponse(network, frequency, capacitance).impedance.re;
          expect(Math.abs(transfer - (re * re + im * im) / value)).toBeLessThan(1e-7 * whole);
        }
      }),
    );
  });
  it('adds thermal shares up to the real part of the impedance (Nyquist)', () => {
    fc.assert(
      fc.property(fc.record({ ...asked, frequency: decades(1e-3, 1e15) }), ({ network, frequency, capacitance }) => {
        const { thermal, impedance } = pinResponse(network, frequency, capacitance);
        const sum = thermal.reduce((total, { transfer }) => total + transfer, 0);
        expect(Math.abs(sum - impedance.re)).toBeLessThan(1e-12 * magnitude(impedance));
      }),
    );
  });
});

function inCircuit(node: string): string {
  return node === 'ground' ? GROUND : node;
}

function circuit({ elements }: PinNetwork, capacitance: number): Element[] {
  const parts = elements
    .filter(({ between: [a, b] }) => a !== b)
    .map(({ kind, value, between: [a, b] }): Element => {
      const between = [inCircuit(a), inCircuit(b)] as const;
      return kind === 'resistor' ? { r: value, between } : { c: value, between };
    });
  return [...parts, { c: capacitance, between: ['pin', GROUND] }, { r: 1e3, between: ['output', GROUND] }, { r: 1e3, between: ['input', GROUND] }];
}
