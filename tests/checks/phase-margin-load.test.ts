import fc from 'fast-check';
import { expect, it } from 'vitest';
import { loadAngle, loadSize } from '../../src/checks/phase-margin-load.js';
import { decades } from '../formulas/networks.js';

it('nothing hanging there takes and turns nothing', () => {
  expect(loadSize(null)(1e6)).toBe(1);
  expect(loadAngle(null, 1e6)).toBe(0);
});

it('is a divider of Ro against Riso and CL by complex arithmetic, a load resistance beside both', () => {
  const asked = fc.record({ outputResistance: decades(1, 1e4), capacitance: decades(1e-12, 1e-7), resistance: fc.option(decades(1e2, 1e5)), isolation: fc.oneof(fc.constant(0), decades(1, 1e3)) });
  fc.assert(
    fc.property(asked, decades(1e3, 1e8), (load, frequency) => {
      const beside = (ohms: number): number => (load.resistance === null ? ohms : 1 / (1 / ohms + 1 / load.resistance));
      const turn = (ohms: number): number => (ohms === 0 ? 0 : 2 * Math.PI * frequency * beside(ohms) * load.capacitance);
      const [zero, pole] = [turn(load.isolation), turn(load.outputResistance + load.isolation)];
      expect(loadSize(load)(frequency) / Math.sqrt((1 + zero ** 2) / (1 + pole ** 2))).toBeCloseTo(1, 9);
      expect(loadAngle(load, frequency)).toBeCloseTo((Math.atan2(zero, 1) - Math.atan2(pole, 1)) * (180 / Math.PI), 9);
    }),
  );
});
