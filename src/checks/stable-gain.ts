import type { NumberDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

const UNITY = { value: 1, best: 1, why: 'no minimum stable gain known: taken as unity-gain stable' };

/** Noise gain of the stage at high frequency against the least one the part is stable at. */
export const stableGain: Check<NumberDemand> = {
  id: 'stable-gain',
  title: 'minimum stable gain',
  unit: 'V/V',
  reads: ['minimumStableGain'],
  hasMargin: true,
  asks: (demands) => demands['stable-gain'],
  judge: (asked, readings) =>
    compareFigure(asked, { figure: 'minimumStableGain', kind: 'max', unit: 'V/V' }, readings.figureOrAssumed('minimumStableGain', UNITY)),
};
