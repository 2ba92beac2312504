import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { atEitherEnd, type Loop } from '../../src/checks/phase-margin-loop.js';
import { turningResistance, unknownInput } from '../../src/checks/phase-margin-turns.js';
import { capacitanceForPhaseMargin } from '../../src/formulas/stability.js';

const ENDS = { least: 0.6e6, most: 1e6 };
const DIVIDER: Loop = {
  network: {
    plus: { elements: [], pin: 'ground' },
    minus: {
      pin: 'pin',
      elements: [
        { name: 'feedback', kind: 'resistor', value: 100e3, between: ['output', 'pin'] },
        { name: 'input', kind: 'resistor', value: 100e3, between: ['pin', 'ground'] },
      ],
    },
  },
  open: null, inputCapacitance: 0, ownPole: Infinity, load: null,
};

describe('the output resistance at which the margin falls to the limit', () => {
  it('is cos PM/(2π·C·fc·sin²PM), at the most of the bandwidth', () => {
    fc.assert(
      fc.property(fc.double({ min: 20, max: 80, noNaN: true }), fc.double({ min: 10e-12, max: 10e-9, noNaN: true }), (degrees, capacitance) => {
        const loaded = { ...DIVIDER, load: { outputResistance: 0, capacitance, resistance: null, isolation: 0 } };
        const point = turningResistance(loaded, ENDS, degrees)!;
        // One ohm's capacitance over ours: the form is the same in both.
        expect(point.value / (capacitanceForPhaseMargin(0.5e6, 1, degrees) / capacitance)).toBeCloseTo(1, 5);
        expect(atEitherEnd({ ...loaded, load: { ...loaded.load, outputResistance: point.value } }, ENDS)).toBeGreaterThanOrEqual(degrees);
      }),
      { seed: 1, numRuns: 20 },
    );
  });

  it('is none where the loop falls short without any, or nothing is loaded', () => {
    expect(turningResistance({ ...DIVIDER, ownPole: 0.1e6, load: { outputResistance: 0, capacitance: 1e-9, resistance: null, isolation: 0 } }, ENDS, 60)).toBeNull();
    expect(turningResistance(DIVIDER, ENDS, 60)).toBeNull();
    // Isolated by 10 kΩ hardly any output resistance does harm to 30°.
    expect(turningResistance({ ...DIVIDER, load: { outputResistance: 0, capacitance: 1e-12, resistance: null, isolation: 1e6 } }, ENDS, 30)).toBeNull();
  });
});

describe('an input capacitance nobody stated', () => {
  it('is told at the value where the margin falls to the limit', () => {
    // f2 = fc·sin²45°/cos 45° with 50 kΩ and fc = 0.5 MHz: 9.003 pF.
    expect(unknownInput(DIVIDER, ENDS, 45)).toEqual(['input capacitance not known and not counted: at 9 pF the margin falls to 45°']);
  });

  it('is not told where even ten nanofarad leave the margin', () => {
    const small = { ...DIVIDER, network: { ...DIVIDER.network, minus: { ...DIVIDER.network.minus, elements: DIVIDER.network.minus.elements.map((one) => ({ ...one, value: 1 })) } } };
    expect(unknownInput(small, ENDS, 45)).toEqual([]);
  });
});
