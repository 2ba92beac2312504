import type { NumberDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

/** Room the stage leaves between the inputs and V- against what the part needs there; negative: may go beyond the rail. */
export const inputLow: Check<NumberDemand> = {
  id: 'input-low',
  title: 'input range low',
  unit: 'V',
  reads: ['inputLowHeadroom'],
  hasMargin: false,
  asks: (demands) => demands['input-low'],
  judge: (asked, readings) => compareFigure(asked, { figure: 'inputLowHeadroom', kind: 'max', unit: 'V' }, readings.figure('inputLowHeadroom')),
};
