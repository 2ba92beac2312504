import type { NumberDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

/** Lowest supply of the stage against the part's operating minimum. */
export const supplyLow: Check<NumberDemand> = {
  id: 'supply-low',
  title: 'lowest supply',
  unit: 'V',
  reads: ['supplyVoltage'],
  hasMargin: true,
  asks: (demands) => demands['supply-low'],
  judge: (asked, readings) => compareFigure(asked, { figure: 'supplyVoltage', kind: 'min', unit: 'V' }, readings.figure('supplyVoltage', 'min')),
};
