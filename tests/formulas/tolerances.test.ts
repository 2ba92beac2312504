import { describe } from 'vitest';
import { fractionCorners, ratioCorners } from '../../src/formulas/tolerances.js';
import { example, refuses } from '../support/examples.js';

describe('resistor tolerances', () => {
  example('ratioCorners(9, 0.01).min', () => ratioCorners(9, 0.01).min, 8.8218);
  example('ratioCorners(9, 0.01).max', () => ratioCorners(9, 0.01).max, 9.1818);
  example('fractionCorners(0.5, 0.01).min', () => fractionCorners(0.5, 0.01).min, 0.495);
  example('fractionCorners(0.5, 0.01).max', () => fractionCorners(0.5, 0.01).max, 0.505);
  example('fractionCorners(1, 0.01).min, no divider at all,', () => fractionCorners(1, 0.01).min, 1);
  refuses(() => ratioCorners(-1, 0.01), 'ratioCorners: ratio must be finite, at least 0, but is -1');
  refuses(() => ratioCorners(1, 1), 'ratioCorners: tolerance must be finite, at least 0, below 1, but is 1');
  refuses(() => fractionCorners(1.1, 0), 'fractionCorners: fraction must be finite, at least 0, at most 1, but is 1.1');
});
