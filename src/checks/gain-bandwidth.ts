import type { NumberDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

/** Gain bandwidth the gain error at the top frequency needs against the part's. */
export const gainBandwidth: Check<NumberDemand> = {
  id: 'gain-bandwidth',
  title: 'gain bandwidth',
  unit: 'Hz',
  reads: ['gainBandwidth'],
  hasMargin: true,
  asks: (demands) => demands['gain-bandwidth'],
  judge: (asked, readings) => compareFigure(asked, { figure: 'gainBandwidth', kind: 'min', unit: 'Hz' }, readings.figure('gainBandwidth')),
};
