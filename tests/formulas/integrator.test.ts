import { describe } from 'vitest';
import { integratorDrift, integratorSlope, timeToRail } from '../../src/formulas/integrator.js';
import { example, refuses } from '../support/examples.js';

describe('integrator', () => {
  const stage = { offset: 1e-3, biasCurrent: 0, resistance: 100e3, capacitance: 10e-9 };
  example('integratorDrift', () => integratorDrift(stage), 1);
  example('integratorDrift with 5 nA', () => integratorDrift({ ...stage, biasCurrent: 5e-9 }), 1.5);
  example('timeToRail(10e-9, 2.5, 1e-6)', () => timeToRail(10e-9, 2.5, 1e-6), 25e-3);
  refuses(() => integratorDrift({ ...stage, capacitance: 0 }), 'integratorDrift: capacitance must be finite, above 0, but is 0');
  refuses(() => timeToRail(1, 1, 0), 'timeToRail: current must be finite, above 0, but is 0');

  const driven = { input: 1, output: 0, resistance: 100e3, bleed: Infinity, capacitance: 100e-9 };
  example('integratorSlope', () => integratorSlope(driven), 100);
  example('integratorSlope with 2 V at the output across 200 kΩ', () => integratorSlope({ ...driven, output: 2, bleed: 200e3 }), 200);
  refuses(() => integratorSlope({ ...driven, capacitance: 0 }), 'integratorSlope: capacitance must be finite, above 0, but is 0');
});
