import type { NumberDemand } from '../demands/index.js';
import type { Readings } from '../parts/readings.js';
import type { Reading } from '../parts/reading.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

/** Transient peak of the supply against the absolute maximum; the operating maximum serves where none is known. */
export const supplyPeak: Check<NumberDemand> = {
  id: 'supply-peak',
  title: 'supply peak',
  unit: 'V',
  reads: ['supplyAbsoluteMaximum', 'supplyVoltage'],
  hasMargin: true,
  asks: (demands) => demands['supply-peak'],
  judge: (asked, readings) => compareFigure(asked, { figure: 'supplyAbsoluteMaximum', kind: 'max', unit: 'V' }, absoluteMaximum(readings)),
};

function absoluteMaximum(readings: Readings): Reading | null {
  const operating = readings.figure('supplyVoltage', 'max');
  if (operating === null) return readings.figure('supplyAbsoluteMaximum');
  return readings.figureOrAssumed('supplyAbsoluteMaximum', {
    value: operating.value,
    best: Number.POSITIVE_INFINITY,
    why: 'no absolute maximum known: the operating maximum serves',
  });
}
