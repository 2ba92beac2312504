import { describe } from 'vitest';
import { pulseExcursion } from '../../src/formulas/coupling.js';
import { example, refuses } from '../support/examples.js';

describe('coupling capacitor', () => {
  example('pulseExcursion(2, 0.1).above', () => pulseExcursion(2, 0.1).above, 1.8);
  example('pulseExcursion(2, 0.1).below', () => pulseExcursion(2, 0.1).below, 0.2);
  refuses(() => pulseExcursion(2, 1.5), 'pulseExcursion: duty must be finite, at least 0, at most 1, but is 1.5');
  refuses(() => pulseExcursion(-2, 0.5), 'pulseExcursion: peakToPeak must be finite, at least 0, but is -2');
});
