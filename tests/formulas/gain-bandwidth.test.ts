import { describe, expect, it } from 'vitest';
import {
  closedLoopBandwidth,
  gainBandwidthForMagnitudeError,
  gainBandwidthForPhaseError,
  gainBandwidthForVectorError,
  magnitudeErrorAt,
  phaseErrorAt,
  vectorErrorAt,
} from '../../src/formulas/gain-bandwidth.js';
import { example, refuses } from '../support/examples.js';

describe('gain-bandwidth', () => {
  example('closedLoopBandwidth(1e6, 11)', () => closedLoopBandwidth(1e6, 11), 90_909);
  example('gainBandwidthForMagnitudeError(10, 20e3, 0.01)', () => gainBandwidthForMagnitudeError(10, 20e3, 0.01), 1.403585e6);
  example('gainBandwidthForPhaseError(10, 20e3, 1)', () => gainBandwidthForPhaseError(10, 20e3, 1), 11.45799e6);
  example('gainBandwidthForVectorError(10, 20e3, 0.01)', () => gainBandwidthForVectorError(10, 20e3, 0.01), 19.999e6);
  example('magnitudeErrorAt(1, 10e3, 1e6)', () => magnitudeErrorAt(1, 10e3, 1e6), 4.9996e-5);
  example('phaseErrorAt(1, 10e3, 1e6)', () => phaseErrorAt(1, 10e3, 1e6), 0.57294);
  example('vectorErrorAt(1, 10e3, 1e6)', () => vectorErrorAt(1, 10e3, 1e6), 0.0099995);

  it('gives back the error it was asked for', () => {
    for (const error of [1e-9, 1e-4, 0.01, 0.3, 0.9]) {
      const relative = (actual: number): number => actual / error;
      expect(relative(magnitudeErrorAt(8, 2e3, gainBandwidthForMagnitudeError(8, 2e3, error)))).toBeCloseTo(1, 12);
      expect(relative(vectorErrorAt(8, 2e3, gainBandwidthForVectorError(8, 2e3, error)))).toBeCloseTo(1, 12);
      expect(relative(phaseErrorAt(8, 2e3, gainBandwidthForPhaseError(8, 2e3, error)))).toBeCloseTo(1, 12);
    }
  });

  refuses(() => closedLoopBandwidth(1e6, 0.9), 'closedLoopBandwidth: noiseGain must be finite, at least 1, but is 0.9');
  refuses(
    () => gainBandwidthForMagnitudeError(10, 20e3, 0),
    'gainBandwidthForMagnitudeError: error must be finite, above 0, below 1, but is 0',
  );
  refuses(
    () => gainBandwidthForPhaseError(10, 20e3, 90),
    'gainBandwidthForPhaseError: phase must be finite, above 0, below 90, but is 90',
  );
  refuses(
    () => gainBandwidthForVectorError(10, -1, 0.1),
    'gainBandwidthForVectorError: frequency must be finite, at least 0, but is -1',
  );
  refuses(() => magnitudeErrorAt(1, 1, 0), 'magnitudeErrorAt: gainBandwidth must be finite, above 0, but is 0');
  refuses(() => phaseErrorAt(0, 1, 1), 'phaseErrorAt: noiseGain must be finite, at least 1, but is 0');
  refuses(() => vectorErrorAt(1, NaN, 1), 'vectorErrorAt: frequency must be finite, at least 0, but is NaN');
});
