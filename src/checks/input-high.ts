import type { NumberDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

/** Room the stage leaves between the inputs and V+ against what the part needs there; negative: may go beyond the rail. */
export const inputHigh: Check<NumberDemand> = {
  id: 'input-high',
  title: 'input range high',
  unit: 'V',
  reads: ['inputHighHeadroom'],
  hasMargin: false,
  asks: (demands) => demands['input-high'],
  judge: (asked, readings) => compareFigure(asked, { figure: 'inputHighHeadroom', kind: 'max', unit: 'V' }, readings.figure('inputHighHeadroom')),
};
