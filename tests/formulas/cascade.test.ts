import { describe } from 'vitest';
import { cascadeShrinkage, gainBandwidthPerStage } from '../../src/formulas/cascade.js';
import { example, refuses } from '../support/examples.js';

describe('cascade', () => {
  example('cascadeShrinkage(3)', () => cascadeShrinkage(3), 0.50982);
  example('cascadeShrinkage(1)', () => cascadeShrinkage(1), 1);
  example('gainBandwidthPerStage(1000, 20e3, 2)', () => gainBandwidthPerStage(1000, 20e3, 2), 982_693);
  refuses(() => cascadeShrinkage(0), 'cascadeShrinkage: stages must be finite, at least 1, but is 0');
  refuses(() => cascadeShrinkage(1.5), 'cascadeShrinkage: stages must be a whole number, but is 1.5');
  refuses(() => gainBandwidthPerStage(0.5, 1, 1), 'gainBandwidthPerStage: gain must be finite, at least 1, but is 0.5');
});
