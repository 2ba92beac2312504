import { describe } from 'vitest';
import { oscillatorDifferentialInput, oscillatorPeriod, oscillatorThresholds } from '../../src/formulas/oscillator.js';
import { example, refuses } from '../support/examples.js';

describe('relaxation oscillator', () => {
  const ideal = { supply: 5, high: 5, low: 0, toSupply: 1e5, toGround: 1e5, toOutput: 1e5 };
  const conventional = { ...ideal, high: 3.5, low: 0.05 };
  example('oscillatorThresholds, upper', () => oscillatorThresholds(ideal).upper, 10 / 3);
  example('oscillatorThresholds, lower', () => oscillatorThresholds(ideal).lower, 5 / 3);
  example('oscillatorPeriod of rail-to-rail outputs is 2·RC·ln 2 and', () => oscillatorPeriod(ideal, 1e-4).frequency, 7213.5);
  example('oscillatorPeriod of a conventional output', () => oscillatorPeriod(conventional, 1e-4).frequency, 6512.6);
  example('its duty', () => oscillatorPeriod(conventional, 1e-4).duty, 0.653);
  example('oscillatorDifferentialInput', () => oscillatorDifferentialInput({ ...ideal, high: 4.9, low: 0.05 }), 1.61667);
  refuses(
    () => oscillatorThresholds({ ...ideal, toGround: 0 }),
    'oscillatorThresholds: toGround must be finite, above 0, but is 0',
  );
  refuses(
    () => oscillatorPeriod({ ...ideal, high: 2.5 }, 1e-4),
    'oscillatorPeriod: high minus upper threshold must be finite, above 0, but is 0',
  );
  refuses(() => oscillatorPeriod(ideal, 0), 'oscillatorPeriod: timeConstant must be finite, above 0, but is 0');
  refuses(() => oscillatorDifferentialInput({ ...ideal, high: NaN }), 'oscillatorThresholds: high must be finite, but is NaN');
});
