import { describe, expect, it } from 'vitest';
import {
  capacitanceForPhaseMargin,
  isolationGainError,
  isolationResistance,
  leadLagCrossover,
  leadLagPhaseMargin,
  neutralCapacitor,
  poleFrequency,
} from '../../src/formulas/stability.js';
import { twoPolePhaseMargin } from '../../src/formulas/two-pole-loop.js';
import { example, refuses } from '../support/examples.js';

describe('stability', () => {
  const loop = { asymptote: 1e6, zero: 318_309.9, pole: 63_661.98 };
  example('poleFrequency(200, 1e-9)', () => poleFrequency(200, 1e-9), 795_775);
  example('capacitanceForPhaseMargin(1e6, 200, 45)', () => capacitanceForPhaseMargin(1e6, 200, 45), 1.125395e-9);
  example('leadLagCrossover', () => leadLagCrossover(loop), 290_042);
  example('leadLagPhaseMargin', () => leadLagPhaseMargin(loop), 54.7192);
  example('isolationResistance(200, 45)', () => isolationResistance(200, 45), 41.4214);
  example('isolationGainError(41.42, 1e3)', () => isolationGainError(41.42, 1e3), -0.039773);
  example('neutralCapacitor(10e-12, 100e3, 100e3)', () => neutralCapacitor(10e-12, 100e3, 100e3), 10e-12);
  it('becomes the two-pole loop when the zero is far away', () => {
    expect(leadLagPhaseMargin({ asymptote: 1, zero: 1e9, pole: 2 })).toBeCloseTo(twoPolePhaseMargin(1, 2), 6);
  });
  refuses(() => poleFrequency(0, 1), 'poleFrequency: resistance must be finite, above 0, but is 0');
  refuses(() => capacitanceForPhaseMargin(1, 0, 45), 'capacitanceForPhaseMargin: resistance must be finite, above 0, but is 0');
  refuses(() => leadLagCrossover({ ...loop, pole: 0 }), 'leadLagCrossover: pole must be finite, above 0, but is 0');
  refuses(() => leadLagPhaseMargin({ ...loop, zero: -1 }), 'leadLagCrossover: zero must be finite, above 0, but is -1');
  refuses(() => isolationResistance(200, 90), 'isolationResistance: phaseMargin must be finite, above 0, below 90, but is 90');
  refuses(() => isolationGainError(-1, 1), 'isolationGainError: isolation must be finite, at least 0, but is -1');
  refuses(() => neutralCapacitor(0, 1, 1), 'neutralCapacitor: inputCapacitance must be finite, above 0, but is 0');
});
