import { describe } from 'vitest';
import {
  addWorstCase,
  biasCurrentAt,
  biasError,
  followerGainError,
  inputReferredError,
  loadedOpenLoopGain,
  openLoopGainError,
  rootSumSquare,
  worstCaseSum,
} from '../../src/formulas/dc-error.js';
import { ratioOfDecibels } from '../../src/formulas/decibel.js';
import { example, refuses } from '../support/examples.js';

describe('DC error', () => {
  example('biasCurrentAt(1e-12, 25, 85)', () => biasCurrentAt(1e-12, 25, 85), 64e-12);
  example('biasError', () => biasError({ bias: 1e-9, offset: 0.2e-9, plus: 10e3, minus: 9e3 }), 2.9e-6);
  example('worstCaseSum([0.003, -0.004])', () => worstCaseSum([0.003, -0.004]), 0.007);
  example('addWorstCase(0.003, -0.004)', () => addWorstCase(0.003, -0.004), 0.007);
  example('rootSumSquare([0.003, 0.004, 0.012])', () => rootSumSquare([0.003, 0.004, 0.012]), 0.013);
  const errors = {
    offset: 0.5e-3,
    drift: 2e-6,
    temperatureChange: 60,
    commonModeChange: 2,
    commonModeRejection: ratioOfDecibels(80),
    supplyChange: 0.5,
    supplyRejection: ratioOfDecibels(90),
    outputChange: 4,
    openLoopGain: ratioOfDecibels(100),
  };
  example('inputReferredError', () => inputReferredError(errors), 0.875811e-3);
  example('openLoopGainError(1e5, 10)', () => openLoopGainError(1e5, 10), -0.99990e-4);
  example('loadedOpenLoopGain(1e5, 1e3, 100)', () => loadedOpenLoopGain(1e5, 1e3, 100), 90_909);
  example('followerGainError(1000)', () => followerGainError(1000), 0.001);

  refuses(() => biasCurrentAt(1, -300, 25), 'biasCurrentAt: rated must be finite, above -273.15, but is -300');
  refuses(() => biasError({ bias: -1, offset: 0, plus: 0, minus: 0 }), 'biasError: bias must be finite, at least 0, but is -1');
  refuses(() => worstCaseSum([1, NaN]), 'worstCaseSum: term must be finite, but is NaN');
  refuses(() => rootSumSquare([Infinity]), 'rootSumSquare: term must be finite, but is Infinity');
  refuses(
    () => inputReferredError({ ...errors, openLoopGain: 0 }),
    'inputReferredError: openLoopGain must be finite, above 0, but is 0',
  );
  refuses(() => openLoopGainError(0, 1), 'openLoopGainError: openLoopGain must be finite, above 0, but is 0');
  refuses(() => loadedOpenLoopGain(1, 0, 1), 'loadedOpenLoopGain: load must be finite, above 0, but is 0');
  refuses(() => followerGainError(0), 'followerGainError: rejection must be finite, above 0, but is 0');
});
