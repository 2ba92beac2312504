import { describe } from 'vitest';
import {
  gaussianExceedance,
  idealConverterSignalToNoise,
  peakToPeakNoise,
  shotSignalToNoise,
  signalToNoise,
} from '../../src/formulas/signal-to-noise.js';
import { example, refuses } from '../support/examples.js';

describe('signal to noise', () => {
  example('peakToPeakNoise(153.74e-6)', () => peakToPeakNoise(153.74e-6), 1.014684e-3);
  example('gaussianExceedance(6.6)', () => gaussianExceedance(6.6), 9.66848e-4);
  example('gaussianExceedance(0)', () => gaussianExceedance(0), 1);
  example('signalToNoise(4.8, 100e-6)', () => signalToNoise(4.8, 100e-6), 84.5939);
  example('shotSignalToNoise(1e-6, 1e6)', () => shotSignalToNoise(1e-6, 1e6), 64.9426);
  example('idealConverterSignalToNoise(12)', () => idealConverterSignalToNoise(12), 74.0081);
  refuses(() => peakToPeakNoise(-1), 'peakToPeakNoise: rms must be finite, at least 0, but is -1');
  refuses(() => gaussianExceedance(11), 'gaussianExceedance: factor must be finite, at least 0, at most 10, but is 11');
  refuses(() => signalToNoise(1, 0), 'signalToNoise: rms must be finite, above 0, but is 0');
  refuses(() => shotSignalToNoise(0, 1), 'shotSignalToNoise: current must be finite, above 0, but is 0');
  refuses(() => idealConverterSignalToNoise(0), 'idealConverterSignalToNoise: bits must be finite, at least 1, but is 0');
});
