import { describe } from 'vitest';
import { decibels, ratioOfDecibels } from '../../src/formulas/decibel.js';
import { example, refuses } from '../support/examples.js';

describe('decibels', () => {
  example('decibels(1000)', () => decibels(1000), 60);
  example('ratioOfDecibels(80)', () => ratioOfDecibels(80), 10_000);
  refuses(() => decibels(0), 'decibels: ratio must be finite, above 0, but is 0');
  refuses(() => ratioOfDecibels(Infinity), 'ratioOfDecibels: level must be finite, but is Infinity');
});
