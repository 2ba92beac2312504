import { describe, expect, it } from 'vitest';
import { BOLTZMANN, ELEMENTARY_CHARGE, thermalVoltage } from '../../src/formulas/constants.js';
import { example, refuses } from '../support/examples.js';

describe('constants', () => {
  it('are the exact ones of the SI', () => {
    expect([BOLTZMANN, ELEMENTARY_CHARGE]).toEqual([1.380649e-23, 1.602176634e-19]);
  });
  example('thermalVoltage(298.15)', () => thermalVoltage(298.15), 0.025693);
  refuses(() => thermalVoltage(0), 'thermalVoltage: temperature must be finite, above 0, but is 0');
});
