import { describe } from 'vitest';
import { edgePeakSlewRate, edgeSlewRate } from '../../src/formulas/edges.js';
import { example, refuses } from '../support/examples.js';

describe('edges', () => {
  example('edgeSlewRate(4, 1e-6)', () => edgeSlewRate(4, 1e-6), 3.2e6);
  example("edgePeakSlewRate(1, 1e-6, 'singlePole')", () => edgePeakSlewRate(1, 1e-6, 'singlePole'), 2.1972e6);
  example("edgePeakSlewRate(1, 1e-6, 'raisedCosine')", () => edgePeakSlewRate(1, 1e-6, 'raisedCosine'), 0.9273e6);
  example("edgePeakSlewRate(1, 1e-6, 'gaussian')", () => edgePeakSlewRate(1, 1e-6, 'gaussian'), 1.0225e6);
  refuses(() => edgeSlewRate(4, 0), 'edgePeakSlewRate: riseTime must be finite, above 0, but is 0');
  refuses(() => edgePeakSlewRate(-1, 1, 'ramp'), 'edgePeakSlewRate: step must be finite, at least 0, but is -1');
});
