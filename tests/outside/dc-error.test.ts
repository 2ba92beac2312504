import { describe } from 'vitest';
import { biasCurrentAt, followerGainError, inputReferredError, rootSumSquare } from '../../src/formulas/dc-error.js';
import { ratioOfDecibels } from '../../src/formulas/decibel.js';
import { referenceRippleGain } from '../../src/formulas/noise.js';
import { ratioCorners } from '../../src/formulas/tolerances.js';
import { published, rederived } from '../support/check-values.js';
import { corners } from '../support/corners.js';
import { GROUND, solve, type Element } from '../support/nodal.js';

describe('DC error', () => {
  published('DC-03', (of) => 1 + ratioCorners(of('G') - 1, of('t')).max);
  rederived('DC-03', {
    by: 'nodal analysis at every corner of the resistors',
    within: 1e-9,
    value: (of) => {
      const gains = corners(2).map(([f, g]) => {
        const elements: Element[] = [
          { volts: 1, at: 'in' },
          { r: (of('G') - 1) * (1 + f! * of('t')), between: ['out', 'n'] },
          { r: 1 + g! * of('t'), between: ['n', GROUND] },
          { plus: 'in', minus: 'n', output: 'out' },
        ];
        return solve(elements, 0)('out')[0];
      });
      return Math.max(...gains);
    },
  });

  published('DC-04', (of) => followerGainError(ratioOfDecibels(of('CMRR_dB'))));
  published('DC-05', (of) => rootSumSquare(of.list('terms_V')));

  // AC-coupled: direct current sees a noise gain of 1; the equal divider passes half of the supply change.
  published('DC-06', (of) => of('dVcc_V') * referenceRippleGain({ upper: 1, lower: 1, capacitance: 0, frequency: 0, noiseGain: 1 }));
  rederived('DC-06', {
    by: 'nodal analysis of the circuit before and after the step',
    within: 1e-9,
    value: (of) => {
      const output = (supply: number): number => {
        const elements: Element[] = [
          { volts: supply, at: 'top' },
          { r: 1e5, between: ['top', 'ref'] },
          { r: 1e5, between: ['ref', GROUND] },
          { c: 1e-6, between: [GROUND, 'x'] },
          { r: 1e4, between: ['x', 'n'] },
          { r: 1e5, between: ['n', 'out'] },
          { plus: 'ref', minus: 'n', output: 'out' },
        ];
        return solve(elements, 0)('out')[0];
      };
      return output(5 + of('dVcc_V')) - output(5);
    },
  });

  published('DC-07', (of) => {
    return inputReferredError({
      offset: of('Vos_V'),
      drift: of('TC_V_per_K'),
      temperatureChange: of('dT_K'),
      commonModeChange: of('dVcm_V'),
      commonModeRejection: ratioOfDecibels(of('CMRR_dB')),
      supplyChange: of('dVs_V'),
      supplyRejection: ratioOfDecibels(of('PSRR_dB')),
      outputChange: of('dVo_V'),
      openLoopGain: ratioOfDecibels(of('Aol_dB')),
    });
  });
  published('DC-08', (of) => biasCurrentAt(of('Ib25_A'), 25, of('T_C')) * of('Rf_ohm'));
});
