import { describe } from 'vitest';
import { inputCrossoverDistortion } from '../../src/formulas/input-crossover.js';
import { highFrequencyNoiseGain } from '../../src/formulas/transimpedance.js';
import { published, rederived } from '../support/check-values.js';
import { GROUND, magnitude, solve, type Element } from '../support/nodal.js';
import { harmonics } from '../support/waveforms.js';

describe('input stage', () => {
  published('INP-01', (of) => {
    return inputCrossoverDistortion({ step: of('dVos_V'), crossover: of('Vx_V'), level: of('Vdc_V'), peak: of('Vp_V') });
  });
  rederived('INP-01', {
    by: 'Fourier sums of a sine with the step in it',
    // The step also changes the fundamental a little, which the relation leaves out.
    within: 3e-3,
    value: (of) => {
      const points = 200_000;
      const output = (v: number): number => v + (v > of('Vx_V') ? of('dVos_V') : 0);
      const samples = Array.from({ length: points }, (_, k) => {
        return output(of('Vdc_V') + of('Vp_V') * Math.sin((2 * Math.PI * (k + 0.5)) / points));
      });
      return harmonics(samples).distortion;
    },
  });

  published('INP-03', (of) => highFrequencyNoiseGain(0, of('Cf_F')));
  rederived('INP-03', {
    by: 'the feedback divider at 10 GHz',
    within: 1e-3,
    value: (of) => {
      const elements: Element[] = [
        { volts: 1, at: 'out' },
        { r: of('Rf_ohm'), between: ['out', 'n'] },
        { c: of('Cf_F'), between: ['out', 'n'] },
        { r: of('Rin_ohm'), between: ['n', GROUND] },
      ];
      return 1 / magnitude(solve(elements, 1e10)('n'));
    },
  });
});
