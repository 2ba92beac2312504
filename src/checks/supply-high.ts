import type { NumberDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

/** Highest supply of the stage against the part's operating maximum. */
export const supplyHigh: Check<NumberDemand> = {
  id: 'supply-high',
  title: 'highest supply',
  unit: 'V',
  reads: ['supplyVoltage'],
  hasMargin: true,
  asks: (demands) => demands['supply-high'],
  judge: (asked, readings) => compareFigure(asked, { figure: 'supplyVoltage', kind: 'max', unit: 'V' }, readings.figure('supplyVoltage', 'max')),
};
