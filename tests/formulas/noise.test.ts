import { describe } from 'vitest';
import { noiseThroughPole, outputNoiseDensity, referenceRippleGain, resistorNoise } from '../../src/formulas/noise.js';
import { example, refuses } from '../support/examples.js';

describe('noise', () => {
  example('resistorNoise(1e3, 298.15)', () => resistorNoise(1e3, 298.15), 4.05779e-9);
  const sources = { noiseGain: 10, voltage: 10e-9, current: 1e-12, plus: 10e3, minus: 900, temperature: 300 };
  example('outputNoiseDensity', () => outputNoiseDensity(sources), 195.294e-9);
  const noise = { density: 20e-9, corner: 200, lowest: 0.1, pole: 333_333 };
  example('noiseThroughPole', () => noiseThroughPole(noise), 14.514e-6);
  example('noiseThroughPole, white only, is √(π/2·fB) and', () => noiseThroughPole({ ...noise, corner: 0 }), 14.472e-6);
  const divider = { upper: 1e5, lower: 1e5, capacitance: 1e-6, frequency: 100, noiseGain: 11 };
  example('referenceRippleGain', () => referenceRippleGain(divider), 0.174982);
  example('referenceRippleGain without the capacitor', () => referenceRippleGain({ ...divider, capacitance: 0 }), 5.5);

  refuses(() => resistorNoise(-1, 300), 'resistorNoise: resistance must be finite, at least 0, but is -1');
  refuses(() => outputNoiseDensity({ ...sources, noiseGain: 0 }), 'outputNoiseDensity: noiseGain must be finite, at least 1, but is 0');
  refuses(() => noiseThroughPole({ ...noise, lowest: 0 }), 'noiseThroughPole: lowest must be finite, above 0, but is 0');
  refuses(() => referenceRippleGain({ ...divider, lower: 0 }), 'referenceRippleGain: lower must be finite, above 0, but is 0');
});
