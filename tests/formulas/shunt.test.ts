import { describe } from 'vitest';
import { leastReadableCurrent, offsetAsCurrent } from '../../src/formulas/shunt.js';
import { example, refuses } from '../support/examples.js';

describe('shunt', () => {
  example('leastReadableCurrent(20e-3, 50, 10e-3)', () => leastReadableCurrent(20e-3, 50, 10e-3), 0.04);
  example('offsetAsCurrent(1e-3, 10e-3)', () => offsetAsCurrent(1e-3, 10e-3), 0.1);
  refuses(() => leastReadableCurrent(1, 0, 1), 'leastReadableCurrent: gain must be finite, above 0, but is 0');
  refuses(() => offsetAsCurrent(1, 0), 'offsetAsCurrent: shunt must be finite, above 0, but is 0');
});
