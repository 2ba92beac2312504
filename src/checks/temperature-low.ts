import type { NumberDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

const ASSUMED = { value: 0, best: Number.NEGATIVE_INFINITY, why: 'no specified temperature known: taken as 0..70 °C' };

/** Lowest ambient temperature against the bottom of the part's specified range. */
export const temperatureLow: Check<NumberDemand> = {
  id: 'temperature-low',
  title: 'lowest temperature',
  unit: '°C',
  reads: ['temperature'],
  hasMargin: false,
  asks: (demands) => demands['temperature-low'],
  judge: (asked, readings) =>
    compareFigure(asked, { figure: 'temperature', kind: 'min', unit: '°C' }, readings.figureOrAssumed('temperature', ASSUMED, 'min')),
};
