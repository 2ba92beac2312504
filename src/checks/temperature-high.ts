import type { NumberDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

const ASSUMED = { value: 70, best: Number.POSITIVE_INFINITY, why: 'no specified temperature known: taken as 0..70 °C' };

/** Highest ambient temperature against the top of the part's specified range. */
export const temperatureHigh: Check<NumberDemand> = {
  id: 'temperature-high',
  title: 'highest temperature',
  unit: '°C',
  reads: ['temperature'],
  hasMargin: false,
  asks: (demands) => demands['temperature-high'],
  judge: (asked, readings) =>
    compareFigure(asked, { figure: 'temperature', kind: 'max', unit: '°C' }, readings.figureOrAssumed('temperature', ASSUMED, 'max')),
};
